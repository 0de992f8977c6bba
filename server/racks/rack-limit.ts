import { Problem } from '#server/problems';
import { type RequestHandler } from 'express';
import { rateLimit } from 'express-rate-limit';

const WINDOW = 60_000;
/** A rack that sends every reading by itself has ten a second; more is a program that has gone wrong. */
export const REQUESTS_A_MINUTE = 600;

/** Bounds the requests made with one token. */
export function rackLimit(): RequestHandler {
  return rateLimit({
    windowMs: WINDOW,
    limit: REQUESTS_A_MINUTE,
    standardHeaders: 'draft-8',
    legacyHeaders: false,
    // Without a token the endpoints let nobody in anyway.
    skip: ({ rack }) => rack === undefined,
    keyGenerator: ({ rack }) => String(rack?.tokenId),
    handler: (_request, _response, next) => {
      next(new Problem(429, 'too-many-requests', 'Too many requests with this token. Send more readings at once.'));
    },
  });
}
