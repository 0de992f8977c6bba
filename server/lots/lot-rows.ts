import { type Db } from '#db/open-database';
import { preparedOnce } from '#db/prepared-once';
import { lots } from '#db/schema/lots';
import { parts } from '#db/schema/parts';
import { suppliers } from '#db/schema/suppliers';
import { NotFound } from '#server/problems';
import { findSite } from '#server/site/site-queries';
import { type LotHead } from '#shared/contract/lots';
import { eq, sql } from 'drizzle-orm';
import { provisionalSampling } from './lot-sampling-queries';

/** A lot as its row is. */
export type LotRow = typeof lots.$inferSelect;

/** A lot's row joined with what its list line shows. */
export interface JoinedLot {
  lot: LotRow;
  part: { id: number; number: string; name: string };
  supplier: { id: number; name: string };
}

/** Lots with part and supplier; add where, order and limit. */
export function lotsJoined(db: Db) {
  return db
    .select({
      lot: lots,
      part: { id: parts.id, number: parts.number, name: parts.name },
      supplier: { id: suppliers.id, name: suppliers.name },
    })
    .from(lots)
    .innerJoin(parts, eq(parts.id, lots.partId))
    .innerJoin(suppliers, eq(suppliers.id, lots.supplierId));
}

const lotById = preparedOnce((db) =>
  lotsJoined(db)
    .where(eq(lots.id, sql.placeholder('id')))
    .prepare(),
);

/** @throws {NotFound} */
export function findLot(db: Db, id: number): JoinedLot {
  const found = lotById(db).get({ id });
  if (!found) throw new NotFound('This lot');
  return found;
}

/** Hours a lot may wait from arrival to the bench; a lot with a date of need may wait until then, when that is sooner. */
function targetHours(lot: LotRow, siteHours: number): number {
  if (lot.neededBy === null) return siteHours;
  const hours = (Date.parse(lot.neededBy) - Date.parse(lot.arrivedAt)) / 3_600_000;
  return Math.max(0, Math.min(siteHours, hours));
}

/** The site's target for the wait from arrival to the bench, in hours. */
export function waitingTarget(db: Db): number {
  return findSite(db).waitingTargetHours;
}

/** What a list shows of a lot. Before the draw its sample is provisional. */
export function headOf(db: Db, { lot, part, supplier }: JoinedLot, siteHours = waitingTarget(db)): LotHead {
  const provisional = lot.status === 'arrived' ? provisionalSampling(db, lot.partId, lot.countedQuantity) : undefined;
  return {
    id: lot.id,
    number: lot.number,
    status: lot.status,
    part,
    supplier,
    deliveryNumber: lot.deliveryNumber,
    countedQuantity: lot.countedQuantity,
    statedQuantity: lot.statedQuantity,
    arrivedAt: lot.arrivedAt,
    neededBy: lot.neededBy,
    targetHours: targetHours(lot, siteHours),
    severity: lot.severity ?? provisional?.severity ?? 'normal',
    sampleSize: lot.sampleSize ?? provisional?.sampleSize ?? null,
    unitsJudged: lot.unitsJudged,
    stopped: lot.stopped,
    verdict: lot.verdict,
    drawnAt: lot.drawnAt,
    submittedAt: lot.submittedAt,
    decidedAt: lot.decidedAt,
  };
}
