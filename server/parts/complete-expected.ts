import { type Db } from '#db/open-database';
import { parts } from '#db/schema/parts';
import { expectedBands } from '#shared/measurement/rectifier/expected-bands';
import { eq, isNull } from 'drizzle-orm';
import { partOfRow } from './part-queries';

/** Computes what the rectifiers of parts ought to give that were saved before the program could. */
export function completeExpected(db: Db): void {
  for (const row of db.select().from(parts).where(isNull(parts.expected)).all()) {
    const expected = expectedBands(partOfRow(row).model);
    if (expected) db.update(parts).set({ expected }).where(eq(parts.id, row.id)).run();
  }
}
