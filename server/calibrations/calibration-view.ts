import { type Db } from '#db/open-database';
import { calibrations, instrumentChecks, instrumentReviews } from '#db/schema/calibrations';
import { people } from '#db/schema/people';
import { storedFiles } from '#db/schema/stored-files';
import { findInstrument } from '#server/instruments/instrument-queries';
import { NotFound } from '#server/problems';
import { type Calibration, type readInstrumentHistory } from '#shared/contract/calibrations';
import { and, desc, eq } from 'drizzle-orm';
import type * as z from 'zod';

type History = z.input<(typeof readInstrumentHistory)['reply']>;

function joined(db: Db) {
  return db
    .select({
      calibration: calibrations,
      file: {
        fileName: storedFiles.fileName,
        mediaType: storedFiles.mediaType,
        bytes: storedFiles.bytes,
        sha256: storedFiles.sha256,
      },
      recordedBy: people.name,
      reviewId: instrumentReviews.id,
    })
    .from(calibrations)
    .innerJoin(people, eq(people.id, calibrations.recordedById))
    .leftJoin(storedFiles, eq(storedFiles.id, calibrations.fileId))
    .leftJoin(instrumentReviews, eq(instrumentReviews.calibrationId, calibrations.id));
}

function view({
  calibration,
  file,
  recordedBy,
  reviewId,
}: NonNullable<ReturnType<ReturnType<typeof joined>['get']>>): Calibration {
  const { id, calibratedOn, dueOn, laboratory, certificateNumber, asFound, adjusted, points, note, recordedAt } =
    calibration;
  return {
    ...{ id, calibratedOn, dueOn, laboratory, certificateNumber, asFound, adjusted, points, note, recordedAt },
    ...{ file, recordedBy, reviewId },
  };
}

/** @throws {NotFound} also where the calibration is another instrument's */
export function findCalibration(db: Db, instrumentId: number, id: number): Calibration {
  const found = joined(db)
    .where(and(eq(calibrations.id, id), eq(calibrations.instrumentId, instrumentId)))
    .get();
  if (!found) throw new NotFound('This calibration');
  return view(found);
}

/** Checks are many; the page shows the last of them. */
const MOST_CHECKS = 60;

/** Calibrations, checks and reviews of an instrument, newest first. @throws {NotFound} */
export function instrumentHistory(db: Db, instrumentId: number, today: string): History {
  findInstrument(db, instrumentId, today);
  const known = joined(db)
    .where(eq(calibrations.instrumentId, instrumentId))
    .orderBy(desc(calibrations.calibratedOn), desc(calibrations.id))
    .all();
  const checks = db
    .select({ check: instrumentChecks, person: people.name })
    .from(instrumentChecks)
    .innerJoin(people, eq(people.id, instrumentChecks.personId))
    .where(eq(instrumentChecks.instrumentId, instrumentId))
    .orderBy(desc(instrumentChecks.id))
    .limit(MOST_CHECKS)
    .all();
  const reviews = db
    .select({
      id: instrumentReviews.id,
      number: instrumentReviews.number,
      openedAt: instrumentReviews.openedAt,
      closedAt: instrumentReviews.closedAt,
    })
    .from(instrumentReviews)
    .innerJoin(calibrations, eq(calibrations.id, instrumentReviews.calibrationId))
    .where(eq(calibrations.instrumentId, instrumentId))
    .orderBy(desc(instrumentReviews.id))
    .all();
  return {
    calibrations: known.map(view),
    checks: checks.map(({ check: { id, day, observed, reference, tolerance, passed, at }, person }) => ({
      ...{ id, day, observed, reference, tolerance, passed, at, person },
    })),
    reviews,
  };
}
