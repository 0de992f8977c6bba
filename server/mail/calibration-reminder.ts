import { utcMinute } from '#server/documents/paper-time';
import { type Instrument, INSTRUMENT_KIND_TITLES } from '#shared/contract/instruments';
import { type RenderedLetter, renderLetter } from './letter';
import { oneLine } from './one-line';

/** What quality is told of calibrations that fall due. */
export interface CalibrationReminder {
  siteName: string;
  department: string;
  /** When it is written. */
  at: string;
  instruments: readonly Instrument[];
  /** Where the register is read, or null when the site has no public address. */
  link: string | null;
}

function days(count: number): string {
  return `${count}\u00a0${count === 1 ? 'day' : 'days'}`;
}

/** How the due date lies to today, in words. */
function standing(daysLeft: number): string {
  if (daysLeft < 0) return `${days(-daysLeft)} past`;
  return daysLeft === 0 ? 'today' : `in ${days(daysLeft)}`;
}

function count(instruments: readonly unknown[]): string {
  return instruments.length === 1 ? 'One instrument' : `${instruments.length} instruments`;
}

function sentences(past: readonly unknown[], soon: readonly unknown[]): string[] {
  const verb = (items: readonly unknown[], one: string, many: string) => (items.length === 1 ? one : many);
  return [
    past.length === 0
      ? ''
      : `${count(past)} ${verb(past, 'is', 'are')} past ${verb(past, 'its', 'their')} calibration date and refused at the bench until calibrated.`,
    soon.length === 0 ? '' : `${count(soon)} ${verb(soon, 'falls', 'fall')} due soon.`,
  ].filter((sentence) => sentence !== '');
}

/** The reminder of calibrations that fall due, as HTML and as plain text in the same order. */
export function calibrationReminder(reminder: CalibrationReminder): RenderedLetter & { subject: string } {
  const { instruments, siteName, department, at, link } = reminder;
  const past = instruments.filter(({ daysLeft }) => daysLeft < 0);
  const soon = instruments.filter(({ daysLeft }) => daysLeft >= 0);
  const first = past.length > 0 ? `${count(past)} past the calibration date` : `${count(soon)} due for calibration`;
  const text = sentences(past, soon).join(' ');
  const view = {
    subject: first,
    preheader: text,
    siteName: oneLine(siteName),
    department: oneLine(department),
    text,
    instruments: [...past, ...soon].map((instrument) => ({
      assetNumber: oneLine(instrument.assetNumber),
      kind: INSTRUMENT_KIND_TITLES[instrument.kind],
      description: oneLine(instrument.description),
      place: oneLine(instrument.place),
      due: instrument.calibrationDue,
      standing: standing(instrument.daysLeft),
      isPast: instrument.daysLeft < 0,
    })),
    link,
    sentAt: utcMinute(at),
  };
  return { subject: first, ...renderLetter('calibration-reminder', view) };
}
