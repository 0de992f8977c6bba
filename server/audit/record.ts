import { type Db } from '#db/open-database';
import { preparedOnce } from '#db/prepared-once';
import { auditEntries } from '#db/schema/audit';
import { desc, sql } from 'drizzle-orm';
import { createHash } from 'node:crypto';
import { canonicalJson } from './canonical-json';

/** What is written down of one change. */
export interface Change {
  at: Date;
  /** Null when no person acted. */
  person: { id: number; name: string } | null;
  /** Who acted when it was no person, as "Rack 2"; the program itself unless given. */
  actor?: string;
  action: string;
  subject: string;
  subjectId: string | number;
  before?: unknown;
  after?: unknown;
}

/** The hash of an entry covers its content and the hash before it: SHA-256 of their canonical JSON. */
export function entryHash(entry: {
  at: string;
  personId: number | null;
  actor: string;
  action: string;
  subject: string;
  subjectId: string;
  before: string | null;
  after: string | null;
  previousHash: string;
}): string {
  const { at, personId, actor, action, subject, subjectId, before, after, previousHash } = entry;
  const content = [previousHash, at, personId, actor, action, subject, subjectId, before, after];
  return createHash('sha256').update(JSON.stringify(content)).digest('hex');
}

export const FIRST_HASH = '0'.repeat(64);

const lastEntry = preparedOnce((db) =>
  db.select({ hash: auditEntries.hash }).from(auditEntries).orderBy(desc(auditEntries.id)).limit(1).prepare(),
);

/** The hash that the next entry follows. */
function chainHead(db: Db): string {
  return lastEntry(db).get()?.hash ?? FIRST_HASH;
}

/** A change as the entry that follows the one with `previousHash`. */
function chainEntry(change: Change, previousHash: string) {
  const entry = {
    at: change.at.toISOString(),
    personId: change.person?.id ?? null,
    actor: change.person?.name ?? change.actor ?? 'Quietrail',
    action: change.action,
    subject: change.subject,
    subjectId: String(change.subjectId),
    before: change.before === undefined ? null : canonicalJson(change.before),
    after: change.after === undefined ? null : canonicalJson(change.after),
    previousHash,
  };
  return { ...entry, hash: entryHash(entry) };
}

const insertEntry = preparedOnce((db) =>
  db
    .insert(auditEntries)
    .values({
      at: sql.placeholder('at'),
      personId: sql.placeholder('personId'),
      actor: sql.placeholder('actor'),
      action: sql.placeholder('action'),
      subject: sql.placeholder('subject'),
      subjectId: sql.placeholder('subjectId'),
      before: sql.placeholder('before'),
      after: sql.placeholder('after'),
      previousHash: sql.placeholder('previousHash'),
      hash: sql.placeholder('hash'),
    })
    .prepare(),
);

/** Appends an audit entry; call it inside the transaction of the change it records. */
export function record(db: Db, change: Change): void {
  insertEntry(db).run(chainEntry(change, chainHead(db)));
}
