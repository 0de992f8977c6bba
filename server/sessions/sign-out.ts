import { type Db } from '#db/open-database';
import { people } from '#db/schema/people';
import { refreshTokens, sessions } from '#db/schema/sessions';
import { and, eq, isNull } from 'drizzle-orm';
import { record } from '#server/audit/record';
import { type Context } from '#server/context';
import { endSession } from './end-sessions';
import { hashToken } from './secret-token';

function sessionOfToken(db: Db, token: string | undefined): string | undefined {
  if (token === undefined) return undefined;
  const found = db
    .select({ sessionId: refreshTokens.sessionId })
    .from(refreshTokens)
    .where(eq(refreshTokens.tokenHash, hashToken(token)))
    .get();
  return found?.sessionId;
}

/**
 * Ends the session of a device, known by its refresh token, since the access token may have run out long ago; where no
 * refresh token came, by the session of the caller.
 */
export function signOut({ db, clock }: Context, token: string | undefined, callersSession: string | undefined): void {
  db.transaction((tx) => {
    const sessionId = sessionOfToken(tx, token) ?? callersSession;
    if (sessionId === undefined) return;
    const person = tx
      .select({ id: people.id, name: people.name })
      .from(sessions)
      .innerJoin(people, eq(people.id, sessions.personId))
      .where(and(eq(sessions.id, sessionId), isNull(sessions.endedAt)))
      .get();
    if (!person) return;
    const now = clock.now();
    endSession(tx, sessionId, 'signed-out', now);
    record(tx, { at: now, person, action: 'signed-out', subject: 'person', subjectId: person.id });
  });
}
