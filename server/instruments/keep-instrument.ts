import { type Db } from '#db/open-database';
import { instruments } from '#db/schema/instruments';
import { record } from '#server/audit/record';
import { type Caller } from '#server/caller';
import { type Context } from '#server/context';
import { Conflict, holdVersion } from '#server/problems';
import { holdUnique } from '#server/taken';
import {
  rangeBody,
  type addInstrument as Add,
  type changeInstrument as Change,
  type Instrument,
} from '#shared/contract/instruments';
import { eq } from 'drizzle-orm';
import type * as z from 'zod';
import { dailyReferenceColumns } from './daily-reference';
import { dayOf, findInstrument } from './instrument-queries';
import { keepRanges } from './instrument-ranges';

type Added = z.output<(typeof Add)['body']>;
type Changed = z.output<(typeof Change)['body']>;

function holdOwnNumber(db: Db, own: number | undefined, assetNumber: string): void {
  holdUnique(db, instruments, own, [
    { column: instruments.assetNumber, value: assetNumber, path: ['assetNumber'], message: 'This number is taken.' },
  ]);
}

function columnsOf({ ranges, dailyReference, ...columns }: Changed) {
  return { ...columns, ...dailyReferenceColumns(dailyReference), ranges };
}

export function addInstrument({ db, clock }: Context, caller: Caller, body: Added): Instrument {
  return db.transaction((tx) => {
    const now = clock.now();
    holdOwnNumber(tx, undefined, body.assetNumber);
    const { ranges, ...columns } = columnsOf(body);
    const { calibrationDue } = body;
    const { id } = tx
      .insert(instruments)
      .values({ ...columns, calibrationDue })
      .returning({ id: instruments.id })
      .get();
    keepRanges(tx, id, ranges, now);
    record(tx, { at: now, person: caller, action: 'added', subject: 'instrument', subjectId: id, after: body });
    return findInstrument(tx, id, dayOf(now));
  });
}

/** What the contract's body holds of an instrument as it stands. */
function bodyOf(instrument: Instrument): Changed {
  const { assetNumber, kind, description, serialNumber, place, status, dailyReference } = instrument;
  const ranges = instrument.ranges.map((range) => rangeBody.parse(range));
  return { assetNumber, kind, description, serialNumber, place, status, dailyReference, ranges };
}

/** An instrument found out of tolerance comes back into service when it is answered what rests on it. */
function holdReviewed(before: Instrument, body: Changed): void {
  if (body.status === 'in-service' && before.status === 'withdrawn' && before.openReview)
    throw new Conflict(
      'review-open',
      `${before.assetNumber} was found out of tolerance: close review ${before.openReview.number} first.`,
    );
}

export function changeInstrument(
  { db, clock }: Context,
  caller: Caller,
  { id, version, body }: { id: number; version: number; body: Changed },
): Instrument {
  return db.transaction((tx) => {
    const now = clock.now();
    const before = findInstrument(tx, id, dayOf(now));
    holdVersion('The instrument', before.version, version);
    holdOwnNumber(tx, id, body.assetNumber);
    holdReviewed(before, body);
    const { ranges, ...columns } = columnsOf(body);
    tx.update(instruments)
      .set({ ...columns, version: before.version + 1 })
      .where(eq(instruments.id, id))
      .run();
    keepRanges(tx, id, ranges, now);
    const change = { action: 'changed', subject: 'instrument', subjectId: id, before: bodyOf(before), after: body };
    record(tx, { at: now, person: caller, ...change });
    return findInstrument(tx, id, dayOf(now));
  });
}
