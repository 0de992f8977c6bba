import { signIn } from '#shared/contract/session';
import { type CookieOptions, type Request, type Response } from 'express';
import { type Context } from '#server/context';
import { ACCESS_SECONDS, signAccessToken } from './access-token';
import { type SessionTokens } from './start-session';

export const ACCESS_COOKIE = 'qr_access';
const REFRESH_COOKIE = 'qr_refresh';

/** The refresh cookie travels to the session's own endpoints only. */
const REFRESH_PATH = signIn.path;

function attributes(context: Context, path: string, expires: Date | undefined): CookieOptions {
  const secure = context.environment.publicUrl?.startsWith('https:') ?? false;
  return { httpOnly: true, sameSite: 'strict', secure, path, ...(expires ? { expires } : {}) };
}

export function giveCookies(context: Context, response: Response, tokens: SessionTokens): void {
  const { clock, environment } = context;
  const now = clock.now();
  const access = signAccessToken(tokens.sessionId, now, environment.secret);
  const accessEnd = tokens.keep ? new Date(now.getTime() + ACCESS_SECONDS * 1000) : undefined;
  const sessionEnd = tokens.keep ? new Date(tokens.expiresAt) : undefined;
  response.cookie(ACCESS_COOKIE, access, attributes(context, '/', accessEnd));
  response.cookie(REFRESH_COOKIE, tokens.refreshToken, attributes(context, REFRESH_PATH, sessionEnd));
}

export function clearCookies(context: Context, response: Response): void {
  response.clearCookie(ACCESS_COOKIE, attributes(context, '/', undefined));
  response.clearCookie(REFRESH_COOKIE, attributes(context, REFRESH_PATH, undefined));
}

/** A cookie's value, when it came and is text. */
export function cookieOf(request: Request, name: string): string | undefined {
  const cookies: unknown = request.cookies;
  if (typeof cookies !== 'object' || cookies === null) return undefined;
  const value: unknown = Reflect.get(cookies, name);
  return typeof value === 'string' && value !== '' ? value : undefined;
}

export function refreshTokenOf(request: Request): string | undefined {
  return cookieOf(request, REFRESH_COOKIE);
}
