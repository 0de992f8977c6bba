import { type Db } from '#db/open-database';
import { auditEntries } from '#db/schema/audit';
import { type Caller, hasRole } from '#server/caller';
import { pageAfter } from '#server/page-after';
import { type AuditEntry, type listAudit } from '#shared/contract/audit';
import { and, desc, eq, inArray, lt } from 'drizzle-orm';
import type * as z from 'zod';
import { subjectIds, subjectName } from './subject-names';

type Row = typeof auditEntries.$inferSelect;

function readJson(text: string | null): unknown {
  return text === null ? null : JSON.parse(text);
}

function entryOf(db: Db, { id, at, actor, action, subject, subjectId, before, after, hash }: Row): AuditEntry {
  const names = { subject, subjectId, subjectName: subjectName(db, subject, subjectId) };
  return { id, at, person: actor, action, ...names, before: readJson(before), after: readJson(after), hash };
}

/** Entries, newest first: everybody's for those who audit, otherwise the caller's own. */
export function listEntries(
  db: Db,
  caller: Caller,
  query: z.output<(typeof listAudit)['query']>,
): z.input<(typeof listAudit)['reply']> {
  const seesAll = hasRole(caller, 'quality', 'auditor', 'admin');
  const { subject, subjectId } = query;
  const page = pageAfter(query, (before, limit) =>
    db
      .select()
      .from(auditEntries)
      .where(
        and(
          seesAll ? undefined : eq(auditEntries.personId, caller.id),
          subject === undefined ? undefined : eq(auditEntries.subject, subject),
          subjectId === undefined ? undefined : inArray(auditEntries.subjectId, subjectIds(db, subject, subjectId)),
          before === undefined ? undefined : lt(auditEntries.id, before),
        ),
      )
      .orderBy(desc(auditEntries.id))
      .limit(limit)
      .all(),
  );
  return { ...page, items: page.items.map((row) => entryOf(db, row)) };
}
