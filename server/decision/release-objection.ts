import { type Db } from '#db/open-database';
import { type Caller } from '#server/caller';
import { readingsThatCount } from '#server/judging/counting';
import { type JudgedLot } from '#server/judging/sample-judging';
import { type LotRow } from '#server/lots/lot-rows';
import { Conflict, Forbidden, type Problem } from '#server/problems';
import { lotInDoubt } from '#server/reviews/lot-in-doubt';
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

/** Why readings of an instrument found out of tolerance keep the lot from being released; null where none do. */
function doubtObjection(db: Db, lot: LotRow): Problem | null {
  const [doubt] = lotInDoubt(db, lot.id);
  if (!doubt) return null;
  const { assetNumber, number } = doubt;
  const message = `Readings with ${assetNumber}, found out of tolerance, count here. Review ${number} has not cleared this lot.`;
  return new Conflict('readings-in-doubt', message);
}

/**
 * Why this person may not release the lot: somebody else must when all readings are the releaser's own, unless the site
 * waives that; of a lot inspected whole there may be nothing left to release; and its readings may be in doubt.
 */
export function releaseObjection(db: Db, lot: LotRow, judged: JudgedLot, caller: Caller): Problem | null {
  if (unitsReleased(lot, judged) === 0)
    return new Conflict('nothing-to-release', 'No unit of this lot conforms; there is nothing to release. Hold it.');
  const doubt = doubtObjection(db, lot);
  if (doubt) return doubt;
  if (!tookAllReadings(judged, caller) || findSite(db).releaseOwnReadings) return null;
  return new Forbidden('You took all readings of this lot; somebody else of quality must release it.', 'own-readings');
}
