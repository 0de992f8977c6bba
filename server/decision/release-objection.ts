import { type Db } from '#db/open-database';
import { type Caller } from '#server/caller';
import { readingsThatCount } from '#server/judging/counting';
import { type JudgedLot } from '#server/judging/sample-judging';
import { type LotRow } from '#server/lots/lot-rows';
import { Conflict, Forbidden, type Problem } from '#server/problems';
import { findSite } from '#server/site/site-queries';

/** Units of an accepted lot that go to stock: the nonconforming ones are taken out of it. */
export function unitsReleased(lot: LotRow, { verdict }: JudgedLot): number {
  return lot.countedQuantity - verdict.units.filter((unit) => unit.verdict === 'nonconforming').length;
}

/** Whether all readings that count are one person's own; readings of a rack count as taken by nobody. */
export function tookAllReadings(judged: JudgedLot, caller: Caller): boolean {
  const takers = new Set(readingsThatCount(judged).map(({ takenById }) => takenById));
  return takers.size === 1 && takers.has(caller.id);
}

/**
 * Why this person may not release the lot: somebody else must when all readings are the releaser's own, unless the site
 * waives that; and of a lot inspected whole there may be nothing left to release.
 */
export function releaseObjection(db: Db, lot: LotRow, judged: JudgedLot, caller: Caller): Problem | null {
  if (unitsReleased(lot, judged) === 0)
    return new Conflict('nothing-to-release', 'No unit of this lot conforms; there is nothing to release. Hold it.');
  if (!tookAllReadings(judged, caller) || findSite(db).releaseOwnReadings) return null;
  return new Forbidden('You took all readings of this lot; somebody else of quality must release it.', 'own-readings');
}
