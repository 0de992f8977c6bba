import { type Db } from '#db/open-database';
import { parts } from '#db/schema/parts';
import { people } from '#db/schema/people';
import { rackParts, racks, rackTokens } from '#db/schema/racks';
import { NotFound } from '#server/problems';
import { type Rack } from '#shared/contract/racks';
import { asc, desc, eq } from 'drizzle-orm';
import { alias } from 'drizzle-orm/sqlite-core';

function partsOf(db: Db, rackId: number): Rack['parts'] {
  return db
    .select({ id: parts.id, number: parts.number, name: parts.name })
    .from(rackParts)
    .innerJoin(parts, eq(parts.id, rackParts.partId))
    .where(eq(rackParts.rackId, rackId))
    .orderBy(asc(parts.number))
    .all();
}

function tokensOf(db: Db, rackId: number): Rack['tokens'] {
  const revoker = alias(people, 'revoker');
  const rows = db
    .select({ token: rackTokens, issuedBy: people.name, revokedBy: revoker.name })
    .from(rackTokens)
    .innerJoin(people, eq(people.id, rackTokens.issuedById))
    .leftJoin(revoker, eq(revoker.id, rackTokens.revokedById))
    .where(eq(rackTokens.rackId, rackId))
    .orderBy(desc(rackTokens.id))
    .all();
  return rows.map(({ token, issuedBy, revokedBy }) => {
    const { id, beginning, issuedAt, lastUsedAt, revokedAt } = token;
    const revoked = revokedAt === null ? null : { at: revokedAt, by: revokedBy ?? '' };
    return { id, beginning, issuedAt, issuedBy, lastUsedAt, revoked };
  });
}

function rackOf(db: Db, row: typeof racks.$inferSelect): Rack {
  return { ...row, parts: partsOf(db, row.id), tokens: tokensOf(db, row.id) };
}

export function listRacks(db: Db): Rack[] {
  const rows = db.select().from(racks).orderBy(asc(racks.name)).all();
  return rows.map((row) => rackOf(db, row));
}

/** @throws {NotFound} */
export function findRack(db: Db, id: number): Rack {
  const row = db.select().from(racks).where(eq(racks.id, id)).get();
  if (!row) throw new NotFound('This rack');
  return rackOf(db, row);
}
