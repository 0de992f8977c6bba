import { type Db } from '#db/open-database';
import { people } from '#db/schema/people';
import { refreshTokens, sessions } from '#db/schema/sessions';
import { eq } from 'drizzle-orm';
import { record } from '#server/audit/record';
import { type Context } from '#server/context';
import { Unauthenticated } from '#server/problems';
import { endSession } from './end-sessions';
import { hashToken } from './secret-token';
import { issueRefreshToken, type SessionTokens } from './start-session';

function findToken(db: Db, tokenHash: string) {
  return db
    .select({ token: refreshTokens, session: sessions, person: people })
    .from(refreshTokens)
    .innerJoin(sessions, eq(sessions.id, refreshTokens.sessionId))
    .innerJoin(people, eq(people.id, sessions.personId))
    .where(eq(refreshTokens.tokenHash, tokenHash))
    .get();
}
type Found = NonNullable<ReturnType<typeof findToken>>;

function isOver({ session, person }: Found, now: Date): boolean {
  return session.endedAt !== null || session.expiresAt <= now.toISOString() || !person.active;
}

/** Two holders of one token: one of them stole it, so the session ends for both. */
function endAsStolen(db: Db, { session, person }: Found, now: Date): void {
  endSession(db, session.id, 'refresh-token-used-twice', now);
  record(db, {
    at: now,
    person: null,
    action: 'session-ended',
    subject: 'person',
    subjectId: person.id,
    after: { why: 'refresh-token-used-twice' },
  });
}

function rotate(db: Db, { token, session }: Found, now: Date): SessionTokens {
  db.update(refreshTokens).set({ usedAt: now.toISOString() }).where(eq(refreshTokens.tokenHash, token.tokenHash)).run();
  const { id, keep, expiresAt } = session;
  return { sessionId: id, keep, expiresAt, refreshToken: issueRefreshToken(db, id, now) };
}

/** Exchanges a refresh token for a fresh one; the session keeps its end. */
export function refreshSession({ db, clock }: Context, token: string | undefined): SessionTokens {
  if (token === undefined) throw new Unauthenticated();
  const now = clock.now();
  const tokens = db.transaction((tx) => {
    const found = findToken(tx, hashToken(token));
    if (!found || isOver(found, now)) return undefined;
    if (found.token.usedAt === null) return rotate(tx, found, now);
    endAsStolen(tx, found, now);
    return undefined;
  });
  if (!tokens) throw new Unauthenticated('session-ended', 'Your session has ended. Sign in again.');
  return tokens;
}
