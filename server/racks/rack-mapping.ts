import { type Db } from '#db/open-database';
import { rackParts, racks } from '#db/schema/racks';
import { record } from '#server/audit/record';
import { type Caller } from '#server/caller';
import { type Bench } from '#shared/contract/bench';
import { and, asc, eq } from 'drizzle-orm';
import { isDeepStrictEqual } from 'node:util';
import { findRack } from './rack-queries';

/** The racks that may measure a part, with what the columns of their files mean. */
export function racksOf(db: Db, partId: number): Bench['racks'] {
  return db
    .select({ id: racks.id, name: racks.name, mapping: racks.mapping })
    .from(racks)
    .innerJoin(rackParts, eq(rackParts.rackId, racks.id))
    .where(and(eq(rackParts.partId, partId), eq(racks.active, true)))
    .orderBy(asc(racks.name))
    .all();
}

/** Keeps with a rack what the columns of its files were said to mean; headings it knew of other files stay. */
export function rememberMapping(
  db: Db,
  caller: Caller,
  { rackId, mapping, at }: { rackId: number; mapping: Record<string, string | null>; at: Date },
): void {
  const { mapping: known, version } = findRack(db, rackId);
  const next = { ...known, ...mapping };
  if (isDeepStrictEqual(known, next)) return;
  db.update(racks)
    .set({ mapping: next, version: version + 1 })
    .where(eq(racks.id, rackId))
    .run();
  const change = { action: 'columns named', subject: 'rack', subjectId: rackId, before: known, after: next };
  record(db, { at, person: caller, ...change });
}
