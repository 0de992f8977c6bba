import { type Db } from '#db/open-database';
import { parts } from '#db/schema/parts';
import { record } from '#server/audit/record';
import { type Caller } from '#server/caller';
import { type Context } from '#server/context';
import { holdVersion, NotFound } from '#server/problems';
import { holdUnique } from '#server/taken';
import { type Part, type partBody } from '#shared/contract/parts';
import { expectedBands } from '#shared/measurement/rectifier/expected-bands';
import { eq } from 'drizzle-orm';
import type * as z from 'zod';
import { findPart, partOfRow } from './part-queries';

type Body = z.output<typeof partBody>;

function holdOwnNumber(db: Db, own: number | undefined, number: string): void {
  holdUnique(db, parts, own, [
    { column: parts.number, value: number, path: ['number'], message: 'This number is taken.' },
  ]);
}

/** What the rectifier ought to give is computed here, once, and not while somebody measures. */
function columnsOf({ model, ...rest }: Body) {
  return { ...rest, ...model, expected: expectedBands(model) };
}

export function addPart({ db, clock }: Context, caller: Caller, body: Body): Part {
  return db.transaction((tx) => {
    holdOwnNumber(tx, undefined, body.number);
    const { id } = tx.insert(parts).values(columnsOf(body)).returning({ id: parts.id }).get();
    record(tx, { at: clock.now(), person: caller, action: 'added', subject: 'part', subjectId: id, after: body });
    return findPart(tx, caller, id);
  });
}

export function changePart(
  { db, clock }: Context,
  caller: Caller,
  { id, version, body }: { id: number; version: number; body: Body },
): Part {
  return db.transaction((tx) => {
    const row = tx.select().from(parts).where(eq(parts.id, id)).get();
    if (!row) throw new NotFound('This part');
    const { version: current, ...before } = partOfRow(row);
    holdVersion('The part', current, version);
    holdOwnNumber(tx, id, body.number);
    tx.update(parts)
      .set({ ...columnsOf(body), version: current + 1 })
      .where(eq(parts.id, id))
      .run();
    const change = { action: 'changed', subject: 'part', subjectId: id, before, after: body };
    record(tx, { at: clock.now(), person: caller, ...change });
    return findPart(tx, caller, id);
  });
}
