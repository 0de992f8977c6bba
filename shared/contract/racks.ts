import * as z from 'zod';
import { LARGEST_VALUE } from '#shared/quantities/largest-value';
import { byId, done, endpoint } from './endpoint';
import { id, line, moment, optionalLine, version } from './fields';
import { instrumentKind } from './instruments';
import { type Role } from './roles';
import { LARGEST_WAVEFORM, waveformFinding } from './waveforms';

const READERS = ['quality', 'auditor', 'admin'] as const satisfies readonly Role[];
const WRITERS = ['admin'] as const satisfies readonly Role[];

/** What a heading may stand for: the unit's number, or a characteristic by its key. */
const meaning = z.string().trim().min(1, 'Name a characteristic’s key, or “unit”.').max(32, 'At most 32 characters.');

/** Heading of a column in a rack's files to what it stands for; null for a column to be skipped. */
export const rackMapping = z
  .record(z.string(), meaning.nullable())
  .refine((mapping) => Object.keys(mapping).every((heading) => heading.trim() !== ''), 'A column has no heading.')
  .refine(
    (mapping) => Object.keys(mapping).every(({ length }) => length <= 200),
    'A heading has at most 200 characters.',
  )
  .refine((mapping) => Object.keys(mapping).length <= 2000, 'At most 2 000 columns.');

/** A token as people see it: its first characters, never the whole. */
export const rackToken = z.object({
  id,
  beginning: z.string(),
  issuedAt: moment,
  issuedBy: z.string(),
  lastUsedAt: moment.nullable(),
  revoked: z.object({ at: moment, by: z.string() }).nullable(),
});
export type RackToken = z.infer<typeof rackToken>;

export const rackBody = z.object({
  name: line(60),
  place: optionalLine(60),
  active: z.boolean(),
  /** The parts it may send readings of. */
  partIds: z.array(id).max(1000, 'At most 1 000 parts.'),
  mapping: rackMapping,
});

export const rack = rackBody.omit({ partIds: true }).extend({
  id,
  version,
  parts: z.array(z.object({ id, number: z.string(), name: z.string() })),
  /** Newest first, revoked ones too. */
  tokens: z.array(rackToken),
});
export type Rack = z.infer<typeof rack>;

export const listRacks = endpoint({
  method: 'GET',
  path: '/api/racks',
  who: READERS,
  summary: 'All test racks with their parts and tokens.',
  reply: z.object({ items: z.array(rack) }),
});
export const readRack = endpoint({
  method: 'GET',
  path: '/api/racks/:id',
  who: READERS,
  summary: 'One test rack.',
  params: byId,
  reply: rack,
});
export const addRack = endpoint({
  method: 'POST',
  path: '/api/racks',
  who: WRITERS,
  summary: 'Add a test rack.',
  body: rackBody,
  status: 201,
  reply: rack,
});
export const changeRack = endpoint({
  method: 'PUT',
  path: '/api/racks/:id',
  who: WRITERS,
  summary: 'Change a test rack: its name, its parts, what the columns of its files mean, whether it is in use.',
  params: byId,
  body: rackBody,
  versioned: true,
  reply: rack,
});
export const issueRackToken = endpoint({
  method: 'POST',
  path: '/api/racks/:id/tokens',
  who: WRITERS,
  summary: 'Issue a token with which the rack sends readings by itself; it is told this once and kept as a hash.',
  params: byId,
  status: 201,
  reply: z.object({ token: z.string(), rack }),
});
export const revokeRackToken = endpoint({
  method: 'POST',
  path: '/api/racks/:id/tokens/:token/revocation',
  who: WRITERS,
  summary: 'Revoke a token; from now on it is not accepted.',
  params: z.object({ id: z.coerce.number().int().positive(), token: z.coerce.number().int().positive() }),
  reply: done,
});

const byNumber = z.object({ number: z.string().max(40) });

