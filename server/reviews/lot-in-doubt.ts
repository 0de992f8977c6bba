import { type Db } from '#db/open-database';
import { calibrations, instrumentReviews, reviewLots } from '#db/schema/calibrations';
import { instruments } from '#db/schema/instruments';
import { readings } from '#db/schema/readings';
import { type LotDoubt } from '#shared/contract/calibrations';
import { and, eq, isNull, ne, or } from 'drizzle-orm';
import { inDoubt } from './doubt';

/**
 * Reviews that keep a lot from being released: they have not said what their doubt means for it, or asked that it be
 * measured again or recalled, and a reading in doubt still counts.
 */
export function lotInDoubt(db: Db, lotId: number): LotDoubt[] {
  return db
    .select({ review: instrumentReviews, instrument: instruments, effect: reviewLots.effect, note: reviewLots.note })
    .from(reviewLots)
    .innerJoin(instrumentReviews, eq(instrumentReviews.id, reviewLots.reviewId))
    .innerJoin(calibrations, eq(calibrations.id, instrumentReviews.calibrationId))
    .innerJoin(instruments, eq(instruments.id, calibrations.instrumentId))
    .where(and(eq(reviewLots.lotId, lotId), or(isNull(reviewLots.effect), ne(reviewLots.effect, 'none'))))
    .all()
    .filter(({ review, instrument }) => {
      const doubt = inDoubt({ instrumentId: instrument.id, from: review.doubtFrom, to: review.doubtTo });
      return (
        db
          .select({ id: readings.id })
          .from(readings)
          .where(and(eq(readings.lotId, lotId), doubt))
          .limit(1)
          .get() !== undefined
      );
    })
    .map(({ review, instrument, effect, note }) => ({
      ...{ reviewId: review.id, number: review.number, assetNumber: instrument.assetNumber },
      ...{ effect, note },
    }));
}
