import { type Database, type Db } from '#db/open-database';
import { rackParts, racks, rackTokens } from '#db/schema/racks';
import { type Context } from '#server/context';
import { Forbidden, Unauthenticated } from '#server/problems';
import { eq } from 'drizzle-orm';
import { type Request, type RequestHandler } from 'express';
import { timingSafeEqual } from 'node:crypto';
import { type RackCaller } from './rack-caller';
import { tokenHash } from './rack-token';

/** How often the use of a token is noted; more often would write at every reading. */
const NOTED_EVERY = 60_000;

type Token = typeof rackTokens.$inferSelect;

/** The token of `Authorization: Bearer ...` (RFC 6750); undefined without such a header. */
function bearerOf(request: Request): string | undefined {
  const [, token] = /^bearer +(\S*) *$/i.exec(request.get('authorization') ?? '') ?? [];
  return token;
}

/** What is looked up is the hash, which nobody can approach letter by letter; it is compared once more in constant time. */
function liveToken(db: Db, token: string) {
  const hash = tokenHash(token);
  const found = db
    .select({ token: rackTokens, rack: racks })
    .from(rackTokens)
    .innerJoin(racks, eq(racks.id, rackTokens.rackId))
    .where(eq(rackTokens.hash, hash))
    .get();
  if (!found || !timingSafeEqual(Buffer.from(found.token.hash), Buffer.from(hash))) return undefined;
  return found.token.revokedAt === null ? found : undefined;
}

function noteUse(db: Database, { id, lastUsedAt }: Token, now: Date): void {
  if (lastUsedAt !== null && now.getTime() - Date.parse(lastUsedAt) < NOTED_EVERY) return;
  db.update(rackTokens).set({ lastUsedAt: now.toISOString() }).where(eq(rackTokens.id, id)).run();
}

/**
 * @throws {Unauthenticated} for a token that is wrong or revoked, without a hint which
 * @throws {Forbidden} for one of a rack that is out of use
 */
function rackWith({ db, clock }: Context, given: string): RackCaller {
  const found = liveToken(db, given);
  if (!found) throw new Unauthenticated('token-not-accepted', 'This token is not accepted.');
  const { token, rack } = found;
  if (!rack.active) throw new Forbidden(`The rack ${rack.name} is out of use.`, 'rack-out-of-use');
  noteUse(db, token, clock.now());
  const bound = db.select({ id: rackParts.partId }).from(rackParts).where(eq(rackParts.rackId, rack.id)).all();
  return { id: rack.id, name: rack.name, tokenId: token.id, partIds: new Set(bound.map(({ id }) => id)) };
}

/** Says which rack calls, when it calls with a token. Such a request never counts as a person's too, whatever its cookies. */
export function attachRack(context: Context): RequestHandler {
  return (request, response, next) => {
    const token = bearerOf(request);
    if (token === undefined) {
      next();
      return;
    }
    delete request.caller;
    try {
      request.rack = rackWith(context, token);
    } catch (error) {
      if (error instanceof Unauthenticated) response.set('www-authenticate', 'Bearer');
      throw error;
    }
    next();
  };
}
