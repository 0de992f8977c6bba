import * as z from 'zod';
import { byId, done, endpoint } from './endpoint';
import { moment, prose, reason } from './fields';
import { lot, samplingGroup } from './lots';
import { characteristic, decisionRule } from './plans';
import { LOT_READERS, type Role } from './roles';

const READERS = LOT_READERS.filter((one) => one !== 'receiving') as readonly Role[];

/** Per characteristic: what the sample showed. SI base units. */
export const characteristicResult = z.object({
  characteristic,
  n: z.int(),
  found: z.int(),
  acceptance: z.int(),
  rejection: z.int(),
  min: z.number().nullable(),
  mean: z.number().nullable(),
  max: z.number().nullable(),
  s: z.number().nullable(),
  /** Worst reading, the farthest outside or the nearest to a limit. */
  worst: z.number().nullable(),
  /** The largest U of the counting readings; null where that of one is not known. */
  expandedUncertainty: z.number().nullable(),
  failedUnits: z.array(z.int()),
  failReasons: z.array(z.string()),
  /** Every counting reading in draw order, null where missing. */
  readings: z.array(z.object({ unit: z.int(), value: z.number().nullable(), pass: z.boolean().nullable() })),
});

export const unitState = z.enum(['conforming', 'minor', 'major', 'critical', 'undecided', 'not-judged']);

/** What quality looks at before signing. */
export const assessment = z.object({
  lot,
  verdict: z.enum(['continue', 'accepted', 'rejected']),
  reason: z.string(),
  stoppedAtUnit: z.int().nullable(),
  unitsJudged: z.int(),
  units: z.array(
    z.object({ unit: z.int(), state: unitState, failed: z.array(z.string()), serial: z.string().nullable() }),
  ),
  groups: z.array(
    z.object({ group: samplingGroup, found: z.int(), undecided: z.int(), verdict: z.string(), reason: z.string() }),
  ),
  characteristics: z.array(characteristicResult),
  /** How the plan lets measurement uncertainty enter, and its k. */
  decisionRule,
  coverageFactor: z.number(),
  instruments: z.array(
    z.object({
      assetNumber: z.string(),
      kind: z.string(),
      description: z.string(),
      calibrationDue: z.string(),
      readings: z.int(),
    }),
  ),
  takenBy: z.array(z.string()),
  repeats: z.int(),
  setAside: z.array(z.object({ unit: z.int(), reason: z.string() })),
  /** Why the caller may not release this lot; null when nothing stands against it. */
  objection: z.string().nullable(),
  measuredFrom: moment.nullable(),
  measuredTo: moment.nullable(),
});
export type Assessment = z.infer<typeof assessment>;

export const readAssessment = endpoint({
  method: 'GET',
  path: '/api/lots/:id/assessment',
  who: READERS,
  summary: 'What the sample of a drawn lot shows: units, groups, characteristics, instruments.',
  params: byId,
  reply: assessment,
});

const password = z.string().min(1, 'Type your password to sign.').max(200);

export const decideLot = endpoint({
  method: 'POST',
  path: '/api/lots/:id/decision',
  who: ['quality'],
  summary: 'Sign the verdict with the password: accepted is released with a certificate, rejected goes on hold.',
  params: byId,
  body: z.object({
    /** The verdict the signer saw; another one by now is refused. */
    verdict: z.enum(['accepted', 'rejected']),
    password,
    note: prose(500),
  }),
  versioned: true,
  reply: lot,
});
export const holdLot = endpoint({
  method: 'POST',
  path: '/api/lots/:id/hold',
  who: ['quality'],
  summary: 'Hold an acceptable submitted lot, with a reason.',
  params: byId,
  body: z.object({ password, reason }),
  versioned: true,
  reply: lot,
});
export const liftHold = endpoint({
  method: 'POST',
  path: '/api/lots/:id/hold/end',
  who: ['quality'],
  summary: 'Put a lot that quality held although acceptable back to decision, with a reason.',
  params: byId,
  body: z.object({ reason }),
  versioned: true,
  reply: done,
});
