import * as z from 'zod';
import { notedConditions } from './conditions';
import { byId, done, endpoint } from './endpoint';
import { id, moment, optionalLine, reason, version } from './fields';
import { instrument } from './instruments';
import { lotHead, lotSampling } from './lots';
import { expectedBands } from './parts';
import { characteristic, decisionRule } from './plans';
import { type Role } from './roles';

const READERS = ['inspector', 'quality', 'engineering', 'auditor'] as const satisfies readonly Role[];
const WRITERS = ['inspector', 'quality'] as const satisfies readonly Role[];

/** Reasons for which a reading may be repeated. */
export const REPEAT_REASONS = ['contact', 'wrong-range', 'warm-up', 'wrong-load', 'typing', 'other'] as const;
export const REPEAT_REASON_TITLES: Record<(typeof REPEAT_REASONS)[number], string> = {
  contact: 'Poor contact',
  'wrong-range': 'Wrong range or scale',
  'warm-up': 'Not warmed up',
  'wrong-load': 'Wrong load or line voltage',
  typing: 'Typing slip',
  other: 'Other',
};

/** Reasons for keeping a reading that is far from what the part can give. */
export const CONFIRM_REASONS = ['measured-again', 'known-fault', 'other-load', 'model-wrong', 'other'] as const;
export const CONFIRM_REASON_TITLES: Record<(typeof CONFIRM_REASONS)[number], string> = {
  'measured-again': 'Measured again, same value',
  'known-fault': 'The unit is faulty',
  'other-load': 'Load or line voltage differ',
  'model-wrong': 'The part’s model does not fit',
  other: 'Other',
};

const divisions = z.number().positive('Must be more than 0.').max(100);
const voltsPerDivision = z.number().positive('Must be more than 0.').max(1000);
const probeFactor = z.number().positive('Must be more than 0.').max(10000);
const coupling = z.enum(['ac', 'dc']);

/** What the inspector typed. The server computes the value from it. */
export const readingEntry = z.discriminatedUnion('kind', [
  z.object({ kind: z.literal('direct'), text: z.string().trim().min(1).max(40), decimalComma: z.boolean() }),
  z.object({
    kind: z.literal('scope'),
    scope: z.discriminatedUnion('form', [
      z.object({ form: z.literal('whole'), divisions, voltsPerDivision, probeFactor, coupling }),
      z.object({
        form: z.literal('halves'),
        upperDivisions: divisions,
        lowerDivisions: divisions,
        voltsPerDivision,
        probeFactor,
        coupling,
      }),
      z.object({
        form: z.literal('alternate'),
        higherDivisions: divisions,
        lowerDivisions: divisions,
        voltsPerDivision,
        probeFactor,
        coupling,
      }),
    ]),
    /** The fields as they were typed, shown again so. */
    typed: z.record(z.string().max(20), z.string().max(40)).optional(),
  }),
  z.object({ kind: z.literal('waveform'), waveformId: z.uuid() }),
  z.object({ kind: z.literal('attribute'), pass: z.boolean(), reason: optionalLine(120) }),
]);
export type ReadingEntry = z.infer<typeof readingEntry>;

export const repeat = z.object({ reason: z.enum(REPEAT_REASONS), note: optionalLine(200) });

/** A confirmed answer to the plausibility question, or a correction made at it. */
export const plausibilityAnswer = z.discriminatedUnion('answer', [
  z.object({ answer: z.literal('confirmed'), reason: z.enum(CONFIRM_REASONS), note: optionalLine(200) }),
  /** What stood there before it was corrected, and its value in SI base units. */
  z.object({ answer: z.literal('corrected'), from: readingEntry, fromValue: z.number() }),
]);
export type PlausibilityAnswer = z.infer<typeof plausibilityAnswer>;

/** How the question was answered, as kept; "open" while nobody has, as with a rack's readings. */
export const plausibilityQuestion = z.object({
  band: z.object({ low: z.number(), high: z.number() }),
  /** The question in words. */
  sentence: z.string(),
  given: z.union([plausibilityAnswer, z.object({ answer: z.literal('open') })]),
  answeredBy: z.string().nullable(),
  answeredAt: moment.nullable(),
});
export type PlausibilityQuestion = z.infer<typeof plausibilityQuestion>;

