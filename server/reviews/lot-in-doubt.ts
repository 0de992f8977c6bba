import { type Db } from '#db/open-database';
import { calibrations, instrumentReviews, reviewLots } from '#db/schema/calibrations';
import { instruments } from '#db/schema/instruments';
import { readings } from '#db/schema/readings';
import { and, eq, isNull, ne, or } from 'drizzle-orm';
import { inDoubt } from './doubt';

/** A review that has not cleared a lot. */
export interface LotDoubt {
  number: string;
  assetNumber: string;
}

/**
 * Reviews that keep a lot from being released: they have not said what their doubt means for it, or asked that it be
 * measured again or recalled, and a reading in doubt still counts.
 */
export function lotInDoubt(db: Db, lotId: number): LotDoubt[] {
  return db
    .select({ review: instrumentReviews, instrument: instruments })
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
    .map(({ review, instrument }) => ({ number: review.number, assetNumber: instrument.assetNumber }));
}
