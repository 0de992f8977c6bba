import { type Db } from '#db/open-database';
import { lots } from '#db/schema/lots';
import { cursorFault } from '#server/page-after';
import { STATIONS, type LotHead, type Station } from '#shared/contract/lots';
import { and, asc, desc, eq, gt, inArray, lt, or, sql, type SQL } from 'drizzle-orm';
import { headOf, lotsJoined, waitingTarget, type LotRow } from './lot-rows';

interface ListQuery {
  station?: Station | undefined;
  partId?: number | undefined;
  supplierId?: number | undefined;
  after?: string | undefined;
  limit: number;
}

/** By which instant a station's lots are listed, and which way. */
interface Order {
  column: SQL;
  newestFirst: boolean;
  of(lot: LotRow): string | null;
}
const byArrival = { column: sql`${lots.arrivedAt}`, of: (lot: LotRow) => lot.arrivedAt };
const ORDERS: Record<Station | 'all', Order> = {
  arrivals: { ...byArrival, newestFirst: false },
  bench: { column: sql`${lots.drawnAt}`, newestFirst: false, of: (lot) => lot.drawnAt },
  decision: { column: sql`${lots.submittedAt}`, newestFirst: false, of: (lot) => lot.submittedAt },
  released: { column: sql`${lots.decidedAt}`, newestFirst: true, of: (lot) => lot.decidedAt },
  // A lot that quality holds although acceptable is not decided: it stands by its submission.
  'on-hold': {
    column: sql`coalesce(${lots.decidedAt}, ${lots.submittedAt})`,
    newestFirst: true,
    of: (lot) => lot.decidedAt ?? lot.submittedAt,
  },
  all: { ...byArrival, newestFirst: true },
};

/** A cursor is the instant and the id of the last line of the page before. */
function beyond(column: SQL, newestFirst: boolean, cursor: string): SQL | undefined {
  const [at, idText] = cursor.split('|');
  const id = Number(idText);
  if (at === undefined || !Number.isInteger(id)) throw cursorFault();
  const past = newestFirst ? lt : gt;
  return or(past(column, at), and(eq(column, at), past(lots.id, id)));
}

/** A page of lots at a station, or of all lots. */
export function listLots(db: Db, query: ListQuery): { items: LotHead[]; next: string | null } {
  const { column, newestFirst, of } = ORDERS[query.station ?? 'all'];
  const direction = newestFirst ? desc : asc;
  const conditions = [
    query.station && inArray(lots.status, [...STATIONS[query.station]]),
    query.partId && eq(lots.partId, query.partId),
    query.supplierId && eq(lots.supplierId, query.supplierId),
    query.after && beyond(column, newestFirst, query.after),
  ].filter((condition) => typeof condition === 'object');
  const rows = lotsJoined(db)
    .where(and(...conditions))
    .orderBy(direction(column), direction(lots.id))
    .limit(query.limit + 1)
    .all();
  const shown = rows.slice(0, query.limit);
  const last = shown.at(-1);
  const hours = waitingTarget(db);
  return {
    items: shown.map((row) => headOf(db, row, hours)),
    next: rows.length > query.limit && last ? `${of(last.lot) ?? ''}|${last.lot.id}` : null,
  };
}
