import { type Db } from '#db/open-database';
import { lots } from '#db/schema/lots';
import { messages } from '#db/schema/mail';
import { nonconformances } from '#db/schema/nonconformances';
import { parts } from '#db/schema/parts';
import { people } from '#db/schema/people';
import { suppliers } from '#db/schema/suppliers';
import { hasRole, type Caller } from '#server/caller';
import { pageAfter } from '#server/page-after';
import { NotFound } from '#server/problems';
import { type Nonconformance } from '#shared/contract/nonconformances';
import { and, desc, eq, lt } from 'drizzle-orm';

/** Receiving sees the nonconformances of the lots it booked in; everybody else who may read sees all. */
export function visibleTo(caller: Caller) {
  const all = hasRole(caller, 'inspector', 'quality', 'engineering', 'auditor');
  return all ? undefined : eq(lots.bookedById, caller.id);
}

function joined(db: Db) {
  return db
    .select({
      id: nonconformances.id,
      number: nonconformances.number,
      status: nonconformances.status,
      lot: { id: lots.id, number: lots.number },
      part: { id: parts.id, number: parts.number, name: parts.name },
      supplier: { id: suppliers.id, name: suppliers.name },
      openedAt: nonconformances.openedAt,
      openedBy: people.name,
      summary: nonconformances.summary,
      failures: nonconformances.failures,
      containment: nonconformances.containment,
    })
    .from(nonconformances)
    .innerJoin(lots, eq(lots.id, nonconformances.lotId))
    .innerJoin(parts, eq(parts.id, lots.partId))
    .innerJoin(suppliers, eq(suppliers.id, lots.supplierId))
    .innerJoin(people, eq(people.id, nonconformances.openedById));
}

/** A page of nonconformances, newest first. */
export function listNonconformances(db: Db, caller: Caller, page: { after?: string | undefined; limit: number }) {
  return pageAfter(page, (before, limit) =>
    joined(db)
      .where(and(visibleTo(caller), before === undefined ? undefined : lt(nonconformances.id, before)))
      .orderBy(desc(nonconformances.id))
      .limit(limit)
      .all(),
  );
}

/** The nonconformance of a lot, as far as the caller may see it. */
export function nonconformanceOf(db: Db, caller: Caller, lotId: number): { id: number; number: string } | null {
  const found = db
    .select({ id: nonconformances.id, number: nonconformances.number })
    .from(nonconformances)
    .innerJoin(lots, eq(lots.id, nonconformances.lotId))
    .where(and(visibleTo(caller), eq(lots.id, lotId)))
    .get();
  return found ?? null;
}

/** @throws {NotFound} also for one that the caller may not see */
export function readNonconformance(db: Db, caller: Caller, id: number): Nonconformance {
  const found = joined(db)
    .where(and(visibleTo(caller), eq(nonconformances.id, id)))
    .get();
  if (!found) throw new NotFound('This nonconformance');
  const notices = db
    .select({
      id: messages.id,
      to: messages.recipients,
      subject: messages.subject,
      status: messages.status,
      queuedAt: messages.queuedAt,
      sentAt: messages.sentAt,
    })
    .from(messages)
    .where(eq(messages.nonconformanceId, id))
    .all();
  return { ...found, notices };
}
