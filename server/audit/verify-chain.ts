import { type Db } from '#db/open-database';
import { auditEntries } from '#db/schema/audit';
import { type verifyAudit } from '#shared/contract/audit';
import { asc, gt, sql } from 'drizzle-orm';
import { setImmediate } from 'node:timers/promises';
import type * as z from 'zod';
import { entryHash, FIRST_HASH } from './record';

export type Verification = z.input<(typeof verifyAudit)['reply']>;

const AT_ONCE = 1000;

/** The highest id the table ever gave out; entries removed from the end of the chain are missed by no later hash. */
function lastGivenId(db: Db): number {
  const row = db.get<{ seq: number } | undefined>(sql`select seq from sqlite_sequence where name = 'audit_entries'`);
  return row?.seq ?? 0;
}

function entriesAfter(db: Db, id: number) {
  return db
    .select()
    .from(auditEntries)
    .where(gt(auditEntries.id, id))
    .orderBy(asc(auditEntries.id))
    .limit(AT_ONCE)
    .all();
}

/** Recomputes the chain from its first entry, in pieces between which other requests are answered. */
export async function verifyChain(db: Db): Promise<Verification> {
  const expected = lastGivenId(db);
  let entries = 0;
  let last = { id: 0, hash: FIRST_HASH };
  for (;;) {
    const piece = entriesAfter(db, last.id);
    for (const entry of piece) {
      if (entry.previousHash !== last.hash || entry.hash !== entryHash(entry))
        return { entries, intact: false, firstBroken: entry.id, head: last.hash };
      last = entry;
      entries += 1;
    }
    if (piece.length < AT_ONCE) break;
    await setImmediate();
  }
  const intact = last.id >= expected;
  return { entries, intact, firstBroken: intact ? null : last.id + 1, head: last.hash };
}
