import { type Db } from '#db/open-database';
import { calibrations, instrumentReviews, reviewLots } from '#db/schema/calibrations';
import { record } from '#server/audit/record';
import { type Caller } from '#server/caller';
import { dayOf } from '#server/instruments/instrument-queries';
import { nextNumber } from '#server/numbers/next-number';
import { type CalibrationBody } from '#shared/contract/calibrations';
import { and, desc, eq, lt, ne, or } from 'drizzle-orm';
import { lotsInDoubt } from './doubt';

const DAY = 24 * 60 * 60 * 1000;

/** The day after the last calibration that left the instrument good: in tolerance as found, or adjusted. */
function firstDayInDoubt(db: Db, instrumentId: number, before: string): string | null {
  const good = db
    .select({ calibratedOn: calibrations.calibratedOn })
    .from(calibrations)
    .where(
      and(
        eq(calibrations.instrumentId, instrumentId),
        lt(calibrations.calibratedOn, before),
        or(ne(calibrations.asFound, 'out-of-tolerance'), eq(calibrations.adjusted, true)),
      ),
    )
    .orderBy(desc(calibrations.calibratedOn))
    .limit(1)
    .get();
  return good ? dayOf(new Date(Date.parse(good.calibratedOn) + DAY)) : null;
}

/**
 * Opens the review of an instrument that was found out of tolerance, inside the transaction that records the calibration:
 * every lot with a reading taken with it since the last good calibration must be assessed.
 *
 * @returns the review's id
 */
export function openReview(
  db: Db,
  found: { at: Date; caller: Caller; instrumentId: number; calibrationId: number; body: CalibrationBody },
): number {
  const { at, caller, instrumentId, calibrationId, body } = found;
  const from = firstDayInDoubt(db, instrumentId, body.calibratedOn);
  // What was not adjusted is as far off afterwards as it was before.
  const to = body.adjusted ? body.calibratedOn : dayOf(at);
  const number = nextNumber(db, 'IR', at.getUTCFullYear());
  const { id } = db
    .insert(instrumentReviews)
    .values({ number, calibrationId, doubtFrom: from, doubtTo: to, openedAt: at.toISOString() })
    .returning({ id: instrumentReviews.id })
    .get();
  const lots = lotsInDoubt(db, { instrumentId, from, to });
  for (const lot of lots)
    db.insert(reviewLots)
      .values({ reviewId: id, ...lot })
      .run();
  record(db, {
    at,
    person: caller,
    action: 'opened',
    subject: 'review',
    subjectId: id,
    after: { number, instrument: instrumentId, from, to, lots: lots.length },
  });
  return id;
}
