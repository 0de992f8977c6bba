import * as z from 'zod';
import { FORMULAS, type FormulaKey } from '#shared/measurement/formula';
import { LARGEST_VALUE } from '#shared/quantities/largest-value';
import { AQLS, INSPECTION_LEVELS, NONCONFORMITY_CLASSES } from '#shared/sampling/scheme';
import { byId, endpoint } from './endpoint';
import { id, line, moment, optionalLine, prose, reason, version } from './fields';
import { instrumentKind } from './instruments';
import { LOT_READERS } from './roles';

export const aql = z.enum(AQLS);
export const inspectionLevel = z.enum(INSPECTION_LEVELS);
export const nonconformityClass = z.enum(NONCONFORMITY_CLASSES);

export const ENTRY_MODES = ['direct', 'scope'] as const;
export const REVISION_STATUSES = ['draft', 'in-review', 'effective', 'retired'] as const;
export type RevisionStatus = (typeof REVISION_STATUSES)[number];

/** How measurement uncertainty enters a verdict (ILAC-G8:09/2019). */
export const DECISION_RULES = ['simple', 'guarded', 'non-binary'] as const;
export const decisionRule = z.enum(DECISION_RULES);
export type DecisionRule = z.infer<typeof decisionRule>;
export const DECISION_RULE_TITLES: Record<DecisionRule, string> = {
  simple: 'Simple acceptance',
  guarded: 'Guarded acceptance',
  'non-binary': 'Guard band on both sides',
};

/** What a measured characteristic is of: the model's prediction, the method note and what a waveform yields go by it. */
export const MEASURANDS = [
  'ripple',
  'ripple-rms',
  'loaded-voltage',
  'no-load-voltage',
  'half-winding-peak',
  'current',
  'input-power',
  'output-power',
  'insulation-resistance',
  'junction-potential',
  'frequency',
  'temperature',
  'dimension',
  'other',
] as const;
export type Measurand = (typeof MEASURANDS)[number];
export const MEASURAND_TITLES: Record<Measurand, string> = {
  ripple: 'Ripple, peak to peak',
  'ripple-rms': 'Ripple, rms',
  'loaded-voltage': 'Voltage at full load',
  'no-load-voltage': 'Voltage without load',
  'half-winding-peak': 'Peak of a half-winding',
  current: 'Current',
  'input-power': 'Power from the mains',
  'output-power': 'Power at the output',
  'insulation-resistance': 'Insulation resistance',
  'junction-potential': 'Junction potential (diode test)',
  frequency: 'Frequency',
  temperature: 'Temperature',
  dimension: 'Dimension',
  other: 'Something else',
};

/** Units in which a reading is typed and shown; values are kept in SI base units. */
export const UNITS = [
  'V',
  'mV',
  'V p-p',
  'mV p-p',
  'A',
  'mA',
  'W',
  'mW',
  'Ω',
  'kΩ',
  'MΩ',
  'µF',
  'Hz',
  'K',
  '°C',
  'mm',
  's',
  '%',
] as const;

const formulaKeys = Object.keys(FORMULAS) as [FormulaKey, ...FormulaKey[]];

const common = {
  key: z
    .string()
    .trim()
    .regex(/^[a-z][a-z0-9_]{0,31}$/, 'Small letters, digits and underscores, starting with a letter.'),
  name: line(60),
  class: nonconformityClass,
  /** What it holds under, as "at 500 mA". */
  condition: optionalLine(60),
  method: prose(500),
  caution: prose(500),
  /** Own level and AQL of a slow or destructive characteristic; null: those of its class. */
  ownLevel: inspectionLevel.nullable(),
  ownAql: aql.nullable(),
};
const limit = z
  .number()
  .min(-LARGEST_VALUE, 'This is too far below zero.')
  .max(LARGEST_VALUE, 'This is too large.')
  .nullable();
/** Limits in SI base units. */
const limits = {
  unit: z.enum(UNITS),
  decimals: z.number().int().min(0).max(6),
  target: limit,
  lowerLimit: limit,
  upperLimit: limit,
};

export const characteristic = z.discriminatedUnion('kind', [
  z.object({
    kind: z.literal('measured'),
    ...common,
    ...limits,
    entryMode: z.enum(ENTRY_MODES),
    measurand: z.enum(MEASURANDS).default('other'),
    /** Where the alternate peaks of a ripple differ: whether the worst peak or their mean counts. */
    alternatePeaks: z.enum(['worst', 'mean']).default('worst'),
    instrumentKind: instrumentKind.nullable(),
  }),
  z.object({
    kind: z.literal('computed'),
    ...common,
    ...limits,
    formula: z.object({
      key: z.enum(formulaKeys),
      inputs: z.record(z.string(), z.string()),
      /** Ratings the formula takes beside readings, as the rated voltage; SI base units. */
      constants: z.record(z.string(), z.number()).default({}),
    }),
  }),
  z.object({
    kind: z.literal('attribute'),
    ...common,
    /** What a unit must be to pass, as "Legible, complete". */
    requirement: line(120),
    /** Reasons offered when it fails, keys 1 to 9. */
    failReasons: z.array(line(60)).max(9),
    instrumentKind: instrumentKind.nullable(),
  }),
]);
export type Characteristic = z.infer<typeof characteristic>;
/** As it was stored: a revision made before a field existed lacks it. */
export type StoredCharacteristic = z.input<typeof characteristic>;

