import { type Db } from '#db/open-database';
import { type Context } from '#server/context';
import { unitOf, type LotRules } from '#server/judging/lot-judging';
import { rejudge, type RunningVerdicts } from '#server/judging/running-verdicts';
import { lotAtBench } from './bench-lot';

export const DONE = { done: true } as const;

/**
 * Runs an act on one unit of a lot at the bench, judges the lot again, and forgets what was held of it.
 *
 * @param change the act; it returns the number of the unit it was on
 */
export function onUnit(
  context: Context,
  verdicts: RunningVerdicts,
  lotId: number,
  change: (db: Db, at: Date, held: { rules: LotRules }) => number,
): typeof DONE {
  const at = context.clock.now();
  context.db.transaction((tx) => {
    const lot = lotAtBench(tx, lotId);
    const held = verdicts.of(tx, lot);
    const unit = change(tx, at, held);
    const rows = unitOf(tx, lotId, unit);
    if (!rows) throw new Error(`Lot ${lot.number} has no unit ${unit}.`);
    rejudge(tx, lot, held, rows, at);
  });
  verdicts.drop(lotId);
  return DONE;
}
