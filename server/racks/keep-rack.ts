import { type Db } from '#db/open-database';
import { parts } from '#db/schema/parts';
import { rackParts, racks } from '#db/schema/racks';
import { record } from '#server/audit/record';
import { type Caller } from '#server/caller';
import { type Context } from '#server/context';
import { holdVersion, Refused } from '#server/problems';
import { holdUnique } from '#server/taken';
import { type Rack, type rackBody } from '#shared/contract/racks';
import { eq, inArray } from 'drizzle-orm';
import type * as z from 'zod';
import { findRack } from './rack-queries';

type Body = z.output<typeof rackBody>;

function holdName(db: Db, own: number | undefined, { name }: Body): void {
  holdUnique(db, racks, own, [{ column: racks.name, value: name, path: ['name'], message: 'This name is taken.' }]);
}

/** Binds a rack to the parts it may send readings of, and to no others. */
function bindParts(db: Db, rackId: number, partIds: readonly number[]): void {
  const wanted = [...new Set(partIds)];
  const known = db.select({ id: parts.id }).from(parts).where(inArray(parts.id, wanted)).all();
  if (known.length < wanted.length) {
    const message = 'One of these parts does not exist.';
    throw new Refused('part-unknown', message, [{ path: ['partIds'], message }]);
  }
  db.delete(rackParts).where(eq(rackParts.rackId, rackId)).run();
  for (const partId of wanted) db.insert(rackParts).values({ rackId, partId }).run();
}

/** What the trail keeps of a rack. */
function recorded({ name, place, active, mapping, parts: bound }: Rack) {
  return { name, place, active, mapping, parts: bound.map(({ number }) => number) };
}

export function addRack({ db, clock }: Context, caller: Caller, body: Body): Rack {
  return db.transaction((tx) => {
    holdName(tx, undefined, body);
    const { partIds, ...own } = body;
    const { id } = tx.insert(racks).values(own).returning({ id: racks.id }).get();
    bindParts(tx, id, partIds);
    const added = findRack(tx, id);
    const change = { action: 'added', subject: 'rack', subjectId: id, after: recorded(added) };
    record(tx, { at: clock.now(), person: caller, ...change });
    return added;
  });
}

export function changeRack(
  { db, clock }: Context,
  caller: Caller,
  { id, version, body }: { id: number; version: number; body: Body },
): Rack {
  return db.transaction((tx) => {
    const before = findRack(tx, id);
    holdVersion('The rack', before.version, version);
    holdName(tx, id, body);
    const { partIds, ...own } = body;
    tx.update(racks)
      .set({ ...own, version: version + 1 })
      .where(eq(racks.id, id))
      .run();
    bindParts(tx, id, partIds);
    const after = findRack(tx, id);
    const change = { action: 'changed', subject: 'rack', subjectId: id };
    record(tx, { at: clock.now(), person: caller, ...change, before: recorded(before), after: recorded(after) });
    return after;
  });
}
