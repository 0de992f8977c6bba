import * as z from 'zod';
import { byId, endpoint, storedFile } from './endpoint';
import { day, id, line, moment, prose, reason, version } from './fields';
import { instrument } from './instruments';
import { type Role } from './roles';

const READERS = ['inspector', 'quality', 'engineering', 'auditor', 'admin'] as const satisfies readonly Role[];

/** How the laboratory found the instrument before any adjustment. */
export const AS_FOUND = ['in-tolerance', 'out-of-tolerance', 'not-recorded'] as const;
export const AS_FOUND_TITLES: Record<(typeof AS_FOUND)[number], string> = {
  'in-tolerance': 'In tolerance',
  'out-of-tolerance': 'Out of tolerance',
  'not-recorded': 'Not recorded',
};

/** One point of a calibration: what was applied, what the instrument showed as found, and how far off it may be. */
export const calibrationPoint = z.object({
  point: line(60),
  unit: line(10),
  reference: z.number(),
  found: z.number(),
  limit: z.number().positive('Must be more than 0.'),
});
export type CalibrationPoint = z.infer<typeof calibrationPoint>;

export const calibrationBody = z
  .object({
    calibratedOn: day,
    dueOn: day,
    laboratory: line(120),
    certificateNumber: line(60),
    asFound: z.enum(AS_FOUND),
    adjusted: z.boolean(),
    points: z.array(calibrationPoint).max(50),
    note: prose(1000),
  })
  .refine(({ calibratedOn, dueOn }) => dueOn > calibratedOn, {
    path: ['dueOn'],
    message: 'The next calibration is due after this one.',
  });
export type CalibrationBody = z.infer<typeof calibrationBody>;

export const calibration = z.object({
  ...calibrationBody.shape,
  id,
  file: z.object({ fileName: z.string(), mediaType: z.string(), bytes: z.int(), sha256: z.string() }).nullable(),
  recordedAt: moment,
  recordedBy: z.string(),
  reviewId: id.nullable(),
});
export type Calibration = z.infer<typeof calibration>;

export const instrumentCheck = z.object({
  id,
  day,
  observed: z.number(),
  reference: z.number(),
  tolerance: z.number(),
  passed: z.boolean(),
  at: moment,
  person: z.string(),
});
export type InstrumentCheck = z.infer<typeof instrumentCheck>;

/** Calibrations and checks of an instrument, newest first. */
export const readInstrumentHistory = endpoint({
  method: 'GET',
  path: '/api/instruments/:id/history',
  who: READERS,
  summary: 'Calibrations, reference checks and reviews of an instrument.',
  params: byId,
  reply: z.object({
    calibrations: z.array(calibration),
    checks: z.array(instrumentCheck),
    reviews: z.array(z.object({ id, number: z.string(), openedAt: moment, closedAt: moment.nullable() })),
  }),
});
export const recordCalibration = endpoint({
  method: 'POST',
  path: '/api/instruments/:id/calibrations',
  who: ['quality'],
  summary: 'Record a calibration; found out of tolerance withdraws the instrument and opens a review.',
  params: byId,
  body: calibrationBody,
  versioned: true,
  status: 201,
  reply: z.object({ instrument, calibrationId: id, reviewId: id.nullable() }),
});

const byCalibration = z.object({
  id: z.coerce.number().int().positive(),
  calibration: z.coerce.number().int().positive(),
});

export const attachCalibrationFile = endpoint({
  method: 'PUT',
  path: '/api/instruments/:id/calibrations/:calibration/file',
  who: ['quality'],
  summary: 'Attach the certificate of a calibration (PDF, PNG or JPEG); once attached it stays.',
  params: byCalibration,
  query: z.object({ fileName: line(200) }),
  upload: 20_000_000,
  reply: calibration,
});
export const readCalibrationFile = endpoint({
  method: 'GET',
  path: '/api/instruments/:id/calibrations/:calibration/file',
  who: READERS,
  summary: 'The certificate of a calibration as it was attached.',
  params: byCalibration,
  media: 'application/octet-stream',
  reply: storedFile,
});

export const recordCheck = endpoint({
  method: 'POST',
  path: '/api/instruments/:id/checks',
  who: ['inspector', 'quality'],
  summary: 'Record a check of an instrument against its reference, value in SI base units.',
  params: byId,
  body: z.object({ observed: z.number() }),
  status: 201,
  reply: instrumentCheck,
});

/** What a reading's doubt means for its lot. */
export const REVIEW_EFFECTS = ['none', 'measure-again', 'recall'] as const;
export const REVIEW_EFFECT_TITLES: Record<(typeof REVIEW_EFFECTS)[number], string> = {
  none: 'No effect on the verdict',
  'measure-again': 'Measure again',
  recall: 'Recall the lot',
};

