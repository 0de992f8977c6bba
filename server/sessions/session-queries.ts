import { type Db } from '#db/open-database';
import { people, personRoles } from '#db/schema/people';
import { sessions } from '#db/schema/sessions';
import { type Role } from '#shared/contract/roles';
import { and, eq, gt, isNull, sql } from 'drizzle-orm';
import { type Caller } from '#server/caller';

/**
 * Finds who calls by the session: person and roles as they are now, so that a deactivation, a change of roles or a
 * sign-out acts at once. Prepared once, because every request asks it.
 */
export function callerFinder(db: Db): (sessionId: string, now: Date) => Caller | undefined {
  const rowsOf = db
    .select({
      id: people.id,
      name: people.name,
      email: people.email,
      stampNumber: people.stampNumber,
      role: personRoles.role,
    })
    .from(sessions)
    .innerJoin(people, eq(people.id, sessions.personId))
    .leftJoin(personRoles, eq(personRoles.personId, people.id))
    .where(
      and(
        eq(sessions.id, sql.placeholder('session')),
        isNull(sessions.endedAt),
        gt(sessions.expiresAt, sql.placeholder('now')),
        eq(people.active, true),
      ),
    )
    .prepare();
  return (sessionId, now) => {
    const rows = rowsOf.all({ session: sessionId, now: now.toISOString() });
    const [first] = rows;
    if (!first) return undefined;
    const roles = rows.map((row) => row.role).filter((role): role is Role => role !== null);
    const { id, name, email, stampNumber } = first;
    return { id, name, email, stampNumber, roles, sessionId };
  };
}

/** Whoever may be signing in under an e-mail address. */
export function findByEmail(db: Db, email: string) {
  return db.select().from(people).where(eq(people.email, email)).get();
}
