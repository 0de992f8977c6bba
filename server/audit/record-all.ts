import { type Db } from '#db/open-database';
import { auditEntries } from '#db/schema/audit';
import { type Change, chainEntry, chainHead } from './record';

/** SQLite takes a limited number of values in one statement. */
const ENTRIES_AT_ONCE = 500;

/** Appends many audit entries in their order, with few statements; call it inside the transaction of their changes. */
export function recordAll(db: Db, changes: readonly Change[]): void {
  let head = chainHead(db);
  const entries = changes.map((change) => {
    const entry = chainEntry(change, head);
    head = entry.hash;
    return entry;
  });
  for (let from = 0; from < entries.length; from += ENTRIES_AT_ONCE)
    db.insert(auditEntries)
      .values(entries.slice(from, from + ENTRIES_AT_ONCE))
      .run();
}
