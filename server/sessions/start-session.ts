import { type Db } from '#db/open-database';
import { refreshTokens, sessions } from '#db/schema/sessions';
import { inArray, lte } from 'drizzle-orm';
import { randomUUID } from 'node:crypto';
import { hashToken, newToken } from './secret-token';

const HOUR = 60 * 60 * 1000;
/** A shift at a shared desk, and a shift with its overtime at a bench of one's own. Common practice, no source. */
const SESSION_HOURS = { brief: 8, kept: 12 };

/** What a device holds of its session. */
export interface SessionTokens {
  sessionId: string;
  /** Whether the cookies outlive the browser window. */
  keep: boolean;
  expiresAt: string;
  refreshToken: string;
}

export function issueRefreshToken(db: Db, sessionId: string, now: Date): string {
  const token = newToken();
  db.insert(refreshTokens)
    .values({ tokenHash: hashToken(token), sessionId, issuedAt: now.toISOString() })
    .run();
  return token;
}

/** Tokens of sessions that are over are worth nothing any more. */
function forgetOldTokens(db: Db, now: Date): void {
  const over = db.select({ id: sessions.id }).from(sessions).where(lte(sessions.expiresAt, now.toISOString()));
  db.delete(refreshTokens).where(inArray(refreshTokens.sessionId, over)).run();
}

/** Opens a session for a person; call it inside the transaction of the sign-in. */
export function startSession(db: Db, input: { personId: number; keep: boolean; now: Date }): SessionTokens {
  const { personId, keep, now } = input;
  forgetOldTokens(db, now);
  const sessionId = randomUUID();
  const hours = keep ? SESSION_HOURS.kept : SESSION_HOURS.brief;
  const expiresAt = new Date(now.getTime() + hours * HOUR).toISOString();
  db.insert(sessions).values({ id: sessionId, personId, keep, startedAt: now.toISOString(), expiresAt }).run();
  return { sessionId, keep, expiresAt, refreshToken: issueRefreshToken(db, sessionId, now) };
}
