import { type Db } from '#db/open-database';
import { lots } from '#db/schema/lots';
import { lotSummaries } from '#db/schema/summaries';
import { suppliers } from '#db/schema/suppliers';
import { NotFound } from '#server/problems';
import { type Supplier } from '#shared/contract/suppliers';
import { asc, count, eq, ne, sql } from 'drizzle-orm';

/** Suppliers with their lots: all but the cancelled ones, and of those decided how many were accepted. */
function withLots(db: Db) {
  const booked = db
    .select({ supplierId: lots.supplierId, lots: count().as('lots_booked') })
    .from(lots)
    .where(ne(lots.status, 'cancelled'))
    .groupBy(lots.supplierId)
    .as('booked');
  const decided = db
    .select({
      supplierId: lotSummaries.supplierId,
      lots: count().as('lots_decided'),
      accepted: sql<number>`sum(${lotSummaries.verdict} = 'accepted')`.as('lots_accepted'),
    })
    .from(lotSummaries)
    .groupBy(lotSummaries.supplierId)
    .as('decided');
  return db
    .select({
      supplier: suppliers,
      lots: sql<number>`coalesce(${booked.lots}, 0)`,
      lotsDecided: sql<number>`coalesce(${decided.lots}, 0)`,
      lotsAccepted: sql<number>`coalesce(${decided.accepted}, 0)`,
    })
    .from(suppliers)
    .leftJoin(booked, eq(booked.supplierId, suppliers.id))
    .leftJoin(decided, eq(decided.supplierId, suppliers.id));
}

export function listSuppliers(db: Db): Supplier[] {
  const rows = withLots(db).orderBy(asc(suppliers.name)).all();
  return rows.map(({ supplier, ...counted }) => ({ ...supplier, ...counted }));
}

/** @throws {NotFound} */
export function findSupplier(db: Db, id: number): Supplier {
  const row = withLots(db).where(eq(suppliers.id, id)).get();
  if (!row) throw new NotFound('This supplier');
  const { supplier, ...counted } = row;
  return { ...supplier, ...counted };
}
