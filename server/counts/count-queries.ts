import { type Db } from '#db/open-database';
import { lots } from '#db/schema/lots';
import { type Counts } from '#shared/contract/counts';
import { STATIONS } from '#shared/contract/lots';
import { and, count, eq, gte, inArray, or } from 'drizzle-orm';

const THIRTY_DAYS = 30 * 24 * 60 * 60 * 1000;

/** Lots at each station; of the released ones those of the last 30 days. */
export function countStations(db: Db, now: Date): Counts {
  const since = new Date(now.getTime() - THIRTY_DAYS).toISOString();
  const standing = [...STATIONS.arrivals, ...STATIONS.bench, ...STATIONS.decision, ...STATIONS['on-hold']];
  const rows = db
    .select({ status: lots.status, lots: count() })
    .from(lots)
    .where(or(inArray(lots.status, standing), and(eq(lots.status, 'released'), gte(lots.decidedAt, since))))
    .groupBy(lots.status)
    .all();
  const at = (station: keyof typeof STATIONS) =>
    rows
      .filter((row) => STATIONS[station].some((status) => status === row.status))
      .reduce((sum, row) => sum + row.lots, 0);
  return {
    arrivals: at('arrivals'),
    bench: at('bench'),
    decision: at('decision'),
    released: at('released'),
    onHold: at('on-hold'),
    at: now.toISOString(),
  };
}