export const readingBody = z.object({
  unit: z.int().positive(),
  characteristicKey: z.string().max(32),
  entry: readingEntry,
  instrumentId: id.nullable(),
  /** The range it was read on; null lets the server take the smallest one that holds the value. */
  rangeId: id.nullable().default(null),
  note: optionalLine(300),
  /** Where the value is far from what the part can give: the answer to that question. */
  question: plausibilityAnswer.nullable().default(null),
  /** Present when the reading repeats an earlier one of the same unit and characteristic. */
  repeat: repeat.nullable(),
  /** When it was typed, by the clock of the bench. */
  takenAt: moment,
});
export type ReadingBody = z.infer<typeof readingBody>;

export const reading = z.object({
  id: z.uuid(),
  unit: z.int(),
  characteristicKey: z.string(),
  /** SI base unit; null for an attribute. */
  value: z.number().nullable(),
  pass: z.boolean().nullable(),
  /** What was typed; null when a rack took it. */
  entry: readingEntry.nullable(),
  instrumentId: id.nullable(),
  rangeId: id.nullable(),
  /** U = k u_c in SI base units; null where it is not known. */
  expandedUncertainty: z.number().nullable(),
  waveformId: z.uuid().nullable(),
  question: plausibilityQuestion.nullable(),
  note: z.string(),
  repeat: repeat.nullable(),
  /** 1 for the first reading of its unit and characteristic, then 2, 3. */
  attempt: z.int(),
  withdrawn: z.boolean(),
  takenBy: z.string().nullable(),
  /** The rack that sent it by itself. */
  rack: z.string().nullable(),
  takenAt: moment,
  receivedAt: moment,
});
export type Reading = z.infer<typeof reading>;

export const sampleUnit = z.object({
  unit: z.int(),
  position: z.int(),
  carton: z.int(),
  setAside: z.string().nullable(),
  /** Quality's ruling on an undecided unit. */
  ruling: z
    .object({ ruling: z.enum(['conforming', 'nonconforming']), reason: z.string(), by: z.string(), at: moment })
    .nullable(),
});

/** Everything the bench needs of one lot. */
export const bench = z.object({
  lot: lotHead,
  version,
  sampling: lotSampling,
  characteristics: z.array(characteristic),
  units: z.array(sampleUnit),
  readings: z.array(reading),
  instruments: z.array(instrument),
  decisionRule,
  coverageFactor: z.number(),
  warmUpMinutes: z.int().nullable(),
  /** What the part's rectifier ought to give; null where there is no model. */
  expected: expectedBands.nullable(),
  conditions: notedConditions.nullable(),
  /** Racks whose files may be brought in, with what their columns mean. */
  racks: z.array(z.object({ id, name: z.string(), mapping: z.record(z.string(), z.string().nullable()) })),
  /** What to ask for changes since (see readBenchChanges). */
  cursor: moment,
});
export type Bench = z.infer<typeof bench>;

const byReading = z.object({ id: z.coerce.number().int().positive(), reading: z.uuid() });

export const readBench = endpoint({
  method: 'GET',
  path: '/api/lots/:id/bench',
  who: READERS,
  summary: 'Plan, sample and readings of a drawn lot.',
  params: byId,
  reply: bench,
});

export const readBenchChanges = endpoint({
  method: 'GET',
  path: '/api/lots/:id/bench/changes',
  who: READERS,
  summary: 'Readings kept, answered or withdrawn, units set aside or ruled on, and conditions, since a cursor.',
  params: byId,
  query: z.object({ since: moment }),
  reply: z.object({
    cursor: moment,
    /** The lot as it is now, when it left the bench or was stopped meanwhile too. */
    lot: lotHead,
    version,
    readings: z.array(reading),
    units: z.array(sampleUnit),
    conditions: notedConditions.nullable(),
  }),
});

/** What is acknowledged when a reading is kept; the verdicts are the server's. */
export const kept = z.object({
  reading,
  /** "not judged" for a reading withdrawn meanwhile, or one whose uncertainty a guard band needs and nobody knows. */
  verdict: z.enum(['conforming', 'conditional', 'nonconforming', 'not judged']),
  unitVerdict: z.enum(['conforming', 'nonconforming', 'undecided', 'not judged']),
  stop: z.boolean(),
  lotReason: z.string(),
});
export type Kept = z.infer<typeof kept>;

