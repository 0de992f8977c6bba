import { type Db } from '#db/open-database';
import { numberSeries } from '#db/schema/site';
import { sql } from 'drizzle-orm';

/** The numbered papers, each with its running number's digits: lots, certificates, nonconformances, studies, reviews. */
const DIGITS = { L: 4, CC: 4, NC: 3, GS: 3, IR: 3 } as const;
export type NumberKind = keyof typeof DIGITS;

/** A paper's number, as L-26-0001. */
export function formatNumber(kind: NumberKind, year: number, running: number): string {
  const shortYear = String(year % 100).padStart(2, '0');
  return `${kind}-${shortYear}-${String(running).padStart(DIGITS[kind], '0')}`;
}

/** Takes the next number of a kind; inside the transaction that uses it, so that no number is lost or given twice. */
export function nextNumber(db: Db, kind: NumberKind, year: number): string {
  const { last } = db
    .insert(numberSeries)
    .values({ kind, year, last: 1 })
    .onConflictDoUpdate({
      target: [numberSeries.kind, numberSeries.year],
      set: { last: sql`${numberSeries.last} + 1` },
    })
    .returning({ last: numberSeries.last })
    .get();
  return formatNumber(kind, year, last);
}
