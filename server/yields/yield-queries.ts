import { type Db } from '#db/open-database';
import { parts } from '#db/schema/parts';
import { lotSummaries } from '#db/schema/summaries';
import { suppliers } from '#db/schema/suppliers';
import { type YieldRow } from '#shared/contract/yields';
import { and, asc, eq, gte, lt, sql, type SQL } from 'drizzle-orm';

interface Filter {
  from?: string | undefined;
  to?: string | undefined;
  partId?: number | undefined;
  supplierId?: number | undefined;
}

const sums = {
  lotsDecided: sql<number>`count(*)`,
  lotsAccepted: sql<number>`coalesce(sum(${lotSummaries.verdict} = 'accepted'), 0)`,
  lotsRejected: sql<number>`coalesce(sum(${lotSummaries.verdict} = 'rejected'), 0)`,
  unitsInspected: sql<number>`coalesce(sum(${lotSummaries.unitsJudged}), 0)`,
  unitsConforming: sql<number>`coalesce(sum(${lotSummaries.unitsConforming}), 0)`,
  unitsReleased: sql<number>`coalesce(sum(${lotSummaries.unitsReleased}), 0)`,
};

/** Decisions from the first day to the last, both included (UTC). */
function within({ from, to, partId, supplierId }: Filter): SQL | undefined {
  return and(
    from === undefined ? undefined : gte(lotSummaries.decidedAt, from),
    // Later as text than every instant of that day.
    to === undefined ? undefined : lt(lotSummaries.decidedAt, `${to}T24`),
    partId === undefined ? undefined : eq(lotSummaries.partId, partId),
    supplierId === undefined ? undefined : eq(lotSummaries.supplierId, supplierId),
  );
}

function byMonth(db: Db, filter: Filter): YieldRow[] {
  return db
    .select({ key: lotSummaries.month, ...sums })
    .from(lotSummaries)
    .where(within(filter))
    .groupBy(lotSummaries.month)
    .orderBy(asc(lotSummaries.month))
    .all()
    .map((row) => ({ ...row, title: row.key, note: '' }));
}

function bySupplier(db: Db, filter: Filter): YieldRow[] {
  return db
    .select({ id: suppliers.id, title: suppliers.name, note: suppliers.code, ...sums })
    .from(lotSummaries)
    .innerJoin(suppliers, eq(suppliers.id, lotSummaries.supplierId))
    .where(within(filter))
    .groupBy(suppliers.id)
    .orderBy(asc(suppliers.name))
    .all()
    .map(({ id, ...row }) => ({ ...row, key: String(id) }));
}

function byPart(db: Db, filter: Filter): YieldRow[] {
  return db
    .select({ id: parts.id, title: parts.number, note: parts.name, ...sums })
    .from(lotSummaries)
    .innerJoin(parts, eq(parts.id, lotSummaries.partId))
    .where(within(filter))
    .groupBy(parts.id)
    .orderBy(asc(parts.number))
    .all()
    .map(({ id, ...row }) => ({ ...row, key: String(id) }));
}

/** Yields by month, supplier and part, from the summaries written at decision: the cost grows with lots, not readings. */
export function readYields(db: Db, filter: Filter) {
  const total = db.select(sums).from(lotSummaries).where(within(filter)).get();
  if (!total) throw new Error('A sum over no rows is still a row.');
  return {
    months: byMonth(db, filter),
    suppliers: bySupplier(db, filter),
    parts: byPart(db, filter),
    total: { key: 'total', title: 'All lots decided', note: '', ...total },
  };
}
