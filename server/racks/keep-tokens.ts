import { rackTokens } from '#db/schema/racks';
import { record } from '#server/audit/record';
import { type Caller } from '#server/caller';
import { type Context } from '#server/context';
import { Conflict, NotFound } from '#server/problems';
import { type Rack } from '#shared/contract/racks';
import { and, eq } from 'drizzle-orm';
import { findRack } from './rack-queries';
import { newToken } from './rack-token';

/** Issues a token of a rack; only its hash is kept. @throws {Conflict} for a rack that is out of use */
export function issueToken({ db, clock }: Context, caller: Caller, rackId: number): { token: string; rack: Rack } {
  const at = clock.now();
  const { token, hash, beginning } = newToken();
  return db.transaction((tx) => {
    const { name, active } = findRack(tx, rackId);
    if (!active) throw new Conflict('rack-out-of-use', `${name} is out of use; put it to use first.`);
    const issued = { issuedAt: at.toISOString(), issuedById: caller.id };
    const { id } = tx
      .insert(rackTokens)
      .values({ rackId, hash, beginning, ...issued })
      .returning({ id: rackTokens.id })
      .get();
    const change = { action: 'token issued', subject: 'rack', subjectId: rackId, after: { token: id, beginning } };
    record(tx, { at, person: caller, ...change });
    return { token, rack: findRack(tx, rackId) };
  });
}

/** Revokes a token; from then on it is not accepted. @throws {Conflict} when it is revoked already */
export function revokeToken(
  { db, clock }: Context,
  caller: Caller,
  { rackId, tokenId }: { rackId: number; tokenId: number },
): { done: true } {
  const at = clock.now();
  db.transaction((tx) => {
    const found = tx
      .select()
      .from(rackTokens)
      .where(and(eq(rackTokens.id, tokenId), eq(rackTokens.rackId, rackId)))
      .get();
    if (!found) throw new NotFound('This token');
    const { beginning, revokedAt } = found;
    if (revokedAt !== null) throw new Conflict('token-revoked', 'This token is revoked already.');
    const revoked = { revokedAt: at.toISOString(), revokedById: caller.id };
    tx.update(rackTokens).set(revoked).where(eq(rackTokens.id, tokenId)).run();
    const change = {
      action: 'token revoked',
      subject: 'rack',
      subjectId: rackId,
      after: { token: tokenId, beginning },
    };
    record(tx, { at, person: caller, ...change });
  });
  return { done: true };
}