export const keepReading = endpoint({
  method: 'PUT',
  path: '/api/lots/:id/readings/:reading',
  who: WRITERS,
  summary: 'Keep a reading under an id made by the client; sending it twice changes nothing.',
  params: byReading,
  body: readingBody,
  reply: kept,
});
export const withdrawReading = endpoint({
  method: 'POST',
  path: '/api/lots/:id/readings/:reading/withdrawal',
  who: WRITERS,
  summary: 'Undo a kept reading; it stays on record as withdrawn.',
  params: byReading,
  reply: done,
});
export const answerQuestion = endpoint({
  method: 'POST',
  path: '/api/lots/:id/readings/:reading/answer',
  who: WRITERS,
  summary: 'Confirm a reading of a rack that is far from what the part can give, with a reason.',
  params: byReading,
  body: z.object({ reason: z.enum(CONFIRM_REASONS), note: optionalLine(200) }),
  reply: done,
});
export const ruleOnUnit = endpoint({
  method: 'PUT',
  path: '/api/lots/:id/units/:unit/ruling',
  who: ['quality'],
  summary: 'Rule on an undecided unit, or take the ruling back (null); a failed reading cannot be ruled away.',
  params: z.object({ id: z.coerce.number().int().positive(), unit: z.coerce.number().int().positive() }),
  body: z.object({ ruling: z.enum(['conforming', 'nonconforming']).nullable(), reason }),
  reply: done,
});
export const setUnitAside = endpoint({
  method: 'PUT',
  path: '/api/lots/:id/units/:unit/set-aside',
  who: WRITERS,
  summary: 'Set a unit aside as undecided, with a reason, or take it back (reason null).',
  params: z.object({ id: z.coerce.number().int().positive(), unit: z.coerce.number().int().positive() }),
  body: z.object({ reason: reason.nullable() }),
  reply: done,
});
export const submitLot = endpoint({
  method: 'POST',
  path: '/api/lots/:id/submission',
  who: WRITERS,
  summary: 'Submit a measured lot for decision; refused while required readings are missing, unless stopped.',
  params: byId,
  versioned: true,
  reply: done,
});
export const reopenLot = endpoint({
  method: 'POST',
  path: '/api/lots/:id/reopening',
  who: ['quality'],
  summary: 'Send a submitted lot back to the bench, with a reason.',
  params: byId,
  body: z.object({ reason }),
  versioned: true,
  reply: done,
});

/** Many times the largest sample's readings, and little enough to be read while others wait. */
const LONGEST_RACK_FILE = 5_000_000;

const rackBody = z.object({
  fileName: z.string().trim().min(1).max(200),
  text: z.string().min(1, 'The file is empty.').max(LONGEST_RACK_FILE, 'A rack file has at most 5 million characters.'),
  /** Instruments the rack measured with, by kind. */
  instrumentIds: z.array(id).max(10),
  /** The rack whose file it is; what its columns mean is remembered with it. */
  rackId: id.nullable().default(null),
  /** Heading to key of a characteristic, "unit" for the unit's number, null to skip; a heading not named here is its own key. */
  mapping: z.record(z.string().max(200), z.string().max(32).nullable()).default({}),
});

export const rackFault = z.object({ line: z.int(), column: z.string().nullable(), message: z.string() });
export const rackPreview = z.object({
  fileName: z.string(),
  rows: z.int(),
  columns: z.array(
    z.object({
      header: z.string(),
      characteristicKey: z.string().nullable(),
      /** Its first cells, as they stand in the file. */
      samples: z.array(z.string()),
    }),
  ),
  readings: z.int(),
  faults: z.array(rackFault),
  /** Readings far from what the part can give; imported, they wait for an answer. */
  questions: z.array(
    z.object({ unit: z.int(), characteristicKey: z.string(), value: z.number(), sentence: z.string() }),
  ),
  nonconformingUnits: z.array(z.object({ unit: z.int(), failed: z.array(z.string()) })),
  groups: z.array(z.object({ class: z.string(), found: z.int(), acceptance: z.int(), rejection: z.int() })),
  verdict: z.enum(['continue', 'accepted', 'rejected']),
  reason: z.string(),
});
export type RackPreview = z.infer<typeof rackPreview>;

export const previewRackFile = endpoint({
  method: 'POST',
  path: '/api/lots/:id/rack-file/preview',
  who: WRITERS,
  summary: 'What a rack file would bring: every bad row with line and reason; nothing is kept.',
  params: byId,
  body: rackBody,
  large: true,
  reply: rackPreview,
});
export const importRackFile = endpoint({
  method: 'POST',
  path: '/api/lots/:id/rack-file',
  who: WRITERS,
  summary: 'Import a rack file, all rows or none.',
  params: byId,
  body: rackBody,
  large: true,
  status: 201,
  reply: rackPreview,
});
