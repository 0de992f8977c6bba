import { createHash, randomBytes } from 'node:crypto';

/** A fresh secret of 256 bits; only its hash is ever kept. */
export function newToken(): string {
  return randomBytes(32).toString('base64url');
}

export function hashToken(token: string): string {
  return createHash('sha256').update(token).digest('hex');
}
