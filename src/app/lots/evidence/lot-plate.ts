import { type Assessment } from '#shared/contract/decision';
import { type Lot } from '#shared/contract/lots';
import { momentText } from '../../ui/values/moment-pipe';
import { type PlateVariant } from '../../ui/verdict-plate/plate-trace';

type Groups = Assessment['groups'];

/** What stands on the plate of a lot. */
export interface LotPlate {
  readonly variant: PlateVariant;
  readonly word: string;
  /** When it came to be so. */
  readonly at: string | null;
  readonly reason: string;
  readonly stamp: string;
}

/** The plate of a lot as it stands now. A verdict that nobody has signed is not shown as one. */
export function lotPlate(lot: Lot, groups: Groups | undefined): LotPlate {
  const signed = { at: lot.decidedAt, stamp: stampOf(lot.decidedBy) };
  if (lot.status === 'released') return { variant: 'accepted', word: '', reason: foundWords(groups), ...signed };
  if (lot.verdict === 'rejected') return { variant: 'rejected', word: '', reason: foundWords(groups), ...signed };
  if (lot.status === 'on-hold')
    return { ...signed, variant: 'on-hold', word: '', reason: 'Acceptable, held by quality' };
  return { ...running(lot), stamp: '' };
}

function running(lot: Lot): Omit<LotPlate, 'stamp'> {
  if (lot.stopped) return { variant: 'stop', word: '', at: lot.submittedAt, reason: 'Rejection number reached' };
  switch (lot.status) {
    case 'arrived':
      return { variant: 'continue', word: 'ARRIVED', at: lot.arrivedAt, reason: 'Sample not drawn' };
    case 'cancelled':
      return { variant: 'continue', word: 'CANCELLED', at: null, reason: 'Left the queue before the draw' };
    case 'submitted':
      return { variant: 'continue', word: 'TO SIGN', at: lot.submittedAt, reason: 'Waits for quality' };
    default:
      return { variant: 'continue', word: '', at: lot.drawnAt, reason: 'No rejection number reached' };
  }
}

/** The plate of a submitted lot for the person who is to sign it: the verdict the sample asks for. */
export function plateToSign({ lot, verdict, groups }: Assessment): LotPlate {
  const variant = verdict === 'continue' ? 'continue' : verdict;
  return { variant, word: '', at: lot.submittedAt, reason: foundWords(groups), stamp: 'not signed' };
}

/** What decided, in a few words: "Major 3, Re 3", or the class that came nearest to its acceptance number. */
export function foundWords(groups: Groups | undefined): string {
  if (groups === undefined) return '';
  const over = groups.find(({ found, group }) => found >= group.rejection);
  if (over) return `${named(over)} ${over.found}, Re ${over.group.rejection}`;
  const nearest = [...groups].sort((a, b) => left(a) - left(b)).find(({ found }) => found > 0);
  return nearest ? `${named(nearest)} ${nearest.found}, Ac ${nearest.group.acceptance}` : 'No unit nonconforming';
}

function named({ group }: Groups[number]): string {
  return group.class.charAt(0).toUpperCase() + group.class.slice(1);
}

function left({ found, group }: Groups[number]): number {
  return group.acceptance - found;
}

function stampOf(person: Lot['decidedBy']): string {
  if (person === null) return '';
  return person.stampNumber === null ? person.name : `${person.name}, stamp ${person.stampNumber}`;
}

/** The time on a plate: always with its date. */
export function plateTime(at: string | null): string {
  return at === null ? '' : momentText(new Date(at), 'full', new Date());
}
