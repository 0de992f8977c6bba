import * as z from 'zod';
import { LARGEST_VALUE } from '#shared/quantities/largest-value';
import { SPREADS, VARIANCE_SOURCES } from '#shared/statistics/gauge-study/gauge-study';
import { byId, endpoint, file } from './endpoint';
import { id, line, moment, prose, version } from './fields';
import { pageOf, pageQuery } from './page';
import { UNITS } from './plans';
import { type Role } from './roles';

const READERS = ['inspector', 'quality', 'engineering', 'auditor', 'admin'] as const satisfies readonly Role[];

/** How large a study may be: the constants of the average-and-range method are there for these. */
export const STUDY_SIZE = {
  parts: { least: 2, most: 30 },
  persons: { least: 2, most: 10 },
  trials: { least: 2, most: 10 },
} as const;

const si = z
  .number()
  .min(-LARGEST_VALUE, 'This is too far below zero.')
  .max(LARGEST_VALUE, 'This is too large.')
  .nullable();

function distinct(names: readonly string[]): boolean {
  return new Set(names).size === names.length;
}

/** The names of what is crossed. */
const names = ({ least, most }: { least: number; most: number }) =>
  z.array(line(40)).min(least).max(most).refine(distinct, 'Each name once.');

/** Readings `[part][person][trial]` in SI base units; null where none is entered yet. */
export const studyValues = z.array(z.array(z.array(si)));

const fields = z.object({
  title: line(120),
  instrumentId: id,
  /** What was measured, as "ripple at full load". */
  quantity: line(60),
  unit: z.enum(UNITS),
  decimals: z.int().min(0).max(6),
  /** Limits of what was measured, in SI base units; the share of tolerance needs both. */
  lowerLimit: si,
  upperLimit: si,
  parts: names(STUDY_SIZE.parts),
  persons: names(STUDY_SIZE.persons),
  trials: z.int().min(STUDY_SIZE.trials.least).max(STUDY_SIZE.trials.most),
  values: studyValues,
  note: prose(2000),
});

type StudyFields = z.infer<typeof fields>;

/** Whether the readings have a place for every part, person and trial, and no more. */
function fits({ parts, persons, trials, values }: StudyFields): boolean {
  return (
    values.length === parts.length &&
    values.every((rows) => rows.length === persons.length && rows.every((cells) => cells.length === trials))
  );
}

export const gaugeStudyBody = fields
  .refine(({ lowerLimit, upperLimit }) => lowerLimit === null || upperLimit === null || lowerLimit < upperLimit, {
    path: ['upperLimit'],
    message: 'The upper limit must be above the lower one.',
  })
  .refine(fits, { path: ['values'], message: 'A place for each part, person and trial is needed.' });
export type GaugeStudyBody = z.infer<typeof gaugeStudyBody>;

const share = z.object({
  spread: z.enum(SPREADS),
  sigma: z.number(),
  ofVariation: z.number().nullable(),
  ofVariance: z.number().nullable(),
  ofTolerance: z.number().nullable(),
  setToZero: z.boolean(),
});
const analysis = z.object({ shares: z.array(share), categories: z.int().nullable() });
const varianceTable = z.object({
  lines: z.array(
    z.object({
      source: z.enum(VARIANCE_SOURCES),
      degreesOfFreedom: z.int(),
      sumOfSquares: z.number(),
      meanSquare: z.number().nullable(),
      f: z.number().nullable(),
      p: z.number().nullable(),
      against: z.enum(['interaction', 'repeatability']).nullable(),
    }),
  ),
  analysis,
});

/** What a whole study says, by both methods; standard deviations in SI base units, shares as fractions. */
export const studyResults = z.object({
  varianceWithInteraction: varianceTable,
  variancePooled: varianceTable,
  /** Whether the pooled table is the one to go by. */
  pooled: z.boolean(),
  averageRange: z.object({
    analysis,
    meanRange: z.number(),
    rangeOfPersons: z.number(),
    rangeOfParts: z.number(),
  }),
});
export type StudyResults = z.infer<typeof studyResults>;

export const GAUGE_STUDY_STATUSES = ['open', 'closed'] as const;

export const gaugeStudyHead = z.object({
  id,
  number: z.string(),
  title: z.string(),
  instrument: z.object({ id, assetNumber: z.string(), description: z.string() }),
  quantity: z.string(),
  status: z.enum(GAUGE_STUDY_STATUSES),
  entered: z.int(),
  needed: z.int(),
  /** The gauge's share of the total variation, as a fraction; null while readings are missing or do not differ. */
  gaugeOfVariation: z.number().nullable(),
  author: z.string(),
  createdAt: moment,
  closedAt: moment.nullable(),
});
export type GaugeStudyHead = z.infer<typeof gaugeStudyHead>;

export const gaugeStudy = gaugeStudyHead.extend({
  ...fields.omit({ instrumentId: true }).shape,
  version,
  /** Null while a reading is missing. */
  results: studyResults.nullable(),
});
export type GaugeStudy = z.infer<typeof gaugeStudy>;

export const listGaugeStudies = endpoint({
  method: 'GET',
  path: '/api/gauge-studies',
  who: READERS,
  summary: 'Gauge studies, newest first.',
  query: pageQuery,
  reply: pageOf(gaugeStudyHead),
});
export const readGaugeStudy = endpoint({
  method: 'GET',
  path: '/api/gauge-studies/:id',
  who: READERS,
  summary: 'One gauge study, with its results when every reading is entered.',
  params: byId,
  reply: gaugeStudy,
});
export const addGaugeStudy = endpoint({
  method: 'POST',
  path: '/api/gauge-studies',
  who: ['quality'],
  summary: 'Begin a gauge study; readings may be missing.',
  body: gaugeStudyBody,
  status: 201,
  reply: gaugeStudy,
});
export const changeGaugeStudy = endpoint({
  method: 'PUT',
  path: '/api/gauge-studies/:id',
  who: ['quality'],
  summary: 'Change an open gauge study or enter its readings.',
  params: byId,
  body: gaugeStudyBody,
  versioned: true,
  reply: gaugeStudy,
});
export const closeGaugeStudy = endpoint({
  method: 'POST',
  path: '/api/gauge-studies/:id/closure',
  who: ['quality'],
  summary: 'Close a gauge study whose readings are all entered; it changes no more.',
  params: byId,
  versioned: true,
  reply: gaugeStudy,
});
export const printGaugeStudy = endpoint({
  method: 'GET',
  path: '/api/gauge-studies/:id/file',
  who: READERS,
  summary: 'A gauge study with its results as PDF.',
  params: byId,
  media: 'application/pdf',
  reply: file,
});
