import { people } from '#db/schema/people';
import { refreshTokens, sessions } from '#db/schema/sessions';
import { and, eq, isNull } from 'drizzle-orm';
import { record } from '#server/audit/record';
import { type Context } from '#server/context';
import { endSession } from './end-sessions';
import { hashToken } from './secret-token';

/** Ends the session of a device, known by its refresh token: the access token may have run out long ago. */
export function signOut({ db, clock }: Context, token: string | undefined): void {
  if (token === undefined) return;
  db.transaction((tx) => {
    const now = clock.now();
    const found = tx
      .select({ sessionId: sessions.id, person: { id: people.id, name: people.name } })
      .from(refreshTokens)
      .innerJoin(sessions, eq(sessions.id, refreshTokens.sessionId))
      .innerJoin(people, eq(people.id, sessions.personId))
      .where(and(eq(refreshTokens.tokenHash, hashToken(token)), isNull(sessions.endedAt)))
      .get();
    if (!found) return;
    endSession(tx, found.sessionId, 'signed-out', now);
    record(tx, { at: now, person: found.person, action: 'signed-out', subject: 'person', subjectId: found.person.id });
  });
}
