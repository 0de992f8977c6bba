import { openDatabase } from '#db/open-database';
import { preparedOnce } from '#db/prepared-once';
import { suppliers } from '#db/schema/suppliers';
import { eq, sql } from 'drizzle-orm';
import { fileURLToPath } from 'node:url';
import { describe, expect, it } from 'vitest';
import { buildSupplier } from '../support/builders';

const ROOT = fileURLToPath(new URL('../..', import.meta.url));
const open = () => openDatabase(':memory:', ROOT);

describe('a statement that is prepared once', () => {
  let prepared = 0;
  const byCode = preparedOnce((db) => {
    prepared += 1;
    return db
      .select({ name: suppliers.name })
      .from(suppliers)
      .where(eq(suppliers.code, sql.placeholder('code')))
      .prepare();
  });

  it('serves a database, its transactions and those within them, and sees what they wrote', () => {
    prepared = 0;
    const db = open();
    expect(byCode(db).get({ code: 'BAL' })).toBeUndefined();
    db.transaction((tx) => {
      buildSupplier(tx, { code: 'BAL', name: 'Baltree Electronics' });
      expect(byCode(tx).get({ code: 'BAL' })).toEqual({ name: 'Baltree Electronics' });
      tx.transaction((inner) => {
        expect(byCode(inner).get({ code: 'BAL' })).toBeDefined();
      });
    });
    expect(byCode(db).get({ code: 'BAL' })).toBeDefined();
    expect(prepared).toBe(1);
  });

  it('forgets with a transaction what was rolled back', () => {
    const db = open();
    const undone = () =>
      db.transaction((tx) => {
        buildSupplier(tx, { code: 'KST' });
        expect(byCode(tx).get({ code: 'KST' })).toBeDefined();
        tx.rollback();
      });
    expect(undone).toThrow();
    expect(byCode(db).get({ code: 'KST' })).toBeUndefined();
  });

  it('asks the database it is given, not the one it was prepared on first', () => {
    const [first, second] = [open(), open()];
    buildSupplier(first, { code: 'OVS', name: 'Omdal Vik Supply' });
    expect(byCode(first).get({ code: 'OVS' })).toBeDefined();
    expect(byCode(second).get({ code: 'OVS' })).toBeUndefined();
  });
});
