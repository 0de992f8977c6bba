import { type Db } from '#db/open-database';
import { auditEntries } from '#db/schema/audit';
import { type Caller, hasRole } from '#server/caller';
import { pageAfter } from '#server/page-after';
import { type AuditEntry, type listAudit } from '#shared/contract/audit';
import { and, desc, eq, lt } from 'drizzle-orm';
import type * as z from 'zod';

type Row = typeof auditEntries.$inferSelect;

function readJson(text: string | null): unknown {
  return text === null ? null : JSON.parse(text);
}

function entryOf({ id, at, actor, action, subject, subjectId, before, after, hash }: Row): AuditEntry {
  return { id, at, person: actor, action, subject, subjectId, before: readJson(before), after: readJson(after), hash };
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
          subjectId === undefined ? undefined : eq(auditEntries.subjectId, subjectId),
          before === undefined ? undefined : lt(auditEntries.id, before),
        ),
      )
      .orderBy(desc(auditEntries.id))
      .limit(limit)
      .all(),
  );
  return { ...page, items: page.items.map(entryOf) };
}