export const reviewHead = z.object({
  id,
  number: z.string(),
  instrument: z.object({ id, assetNumber: z.string(), description: z.string() }),
  calibratedOn: day,
  /** The first day in doubt, that after the last good calibration; null where none is known. */
  doubtFrom: day.nullable(),
  doubtTo: day,
  openedAt: moment,
  closedAt: moment.nullable(),
  lots: z.int(),
  assessed: z.int(),
});
export const review = reviewHead.extend({
  calibration,
  closedBy: z.string().nullable(),
  conclusion: z.string().nullable(),
  affected: z.array(
    z.object({
      lot: z.object({ id, number: z.string(), status: z.string(), part: z.string(), supplier: z.string() }),
      readings: z.int(),
      firstAt: moment,
      lastAt: moment,
      /**
       * Readings so near a limit that the error found could have turned their verdict; null where the calibration has no
       * point of what they measure.
       */
      nearLimit: z.int().nullable(),
      certificates: z.array(z.object({ id, number: z.string(), status: z.string() })),
      effect: z.enum(REVIEW_EFFECTS).nullable(),
      note: z.string(),
      assessedBy: z.string().nullable(),
    }),
  ),
  version,
});
export type Review = z.infer<typeof review>;

export const listReviews = endpoint({
  method: 'GET',
  path: '/api/reviews',
  who: READERS,
  summary: 'Reviews of instruments found out of tolerance, open ones first.',
  reply: z.object({ items: z.array(reviewHead) }),
});
export const readReview = endpoint({
  method: 'GET',
  path: '/api/reviews/:id',
  who: READERS,
  summary: 'A review with every lot and certificate that rests on the instrument since its last good calibration.',
  params: byId,
  reply: review,
});

/** A reading in doubt. */
export const doubtfulReading = z.object({
  id: z.uuid(),
  unit: z.int(),
  characteristic: z.object({ key: z.string(), name: z.string(), unit: z.string(), decimals: z.int() }),
  lowerLimit: z.number().nullable(),
  upperLimit: z.number().nullable(),
  /** SI base unit. */
  value: z.number().nullable(),
  pass: z.boolean().nullable(),
  /** Whether the error found could have turned its verdict; null where it is not known. */
  nearLimit: z.boolean().nullable(),
  takenAt: moment,
  /** Null when a rack took it. */
  takenBy: z.string().nullable(),
});
export type DoubtfulReading = z.infer<typeof doubtfulReading>;

export const listDoubtfulReadings = endpoint({
  method: 'GET',
  path: '/api/reviews/:id/lots/:lot/readings',
  who: READERS,
  summary: 'Every reading of a lot that is in doubt, in the order of its units.',
  params: z.object({ id: z.coerce.number().int().positive(), lot: z.coerce.number().int().positive() }),
  reply: z.object({ items: z.array(doubtfulReading) }),
});

/** A review that has not cleared a lot: it says nothing of it yet, or asks that something be done about it. */
export const lotDoubt = z.object({
  reviewId: id,
  number: z.string(),
  assetNumber: z.string(),
  effect: z.enum(REVIEW_EFFECTS).nullable(),
  note: z.string(),
});
export type LotDoubt = z.infer<typeof lotDoubt>;

export const listLotDoubts = endpoint({
  method: 'GET',
  path: '/api/lots/:id/doubts',
  who: READERS,
  summary:
    'Reviews of instruments found out of tolerance that have not cleared a lot, as long as a doubtful reading counts.',
  params: byId,
  reply: z.object({ items: z.array(lotDoubt) }),
});

export const assessReviewLot = endpoint({
  method: 'PUT',
  path: '/api/reviews/:id/lots/:lot',
  who: ['quality'],
  summary: 'Say what the doubt means for one lot.',
  params: z.object({ id: z.coerce.number().int().positive(), lot: z.coerce.number().int().positive() }),
  body: z
    .object({ effect: z.enum(REVIEW_EFFECTS), note: prose(500) })
    .refine(({ effect, note }) => effect === 'none' || note.length >= 3, {
      path: ['note'],
      message: 'Say in a few words what is done about it.',
    }),
  versioned: true,
  reply: review,
});
export const closeReview = endpoint({
  method: 'POST',
  path: '/api/reviews/:id/closure',
  who: ['quality'],
  summary: 'Close a review of which every lot is assessed, with its conclusion.',
  params: byId,
  body: z.object({ conclusion: reason }),
  versioned: true,
  reply: review,
});
