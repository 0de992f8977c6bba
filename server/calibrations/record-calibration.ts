import { type Db } from '#db/open-database';
import { calibrations } from '#db/schema/calibrations';
import { instruments } from '#db/schema/instruments';
import { record } from '#server/audit/record';
import { type Caller } from '#server/caller';
import { type Context } from '#server/context';
import { dayOf, findInstrument } from '#server/instruments/instrument-queries';
import { holdVersion, Refused } from '#server/problems';
import { openReview } from '#server/reviews/open-review';
import { type CalibrationBody, type recordCalibration as Recorded } from '#shared/contract/calibrations';
import { type Fault } from '#shared/contract/problem';
import { isWithinTolerance } from '#shared/measurement/within-tolerance';
import { desc, eq } from 'drizzle-orm';
import type * as z from 'zod';

type Reply = z.input<(typeof Recorded)['reply']>;

/** What contradicts itself in a calibration: its day, or its result and its points. */
function faultsOf({ calibratedOn, asFound, points }: CalibrationBody, today: string): Fault[] {
  const faults: Fault[] = [];
  if (calibratedOn > today) faults.push({ path: ['calibratedOn'], message: 'This day has not come yet.' });
  if (asFound === 'in-tolerance')
    points.forEach(({ found, reference, limit }, index) => {
      if (!isWithinTolerance(found, reference, limit))
        faults.push({ path: ['points', index, 'found'], message: 'This is beyond its limit: out of tolerance.' });
    });
  return faults;
}

/** The due date goes by the newest calibration; one that is entered late changes nothing of today. */
function isNewest(db: Db, instrumentId: number, calibratedOn: string): boolean {
  const newest = db
    .select({ calibratedOn: calibrations.calibratedOn })
    .from(calibrations)
    .where(eq(calibrations.instrumentId, instrumentId))
    .orderBy(desc(calibrations.calibratedOn))
    .limit(1)
    .get();
  return newest === undefined || newest.calibratedOn <= calibratedOn;
}

/**
 * Records a calibration. The newest one sets the day of the next; one that found the instrument out of tolerance withdraws
 * it and opens a review of what rests on it.
 *
 * @throws {Refused} naming the field that contradicts the others
 */
export function recordCalibration(
  { db, clock }: Context,
  caller: Caller,
  { id, version, body }: { id: number; version: number; body: CalibrationBody },
): Reply {
  return db.transaction((tx) => {
    const at = clock.now();
    const today = dayOf(at);
    const before = findInstrument(tx, id, today);
    holdVersion('The instrument', before.version, version);
    const faults = faultsOf(body, today);
    if (faults.length > 0) throw new Refused('calibration-refused', 'The calibration contradicts itself.', faults);
    const isOut = body.asFound === 'out-of-tolerance';
    const calibrationDue = isNewest(tx, id, body.calibratedOn) ? body.dueOn : before.calibrationDue;
    const { id: calibrationId } = tx
      .insert(calibrations)
      .values({ ...body, instrumentId: id, recordedAt: at.toISOString(), recordedById: caller.id })
      .returning({ id: calibrations.id })
      .get();
    const status = isOut ? 'withdrawn' : before.status;
    tx.update(instruments)
      .set({ calibrationDue, status, version: before.version + 1 })
      .where(eq(instruments.id, id))
      .run();
    record(tx, {
      at,
      person: caller,
      action: 'calibrated',
      subject: 'instrument',
      subjectId: id,
      before: { calibrationDue: before.calibrationDue, status: before.status },
      after: { calibrationDue, status, calibration: body },
    });
    const reviewId = isOut ? openReview(tx, { at, caller, instrumentId: id, calibrationId, body }) : null;
    return { instrument: findInstrument(tx, id, today), calibrationId, reviewId };
  });
}
