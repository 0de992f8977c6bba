import * as z from 'zod';
import { readingEntry } from './bench';
import { AS_FOUND } from './calibrations';
import { endpoint } from './endpoint';
import { day, id, moment } from './fields';
import { instrumentKind, instrumentRange } from './instruments';
import { characteristic, decisionRule } from './plans';

/** A reading that a budget rests on, as it was taken. SI base units. */
const budgetReading = z.object({
  id: z.uuid(),
  /** The input of the formula it stands for; null where the result is the reading itself. */
  input: z.string().nullable(),
  characteristic,
  value: z.number(),
  entry: readingEntry.nullable(),
  attempt: z.int(),
  withdrawn: z.boolean(),
  takenAt: moment,
  takenBy: z.string().nullable(),
  rack: z.string().nullable(),
  /** U as it was kept with the reading. */
  expandedUncertainty: z.number().nullable(),
  instrument: z
    .object({
      id,
      assetNumber: z.string(),
      kind: instrumentKind,
      description: z.string(),
      /** The range as it was when the reading was taken; null where it was taken on none with an accuracy specification. */
      range: instrumentRange.nullable(),
      /** The last calibration before the reading; null where none is recorded. */
      calibration: z
        .object({
          calibratedOn: day,
          dueOn: day,
          laboratory: z.string(),
          certificateNumber: z.string(),
          asFound: z.enum(AS_FOUND),
        })
        .nullable(),
    })
    .nullable(),
});
export type BudgetReading = z.infer<typeof budgetReading>;

/** One line of a budget; SI base units, null degrees of freedom for infinitely many. */
export const budgetLine = z.object({
  line: z.int(),
  source: z.string(),
  input: z.string().nullable(),
  distribution: z.enum(['rectangular', 'normal']),
  halfWidth: z.number().nullable(),
  divisor: z.string(),
  standardUncertainty: z.number(),
  sensitivity: z.number(),
  contribution: z.number(),
  degreesOfFreedom: z.number().nullable(),
  /** What its origin contributes to the variance, on the first line of an origin. */
  share: z.number().nullable(),
  note: z.string().nullable(),
});
export type BudgetLine = z.infer<typeof budgetLine>;

const limits = z.object({ lower: z.number().nullable(), upper: z.number().nullable() });

/** What a budget combines to and how the plan judges by it. */
const budgetResult = z.object({
  lines: z.array(budgetLine),
  standardUncertainty: z.number(),
  degreesOfFreedom: z.number().nullable(),
  expandedUncertainty: z.number(),
  /** What the coverage factor covers, in a sentence. */
  coverage: z.string(),
  /** Width of the guard bands, and the limits between which a reading is accepted. */
  guardBand: z.number(),
  accepted: limits,
  fineness: z.discriminatedUnion('kind', [
    z.object({ kind: z.literal('ratio'), ratio: z.number(), coarse: z.boolean() }),
    z.object({ kind: z.literal('distance'), distance: z.number(), share: z.number() }),
    z.object({ kind: z.literal('none') }),
  ]),
  /** Probability that the true value lies within the limits; null without a limit. */
  conformityProbability: z.number().nullable(),
  verdict: z.enum(['conforming', 'conditional', 'nonconforming', 'not judged']),
  /** On which side of its limit a conditional value lies. */
  side: z.enum(['inside', 'outside']).nullable(),
});

export const budget = z.object({
  lot: z.object({ id, number: z.string(), part: z.string() }),
  unit: z.int(),
  characteristic,
  decisionRule,
  coverageFactor: z.number(),
  /** SI base unit; null where the readings give none. */
  value: z.number().nullable(),
  readings: z.array(budgetReading),
  /** Null where the uncertainty is not known; `unknown` says why. */
  result: budgetResult.nullable(),
  unknown: z.string(),
});
export type Budget = z.infer<typeof budget>;

export const readBudget = endpoint({
  method: 'GET',
  path: '/api/lots/:id/units/:unit/budgets/:key',
  who: ['inspector', 'quality', 'engineering', 'auditor'],
  summary: 'The uncertainty budget of a reading, or of what is computed from readings, line by line.',
  params: z.object({
    id: z.coerce.number().int().positive(),
    unit: z.coerce.number().int().positive(),
    key: z.string().max(32),
  }),
  /** Another reading than the one that counts. */
  query: z.object({ reading: z.uuid().optional() }),
  reply: budget,
});
