import { type Db } from '#db/open-database';
import { sessions } from '#db/schema/sessions';
import { and, eq, isNull, ne } from 'drizzle-orm';

/** Why a session ended before its time. */
export type EndReason =
  'signed-out' | 'refresh-token-used-twice' | 'password-changed' | 'password-set' | 'reset' | 'deactivated';

export function endSession(db: Db, sessionId: string, reason: EndReason, now: Date): void {
  db.update(sessions)
    .set({ endedAt: now.toISOString(), endReason: reason })
    .where(and(eq(sessions.id, sessionId), isNull(sessions.endedAt)))
    .run();
}

/** Ends the sessions of a person, on every device, or on every other one when `except` names a session. */
export function endSessionsOf(db: Db, personId: number, reason: EndReason, now: Date, except = ''): void {
  db.update(sessions)
    .set({ endedAt: now.toISOString(), endReason: reason })
    .where(and(eq(sessions.personId, personId), isNull(sessions.endedAt), ne(sessions.id, except)))
    .run();
}
