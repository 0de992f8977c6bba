import { createHash, randomBytes } from 'node:crypto';

/** By this people and scanners of leaked secrets know what it is. */
const PREFIX = 'qrk_';
/** How much of it is shown again, so that people can tell tokens apart. */
const SHOWN = 8;

/** A token no one has seen before. It is told once; what is kept is its hash. */
export function newToken(): { token: string; hash: string; beginning: string } {
  const token = PREFIX + randomBytes(32).toString('base64url');
  return { token, hash: tokenHash(token), beginning: token.slice(0, SHOWN) };
}

/** A token is 256 random bits, so that a plain hash cannot be guessed back. */
export function tokenHash(token: string): string {
  return createHash('sha256').update(token).digest('hex');
}
