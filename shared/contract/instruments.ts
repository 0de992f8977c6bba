import * as z from 'zod';
import { byId, endpoint } from './endpoint';
import { day, id, line, optionalLine, positive, version } from './fields';
import { type Role } from './roles';

const READERS = ['inspector', 'quality', 'engineering', 'auditor', 'admin'] as const satisfies readonly Role[];

export const INSTRUMENT_KINDS = [
  'multimeter',
  'oscilloscope',
  'electronic-load',
  'insulation-tester',
  'power-meter',
  'thermometer',
  'rule',
] as const;
export const instrumentKind = z.enum(INSTRUMENT_KINDS);
export type InstrumentKind = z.infer<typeof instrumentKind>;
export const INSTRUMENT_KIND_TITLES: Record<InstrumentKind, string> = {
  multimeter: 'Multimeter',
  oscilloscope: 'Oscilloscope',
  'electronic-load': 'Electronic load',
  'insulation-tester': 'Insulation tester',
  'power-meter': 'Power meter',
  thermometer: 'Thermometer',
  rule: 'Rule',
};

export const RANGE_UNITS = ['V', 'A', 'Ω', 'W', 'Hz', 's', 'K', 'F', 'm'] as const;

const share = z.number().min(0, 'Not negative.').max(1, 'At most 100 %.');

/** Accuracy ±(% of reading + % of range + counts) of a range with digits; SI base units, shares as fractions. */
const digitalRange = z.object({
  form: z.literal('digital'),
  name: line(40),
  unit: z.enum(RANGE_UNITS),
  /** Which kind of voltage or current it reads; "any" for all else. */
  current: z.enum(['dc', 'ac', 'any']),
  fullScale: positive.max(1e12),
  resolution: positive.max(1e9),
  ofReading: share,
  ofRange: share,
  counts: z.int().min(0, 'Not negative.').max(100_000),
});
/** Accuracy of the vertical scale of a screen, read by its graticule. */
const graticuleRange = z.object({
  form: z.literal('graticule'),
  name: line(40),
  unit: z.literal('V'),
  screenDivisions: positive.max(20),
  ofReading: share,
  ofFullScale: share,
  /** The step to which a height is read, in divisions. */
  readingStep: positive.max(1),
});
export const rangeBody = z.discriminatedUnion('form', [digitalRange, graticuleRange]);
export type RangeBody = z.infer<typeof rangeBody>;
export const instrumentRange = z.discriminatedUnion('form', [
  digitalRange.extend({ id }),
  graticuleRange.extend({ id }),
]);
export type InstrumentRange = z.infer<typeof instrumentRange>;

/** The reference an instrument is checked against before its first reading of a day; SI base units. */
export const dailyReference = z.object({
  name: line(60),
  unit: z.enum(RANGE_UNITS),
  value: z.number(),
  tolerance: positive,
});

export const instrumentBody = z.object({
  assetNumber: z
    .string()
    .trim()
    .regex(/^[A-Z]{1,4}-\d{2,4}$/, 'Letters, a hyphen and digits, as OS-03.'),
  kind: instrumentKind,
  description: line(120),
  serialNumber: optionalLine(60),
  place: optionalLine(60),
  status: z.enum(['in-service', 'withdrawn']),
  dailyReference: dailyReference.nullable().default(null),
});

const ranges = z.array(rangeBody).max(40);

export const instrument = instrumentBody.extend({
  id,
  version,
  /** Day of the next calibration; the instrument may be used on it and not after it. */
  calibrationDue: day,
  ranges: z.array(instrumentRange),
  /** Today's check against the reference, where the site asks for one. */
  dailyCheck: z.enum(['not-asked', 'due', 'passed', 'failed']),
  openReview: z.object({ id, number: z.string() }).nullable(),
  /** Whether a reading may name it today: in service, not past its calibration date, and checked where the site asks. */
  usable: z.boolean(),
  /** Days until the calibration is due; negative when it is past. */
  daysLeft: z.int(),
});
export type Instrument = z.infer<typeof instrument>;

export const listInstruments = endpoint({
  method: 'GET',
  path: '/api/instruments',
  who: READERS,
  summary: 'All instruments, the next calibration due first.',
  reply: z.object({ items: z.array(instrument) }),
});
export const readInstrument = endpoint({
  method: 'GET',
  path: '/api/instruments/:id',
  who: READERS,
  summary: 'One instrument.',
  params: byId,
  reply: instrument,
});
export const addInstrument = endpoint({
  method: 'POST',
  path: '/api/instruments',
  who: ['quality'],
  summary: 'Add an instrument.',
  body: instrumentBody.extend({ calibrationDue: day, ranges: ranges.default([]) }),
  status: 201,
  reply: instrument,
});
export const changeInstrument = endpoint({
  method: 'PUT',
  path: '/api/instruments/:id',
  who: ['quality'],
  summary: 'Change an instrument and its ranges; its calibration date changes by recording a calibration.',
  params: byId,
  body: instrumentBody.extend({ ranges: ranges.default([]) }),
  versioned: true,
  reply: instrument,
});
