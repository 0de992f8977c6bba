import { type Db } from '#db/open-database';
import { type Fault } from '#shared/contract/problem';
import { and, eq, ne } from 'drizzle-orm';
import { type AnySQLiteColumn, type SQLiteTable } from 'drizzle-orm/sqlite-core';
import { Refused } from './problems';

/** A value that no two rows may share. */
export interface UniqueValue {
  column: AnySQLiteColumn;
  value: string | null;
  path: Fault['path'];
  message: string;
}

/**
 * Refuses values that another row has already, each beside its field. Call it inside the transaction that writes, so
 * that nobody comes between.
 *
 * @param own id of the row that is changed; none while it is added
 */
export function holdUnique(
  db: Db,
  table: SQLiteTable & { id: AnySQLiteColumn },
  own: number | undefined,
  values: readonly UniqueValue[],
): void {
  const faults = values.filter(({ column, value }) => {
    if (value === null) return false;
    const another = own === undefined ? undefined : ne(table.id, own);
    return (
      db
        .select({ id: table.id })
        .from(table)
        .where(and(eq(column, value), another))
        .get() !== undefined
    );
  });
  if (faults.length > 0)
    throw new Refused(
      'taken',
      'Another record has this already.',
      faults.map(({ path, message }) => ({ path, message })),
    );
}