export const classAql = z.object({ class: nonconformityClass, aql });

/** The content of a plan revision. Rules across fields are checked by shared/plan/plan-faults. */
export const revisionBody = z.object({
  level: inspectionLevel,
  classAqls: z.array(classAql).min(1, 'Give at least one class an AQL.').max(3),
  characteristics: z.array(characteristic).min(1, 'Add a characteristic.').max(40),
  decisionRule: decisionRule.default('simple'),
  /** k, by which the combined standard uncertainty is expanded; 2 for about 95 %. */
  coverageFactor: z.number().min(1, 'At least 1.').max(4, 'At most 4.').default(2),
  /** Minutes a unit warms up before it is measured; null where the plan asks for none. */
  warmUpMinutes: z.int().min(1, 'At least 1 minute.').max(600, 'At most 600 minutes.').nullable().default(null),
  changeNote: prose(1000),
});
export type RevisionBody = z.infer<typeof revisionBody>;

export const revision = revisionBody.extend({
  id,
  revision: z.int().positive(),
  status: z.enum(REVISION_STATUSES),
  author: z.string(),
  authorId: id,
  approver: z.string().nullable(),
  createdAt: moment,
  submittedAt: moment.nullable(),
  effectiveAt: moment.nullable(),
  retiredAt: moment.nullable(),
  version,
});
export type Revision = z.infer<typeof revision>;

const planHead = z.object({
  id,
  number: z.string(),
  part: z.object({ id, number: z.string(), name: z.string() }),
  effectiveRevision: z.int().nullable(),
  openRevision: z.object({ revision: z.int(), status: z.enum(['draft', 'in-review']) }).nullable(),
  characteristics: z.int(),
  effectiveAt: moment.nullable(),
});
export type PlanHead = z.infer<typeof planHead>;

/** A plan with its revisions, newest first; readers of effective plans get only effective and retired ones. */
export const plan = planHead.extend({
  revisions: z.array(revision),
  /** Whether the site lets a revision be approved by its author. */
  approveOwn: z.boolean(),
});
export type Plan = z.infer<typeof plan>;

export const listPlans = endpoint({
  method: 'GET',
  path: '/api/plans',
  who: LOT_READERS,
  summary: 'All plans; receiving and inspectors see those with an effective revision.',
  reply: z.object({ items: z.array(planHead) }),
});
export const readPlan = endpoint({
  method: 'GET',
  path: '/api/plans/:id',
  who: LOT_READERS,
  summary: 'A plan with its revisions.',
  params: byId,
  reply: plan,
});
export const addPlan = endpoint({
  method: 'POST',
  path: '/api/plans',
  who: ['quality'],
  summary: 'Start the plan of a part with a first draft.',
  body: z.object({ partId: id, content: revisionBody }),
  status: 201,
  reply: plan,
});

const byRevision = z.object({
  id: z.coerce.number().int().positive(),
  revision: z.coerce.number().int().positive(),
});

export const addRevision = endpoint({
  method: 'POST',
  path: '/api/plans/:id/revisions',
  who: ['quality'],
  summary: 'Draft the next revision as a copy of the newest one.',
  params: byId,
  status: 201,
  reply: plan,
});
export const changeRevision = endpoint({
  method: 'PUT',
  path: '/api/plans/:id/revisions/:revision',
  who: ['quality'],
  summary: 'Change a draft.',
  params: byRevision,
  body: revisionBody,
  versioned: true,
  reply: plan,
});
export const submitRevision = endpoint({
  method: 'POST',
  path: '/api/plans/:id/revisions/:revision/submission',
  who: ['quality'],
  summary: 'Send a draft for review.',
  params: byRevision,
  versioned: true,
  reply: plan,
});
export const returnRevision = endpoint({
  method: 'POST',
  path: '/api/plans/:id/revisions/:revision/return',
  who: ['quality'],
  summary: 'Send a revision in review back to draft, with a reason.',
  params: byRevision,
  body: z.object({ reason }),
  versioned: true,
  reply: plan,
});
export const approveRevision = endpoint({
  method: 'POST',
  path: '/api/plans/:id/revisions/:revision/approval',
  who: ['quality'],
  summary: 'Make a revision effective; its author cannot, unless the site waives that.',
  params: byRevision,
  versioned: true,
  reply: plan,
});
