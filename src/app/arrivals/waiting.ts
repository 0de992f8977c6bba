import { type LotHead } from '#shared/contract/lots';

const HOUR = 3_600_000;

/** A lot of the queue with how long it has waited by now, in hours. */
export interface WaitingLot {
  readonly lot: LotHead;
  readonly hours: number;
  /** Hours past the target; negative while there is time left. */
  readonly past: number;
  /** Units that are counted more (+) or fewer (-) than the delivery note states. */
  readonly difference: number;
}

/** Which lots of the queue are shown. */
export const QUEUE_FILTERS = ['all', 'differs', 'no-plan'] as const;
export type QueueFilter = (typeof QUEUE_FILTERS)[number];

/** The queue as it stands at a moment: lots past their target first, the latest of them at the top, then by waiting time. */
export function queueAt(now: Date, lots: readonly LotHead[]): WaitingLot[] {
  return lots
    .map((lot) => {
      const hours = Math.max(0, now.getTime() - Date.parse(lot.arrivedAt)) / HOUR;
      const difference = lot.countedQuantity - lot.statedQuantity;
      return { lot, hours, past: hours - lot.targetHours, difference };
    })
    .sort((a, b) => Math.max(b.past, 0) - Math.max(a.past, 0) || b.hours - a.hours);
}

/** Whether a lot belongs under a filter. */
export function belongsTo(filter: QueueFilter, { lot, difference }: WaitingLot): boolean {
  if (filter === 'differs') return difference !== 0;
  return filter === 'no-plan' ? lot.sampleSize === null : true;
}

/** What the dock's count says: "Complete", or by how much it differs from the delivery note. */
export function countWords(difference: number): string {
  return difference === 0 ? 'Complete' : `Count differs by ${Math.abs(difference)}`;
}
