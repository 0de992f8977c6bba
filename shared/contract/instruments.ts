import * as z from 'zod';
import { byId, endpoint } from './endpoint';
import { day, id, line, optionalLine, version } from './fields';
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

export const instrumentBody = z.object({
  assetNumber: z
    .string()
    .trim()
    .regex(/^[A-Z]{1,4}-\d{2,4}$/, 'Letters, a hyphen and digits, as OS-03.'),
  kind: instrumentKind,
  description: line(120),
  serialNumber: optionalLine(60),
  place: optionalLine(60),
  calibrationDue: day,
  status: z.enum(['in-service', 'withdrawn']),
});

export const instrument = instrumentBody.extend({
  id,
  version,
  /** Whether a reading may name it today: in service and not past its calibration date. */
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
  body: instrumentBody,
  status: 201,
  reply: instrument,
});
export const changeInstrument = endpoint({
  method: 'PUT',
  path: '/api/instruments/:id',
  who: ['quality'],
  summary: 'Change an instrument.',
  params: byId,
  body: instrumentBody,
  versioned: true,
  reply: instrument,
});