/** What a rack is told about a lot at the bench. */
export const rackLot = z.object({
  lot: z.object({ number: z.string(), status: z.enum(['drawn', 'measuring']), quantity: z.int() }),
  part: z.object({ number: z.string(), name: z.string() }),
  plan: z.object({ number: z.string(), revision: z.int() }),
  sampleSize: z.int(),
  characteristics: z.array(
    z.object({
      key: z.string(),
      name: z.string(),
      kind: z.enum(['measured', 'attribute']),
      condition: z.string(),
      /** Unit of values and limits, without a prefix; empty for a plain number and for what is passed or failed. */
      unit: z.string(),
      lowerLimit: z.number().nullable(),
      upperLimit: z.number().nullable(),
      /** The kind of instrument that a reading must name; null where it need not name one. */
      instrumentKind: instrumentKind.nullable(),
    }),
  ),
  /** Readings not taken yet, by unit in draw order. */
  wanted: z.array(
    z.object({
      unit: z.int(),
      /** Which unit of the lot it is. */
      position: z.int(),
      characteristicKeys: z.array(z.string()),
    }),
  ),
});
export type RackLot = z.infer<typeof rackLot>;

export const readRackLot = endpoint({
  method: 'GET',
  path: '/api/rack/lots/:number',
  who: 'rack',
  summary:
    'What a rack measures of a lot at the bench: characteristics with units and limits, and readings still wanted.',
  params: byNumber,
  reply: rackLot,
});

export const rackReading = z
  .object({
    /** The rack's own id of the reading; sent again, it changes nothing. */
    id: line(80),
    unit: z.int().positive(),
    characteristicKey: z.string().max(32),
    /** Of what is measured: SI base unit. */
    value: z
      .number()
      .min(-LARGEST_VALUE, 'This is too far below zero.')
      .max(LARGEST_VALUE, 'This is too large to be a measured value.')
      .optional(),
    /** Of what is judged by eye. */
    pass: z.boolean().optional(),
    takenAt: moment,
    /** Asset number of the instrument that took it. */
    instrument: z.string().trim().min(1, 'Fill this in.').max(20, 'At most 20 characters.').nullable(),
    /** Name of the range it was taken on; the smallest that holds the value unless given. */
    rangeName: z.string().trim().min(1, 'Fill this in.').max(40, 'At most 40 characters.').optional(),
  })
  .refine(({ value, pass }) => (value === undefined) !== (pass === undefined), {
    path: ['value'],
    message: 'Give either a value or pass.',
  });
export type RackReading = z.infer<typeof rackReading>;

export const sendRackReadings = endpoint({
  method: 'POST',
  path: '/api/rack/lots/:number/readings',
  who: 'rack',
  summary: 'Keep readings of a rack, all of them or none; sending them twice changes nothing.',
  params: byNumber,
  body: z.object({
    readings: z.array(rackReading).min(1, 'Send a reading.').max(2000, 'At most 2 000 readings at once.'),
  }),
  large: true,
  reply: z.object({
    /** How many were new. */
    kept: z.int(),
    /** How many were here already. */
    known: z.int(),
    /** Those of the new ones that are far from what the part can give and wait for a person's answer. */
    questions: z.int(),
    verdict: z.enum(['continue', 'accepted', 'rejected']),
    /** Whether a rejection number is reached. */
    stop: z.boolean(),
    reason: z.string(),
  }),
});

export const sendRackWaveform = endpoint({
  method: 'PUT',
  path: '/api/rack/lots/:number/waveforms/:own',
  who: 'rack',
  summary: 'Keep a waveform file (CSV) of a unit under the rack’s own id; sending it twice changes nothing.',
  params: z.object({ number: z.string().max(40), own: line(80) }),
  query: z.object({
    fileName: line(200),
    unit: z.coerce.number().int().positive(),
    characteristicKey: z.string().max(32).optional(),
    /** Name of the column to take; the first after the time unless given. */
    channel: z.string().max(200).optional(),
  }),
  upload: LARGEST_WAVEFORM,
  reply: z.object({
    /** The id it is kept under. */
    id: z.uuid(),
    /** Whether it was new. */
    kept: z.boolean(),
    samples: z.int(),
    /** Volts. */
    peakToPeak: z.number(),
    findings: z.array(waveformFinding),
  }),
});
