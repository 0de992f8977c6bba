import { type Db } from '#db/open-database';
import { calibrations, instrumentReviews, reviewLots } from '#db/schema/calibrations';
import { instruments } from '#db/schema/instruments';
import { people } from '#db/schema/people';
import { findCalibration } from '#server/calibrations/calibration-view';
import { certificatesOfLot } from '#server/certificates/certificate-queries';
import { findLot } from '#server/lots/lot-rows';
import { NotFound } from '#server/problems';
import { type DoubtfulReading, type Review } from '#shared/contract/calibrations';
import { and, asc, desc, eq, isNotNull, sql } from 'drizzle-orm';
import { type Doubt } from './doubt';
import { doubtfulReadings, type LotReading } from './doubtful-readings';

type ReviewHead = Omit<Review, 'calibration' | 'closedBy' | 'conclusion' | 'affected' | 'version'>;

function joined(db: Db) {
  return db
    .select({
      review: instrumentReviews,
      calibratedOn: calibrations.calibratedOn,
      instrument: {
        id: instruments.id,
        assetNumber: instruments.assetNumber,
        description: instruments.description,
      },
      closedBy: people.name,
    })
    .from(instrumentReviews)
    .innerJoin(calibrations, eq(calibrations.id, instrumentReviews.calibrationId))
    .innerJoin(instruments, eq(instruments.id, calibrations.instrumentId))
    .leftJoin(people, eq(people.id, instrumentReviews.closedById));
}

type JoinedReview = NonNullable<ReturnType<ReturnType<typeof joined>['get']>>;

function headOf(db: Db, { review, calibratedOn, instrument }: JoinedReview): ReviewHead {
  const { id, number, doubtFrom, doubtTo, openedAt, closedAt } = review;
  const counted = db
    .select({ lots: sql<number>`count(*)`, assessed: sql<number>`count(${reviewLots.effect})` })
    .from(reviewLots)
    .where(eq(reviewLots.reviewId, id))
    .get();
  return {
    ...{ id, number, instrument, calibratedOn, doubtFrom, doubtTo, openedAt, closedAt },
    lots: counted?.lots ?? 0,
    assessed: counted?.assessed ?? 0,
  };
}

/** All reviews, open ones first, then the newest. */
export function listReviews(db: Db): ReviewHead[] {
  return joined(db)
    .orderBy(isNotNull(instrumentReviews.closedAt), desc(instrumentReviews.id))
    .all()
    .map((row) => headOf(db, row));
}

export type ReviewRow = typeof instrumentReviews.$inferSelect;

/** @throws {NotFound} */
function found(db: Db, id: number): JoinedReview {
  const row = joined(db).where(eq(instrumentReviews.id, id)).get();
  if (!row) throw new NotFound('This review');
  return row;
}

/** @throws {NotFound} */
export function findReviewRow(db: Db, id: number): ReviewRow {
  return found(db, id).review;
}

function doubtOf({ review, instrument }: JoinedReview): Doubt {
  return { instrumentId: instrument.id, from: review.doubtFrom, to: review.doubtTo };
}

/** How many could have been turned; null as soon as that is not known of one. */
function countNear(items: readonly DoubtfulReading[]): number | null {
  const measured = items.filter(({ value }) => value !== null);
  if (measured.some(({ nearLimit }) => nearLimit === null)) return null;
  return measured.filter(({ nearLimit }) => nearLimit === true).length;
}

function readingsByLot(items: readonly LotReading[]): Map<number, DoubtfulReading[]> {
  const byLot = new Map<number, DoubtfulReading[]>();
  for (const { lotId, reading } of items) {
    const known = byLot.get(lotId);
    if (known) known.push(reading);
    else byLot.set(lotId, [reading]);
  }
  return byLot;
}

/** A review with every lot and certificate that rests on the instrument. @throws {NotFound} */
export function findReview(db: Db, id: number): Review {
  const row = found(db, id);
  const { review, instrument, closedBy } = row;
  const calibration = findCalibration(db, instrument.id, review.calibrationId);
  const readings = readingsByLot(doubtfulReadings(db, doubtOf(row), calibration.points));
  const affected = db
    .select({ row: reviewLots, assessedBy: people.name })
    .from(reviewLots)
    .leftJoin(people, eq(people.id, reviewLots.assessedById))
    .where(eq(reviewLots.reviewId, id))
    .orderBy(asc(reviewLots.lotId))
    .all()
    .map(({ row: { lotId, readings: count, effect, note }, assessedBy }) => {
      const { lot, part, supplier } = findLot(db, lotId);
      const items = readings.get(lotId) ?? [];
      const times = items.map(({ takenAt }) => takenAt).sort();
      return {
        lot: { id: lot.id, number: lot.number, status: lot.status, part: part.number, supplier: supplier.name },
        readings: count,
        firstAt: times[0] ?? lot.arrivedAt,
        lastAt: times.at(-1) ?? lot.arrivedAt,
        nearLimit: countNear(items),
        certificates: certificatesOfLot(db, lotId),
        ...{ effect, note, assessedBy },
      };
    });
  return {
    ...headOf(db, row),
    calibration,
    closedBy,
    conclusion: review.conclusion,
    affected,
    version: review.version,
  };
}

/** Every reading of a lot that a review puts in doubt. @throws {NotFound} where the review has no such lot */
export function readingsInDoubt(db: Db, id: number, lotId: number): DoubtfulReading[] {
  const row = found(db, id);
  const of = and(eq(reviewLots.reviewId, id), eq(reviewLots.lotId, lotId));
  if (!db.select().from(reviewLots).where(of).get()) throw new NotFound('This lot of the review');
  const { points } = findCalibration(db, row.instrument.id, row.review.calibrationId);
  return doubtfulReadings(db, doubtOf(row), points, lotId).map(({ reading }) => reading);
}
