import { type Db } from '#db/open-database';
import { characteristicSummaries, lotSummaries } from '#db/schema/summaries';
import { isJudged } from '#server/judging/running-verdicts';
import { type JudgedLot } from '#server/judging/sample-judging';
import { type LotRow } from '#server/lots/lot-rows';
import { type NonconformityClass } from '#shared/sampling/scheme';
import { characteristicResults } from '#server/judging/characteristic-results';

/** Writes what trends read of a lot, in the transaction of its decision. */
export function writeSummaries(
  db: Db,
  lot: LotRow,
  judged: JudgedLot,
  decision: { verdict: 'accepted' | 'rejected'; at: Date; unitsReleased: number },
): void {
  const { units } = judged.verdict;
  const atClass = (wanted: NonconformityClass) => units.filter(({ worstClass }) => worstClass === wanted).length;
  const nonconforming = units.filter(({ verdict }) => verdict === 'nonconforming').length;
  const conforming = units.filter(({ verdict }) => verdict === 'conforming').length;
  const decidedAt = decision.at.toISOString();
  db.insert(lotSummaries)
    .values({
      lotId: lot.id,
      month: decidedAt.slice(0, 7),
      decidedAt,
      supplierId: lot.supplierId,
      partId: lot.partId,
      verdict: decision.verdict,
      lotSize: lot.countedQuantity,
      // A nonconforming unit is judged although readings of other characteristics may be missing on it.
      unitsJudged: units.filter((unit) => isJudged(unit) || unit.verdict === 'nonconforming').length,
      unitsConforming: conforming,
      criticalUnits: atClass('critical'),
      majorUnits: atClass('major'),
      minorUnits: nonconforming - atClass('critical') - atClass('major'),
      unitsReleased: decision.unitsReleased,
    })
    .run();
  const results = characteristicResults(judged).filter(({ n }) => n > 0);
  if (results.length === 0) return;
  db.insert(characteristicSummaries)
    .values(
      results.map(({ characteristic, n, found, min, mean, max, s }) => ({
        lotId: lot.id,
        key: characteristic.key,
        n,
        found,
        min,
        mean,
        max,
        s,
      })),
    )
    .run();
}
