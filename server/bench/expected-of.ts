import { type Db } from '#db/open-database';
import { preparedOnce } from '#db/prepared-once';
import { parts } from '#db/schema/parts';
import { type ExpectedBands } from '#shared/contract/parts';
import { eq, sql } from 'drizzle-orm';

const partById = preparedOnce((db) =>
  db
    .select({ expected: parts.expected })
    .from(parts)
    .where(eq(parts.id, sql.placeholder('partId')))
    .prepare(),
);

/** What a part's rectifier ought to give; null where there is no model. */
export function expectedOf(db: Db, partId: number): ExpectedBands | null {
  return partById(db).get({ partId })?.expected ?? null;
}
