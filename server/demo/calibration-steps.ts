import { type Chance, chanceOf } from '#db/demo/chance';
import { type DemoCalibration, demoCertificate } from '#db/demo/demo-calibrations';
import { timeOn } from '#db/demo/work-days';
import { type Caller } from '#server/caller';
import { recordCalibration } from '#server/calibrations/record-calibration';
import { type Context } from '#server/context';
import { dayOf, findInstrument } from '#server/instruments/instrument-queries';
import { assessLot } from '#server/reviews/assess-review';
import { findReview } from '#server/reviews/review-view';
import { type Review } from '#shared/contract/calibrations';
import { type Agenda } from './agenda';
import { type Cast } from './cast';
import { type StagedInstrument } from './stage';

const DAY = 86_400_000;
/** Lots of the review that are left to be assessed. */
const LEFT = 4;
const FIRST_ASSESSED_HOUR = 13;

function midnight(until: Date, inDays: number): Date {
  return new Date(Math.floor(until.getTime() / DAY) * DAY + inDays * DAY);
}

/** Records what the laboratory stated, by the day it says. */
function record(
  context: Context,
  caller: Caller,
  { id, kind }: StagedInstrument,
  calibration: DemoCalibration,
  on: { until: Date; chance: Chance },
): number | null {
  const { version } = findInstrument(context.db, id, dayOf(context.clock.now()));
  const calibratedOn = dayOf(midnight(on.until, calibration.inDays));
  const dueOn = dayOf(midnight(on.until, calibration.dueInDays));
  const body = demoCertificate(kind, calibration, { calibratedOn, dueOn }, on.chance);
  return recordCalibration(context, caller, { id, version, body }).reviewId;
}

/** What quality says of a lot: nothing follows where no verdict could have turned, the others are measured again. */
function assessmentOf({ nearLimit }: Review['affected'][number]) {
  return nearLimit === 0
    ? ({ effect: 'none', note: 'No reading so near its limit that the error could have turned it.' } as const)
    : ({ effect: 'measure-again', note: 'Stock of this lot is measured again with OS-03.' } as const);
}

function assess(context: Context, caller: Caller, reviewId: number): void {
  const review = findReview(context.db, reviewId);
  let { version } = review;
  for (const one of review.affected.slice(0, -LEFT))
    ({ version } = assessLot(context, caller, { id: reviewId, version, lotId: one.lot.id }, assessmentOf(one)));
}

/**
 * Calibrations of the year. The first of each instrument lies before it and is entered on the first morning; the others
 * come in on their days. The review of the oscilloscope found out of tolerance is assessed in part.
 */
export function addCalibrationSteps(
  context: Context,
  agenda: Agenda,
  given: { cast: Cast; instruments: readonly StagedInstrument[]; until: Date; seed: number },
): void {
  const { cast, instruments, until, seed } = given;
  const [first, second] = cast.quality;
  const on = { until, chance: chanceOf(seed + 1) };
  for (const instrument of instruments) {
    const [before, ...within] = instrument.calibrations;
    if (before) record(context, first, instrument, before, on);
    for (const calibration of within)
      agenda.add(timeOn(midnight(until, calibration.inDays), 6, 30), () => {
        const reviewId = record(context, second, instrument, calibration, on);
        if (reviewId !== null)
          agenda.add(timeOn(midnight(until, calibration.inDays), FIRST_ASSESSED_HOUR), () =>
            assess(context, first, reviewId),
          );
      });
  }
}
