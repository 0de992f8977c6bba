import { type Request, type RequestHandler } from 'express';
import { ipKeyGenerator, rateLimit } from 'express-rate-limit';
import * as z from 'zod';
import { type Context } from '#server/context';
import { Problem } from '#server/problems';

const WINDOW = 15 * 60 * 1000;

/** Bounds the failed attempts at a password; those that succeed do not count. Each limit counts for itself. */
export function attemptLimit({ environment }: Context, keyOf: (request: Request) => string): RequestHandler {
  return rateLimit({
    windowMs: WINDOW,
    limit: environment.signInAttempts,
    skipSuccessfulRequests: true,
    standardHeaders: 'draft-8',
    legacyHeaders: false,
    keyGenerator: keyOf,
    handler: (_request, _response, next) => {
      next(new Problem(429, 'too-many-attempts', 'Too many attempts. Wait a quarter of an hour, then try again.'));
    },
  });
}

const named = z.object({ email: z.string().trim().toLowerCase().max(254) });

/** One account, tried from one address: nobody locks somebody else out from afar. */
export function accountAndAddress(request: Request): string {
  const read = named.safeParse(request.body);
  return `${ipKeyGenerator(request.ip ?? '')} ${read.success ? read.data.email : ''}`;
}

export function callersAccount(request: Request): string {
  return request.caller ? String(request.caller.id) : ipKeyGenerator(request.ip ?? '');
}
