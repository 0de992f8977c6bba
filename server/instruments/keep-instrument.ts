import { type Db } from '#db/open-database';
import { instruments } from '#db/schema/instruments';
import { record } from '#server/audit/record';
import { type Caller } from '#server/caller';
import { type Context } from '#server/context';
import { holdVersion, NotFound } from '#server/problems';
import { holdUnique } from '#server/taken';
import { type Instrument, type instrumentBody } from '#shared/contract/instruments';
import { eq } from 'drizzle-orm';
import type * as z from 'zod';
import { dayOf, findInstrument } from './instrument-queries';

type Body = z.output<typeof instrumentBody>;

function holdOwnNumber(db: Db, own: number | undefined, assetNumber: string): void {
  holdUnique(db, instruments, own, [
    { column: instruments.assetNumber, value: assetNumber, path: ['assetNumber'], message: 'This number is taken.' },
  ]);
}

export function addInstrument({ db, clock }: Context, caller: Caller, body: Body): Instrument {
  return db.transaction((tx) => {
    const now = clock.now();
    holdOwnNumber(tx, undefined, body.assetNumber);
    const { id } = tx.insert(instruments).values(body).returning({ id: instruments.id }).get();
    record(tx, { at: now, person: caller, action: 'added', subject: 'instrument', subjectId: id, after: body });
    return findInstrument(tx, id, dayOf(now));
  });
}

export function changeInstrument(
  { db, clock }: Context,
  caller: Caller,
  { id, version, body }: { id: number; version: number; body: Body },
): Instrument {
  return db.transaction((tx) => {
    const now = clock.now();
    const row = tx.select().from(instruments).where(eq(instruments.id, id)).get();
    if (!row) throw new NotFound('This instrument');
    const { version: current, ...before } = row;
    holdVersion('The instrument', current, version);
    holdOwnNumber(tx, id, body.assetNumber);
    tx.update(instruments)
      .set({ ...body, version: current + 1 })
      .where(eq(instruments.id, id))
      .run();
    const change = { action: 'changed', subject: 'instrument', subjectId: id, before, after: body };
    record(tx, { at: now, person: caller, ...change });
    return findInstrument(tx, id, dayOf(now));
  });
}
