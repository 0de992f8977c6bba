import jwt from 'jsonwebtoken';

/** How long an access token lives; then the refresh token is exchanged. */
export const ACCESS_SECONDS = 10 * 60;

/** What an access token says: which session it belongs to and until when (seconds since 1970). */
export interface AccessClaims {
  session: string;
  exp: number;
}

export function signAccessToken(sessionId: string, now: Date, secret: string): string {
  const claims: AccessClaims = { session: sessionId, exp: Math.floor(now.getTime() / 1000) + ACCESS_SECONDS };
  return jwt.sign(claims, secret, { algorithm: 'HS256', noTimestamp: true });
}
