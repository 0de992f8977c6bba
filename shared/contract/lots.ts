import * as z from 'zod';
import { CODE_LETTERS, SEVERITIES } from '#shared/sampling/scheme';
import { byId, endpoint } from './endpoint';
import { id, line, moment, optionalLine, reason, version } from './fields';
import { pageOf, pageQuery } from './page';
import { aql, inspectionLevel, nonconformityClass } from './plans';
import { LOT_READERS, type Role } from './roles';

export const LOT_STATUSES = ['arrived', 'drawn', 'measuring', 'submitted', 'released', 'on-hold', 'cancelled'] as const;
export const lotStatus = z.enum(LOT_STATUSES);
export type LotStatus = z.infer<typeof lotStatus>;
export const LOT_STATUS_TITLES: Record<LotStatus, string> = {
  arrived: 'Arrived',
  drawn: 'Sample drawn',
  measuring: 'Measuring',
  submitted: 'Submitted',
  released: 'Released',
  'on-hold': 'On hold',
  cancelled: 'Cancelled',
};

/** The stations of the line, each with the statuses of the lots that stand there. */
export const STATIONS = {
  arrivals: ['arrived'],
  bench: ['drawn', 'measuring'],
  decision: ['submitted'],
  released: ['released'],
  'on-hold': ['on-hold'],
} as const satisfies Record<string, readonly LotStatus[]>;
export type Station = keyof typeof STATIONS;
const station = z.enum(Object.keys(STATIONS) as [Station, ...Station[]]);

const quantity = z
  .number({ error: 'A number is needed.' })
  .int('Whole units only.')
  .min(1, 'At least 1.')
  .max(1_000_000, 'At most 1 000 000.');

export const lotBody = z
  .object({
    partId: id,
    supplierId: id,
    deliveryNumber: line(40),
    orderNumber: optionalLine(40),
    countedQuantity: quantity,
    statedQuantity: quantity,
    dateCode: optionalLine(20),
    cartons: z.number({ error: 'A number is needed.' }).int('Whole cartons only.').min(1, 'At least 1.').max(10_000),
    neededBy: moment.nullable(),
    place: optionalLine(60),
    note: optionalLine(300),
  })
  .refine((lot) => lot.cartons <= lot.countedQuantity, {
    path: ['cartons'],
    message: 'There are more cartons than units.',
  });
export type LotBody = z.infer<typeof lotBody>;

/** One sampling group as fixed at the draw, or provisional before it. */
export const samplingGroup = z.object({
  key: z.string(),
  class: nonconformityClass,
  level: inspectionLevel,
  aql,
  characteristicKeys: z.array(z.string()),
  codeLetter: z.enum(CODE_LETTERS),
  /** Letter of the plan after arrows; row S stands only in the tightened table. */
  planLetter: z.enum([...CODE_LETTERS, 'S']),
  sampleSize: z.int(),
  acceptance: z.int(),
  rejection: z.int(),
  wholeLot: z.boolean(),
  severity: z.enum(SEVERITIES),
});

/** How a lot is, or would now be, sampled. */
export const lotSampling = z.object({
  provisional: z.boolean(),
  planId: id,
  planNumber: z.string(),
  revision: z.int(),
  level: inspectionLevel,
  severity: z.enum(SEVERITIES),
  sampleSize: z.int(),
  groups: z.array(samplingGroup),
});
export type LotSampling = z.infer<typeof lotSampling>;

export const lotHead = z.object({
  id,
  number: z.string(),
  status: lotStatus,
  part: z.object({ id, number: z.string(), name: z.string() }),
  supplier: z.object({ id, name: z.string() }),
  deliveryNumber: z.string(),
  countedQuantity: z.int(),
  statedQuantity: z.int(),
  arrivedAt: moment,
  neededBy: moment.nullable(),
  /** Hours the lot may wait from arrival to the bench. */
  targetHours: z.number(),
  severity: z.enum(SEVERITIES),
  /** Drawn or provisional; null when the part has no effective plan. */
  sampleSize: z.int().nullable(),
  unitsJudged: z.int(),
  /** Whether a rejection number is reached: the lot is quarantined at once. */
  stopped: z.boolean(),
  verdict: z.enum(['accepted', 'rejected']).nullable(),
  drawnAt: moment.nullable(),
  submittedAt: moment.nullable(),
  decidedAt: moment.nullable(),
});
export type LotHead = z.infer<typeof lotHead>;

export const historyLine = z.object({
  at: moment,
  person: z.string(),
  what: z.string(),
  detail: z.string().nullable(),
  tone: z.enum(['plain', 'rejected', 'accepted', 'hold']),
});

export const lot = lotHead.extend({
  orderNumber: z.string(),
  dateCode: z.string(),
  cartons: z.int(),
  place: z.string(),
  note: z.string(),
  bookedBy: z.string(),
  sampling: lotSampling.nullable(),
  seed: z.int().nullable(),
  drawnBy: z.string().nullable(),
  submittedBy: z.object({ name: z.string(), stampNumber: z.string().nullable() }).nullable(),
  decidedBy: z.object({ name: z.string(), stampNumber: z.string().nullable() }).nullable(),
  decisionReason: z.string().nullable(),
  holdReason: z.string().nullable(),
  cancelReason: z.string().nullable(),
  certificate: z.object({ id, number: z.string() }).nullable(),
  nonconformance: z.object({ id, number: z.string() }).nullable(),
  /** Newest first. */
  history: z.array(historyLine),
  /** The last five decided lots of this part and supplier, newest last. */
  lastLots: z.array(z.object({ id, number: z.string(), status: lotStatus, verdict: z.enum(['accepted', 'rejected']) })),
  version,
});
export type Lot = z.infer<typeof lot>;

const BOOKERS = ['receiving', 'quality'] as const satisfies readonly Role[];
const BENCH = ['inspector', 'quality'] as const satisfies readonly Role[];

export const listLots = endpoint({
  method: 'GET',
  path: '/api/lots',
  who: LOT_READERS,
  summary: 'Lots at a station: arrivals and bench by waiting time, decided ones newest first.',
  query: pageQuery.extend({
    station: station.optional(),
    partId: z.coerce.number().int().positive().optional(),
    supplierId: z.coerce.number().int().positive().optional(),
  }),
  reply: pageOf(lotHead),
});
export const readLot = endpoint({
  method: 'GET',
  path: '/api/lots/:id',
  who: LOT_READERS,
  summary: 'One lot with its sampling, decision and history.',
  params: byId,
  reply: lot,
});
export const bookLot = endpoint({
  method: 'POST',
  path: '/api/lots',
  who: BOOKERS,
  summary: 'Book a delivered lot in.',
  body: lotBody,
  status: 201,
  reply: lot,
});
export const correctLot = endpoint({
  method: 'PUT',
  path: '/api/lots/:id',
  who: BOOKERS,
  summary: 'Correct a lot before its sample is drawn.',
  params: byId,
  body: lotBody,
  versioned: true,
  reply: lot,
});
export const cancelLot = endpoint({
  method: 'POST',
  path: '/api/lots/:id/cancellation',
  who: BOOKERS,
  summary: 'Cancel a lot before its sample is drawn, with a reason.',
  params: byId,
  body: z.object({ reason }),
  versioned: true,
  reply: lot,
});
export const previewSampling = endpoint({
  method: 'GET',
  path: '/api/sampling',
  who: LOT_READERS,
  summary: 'How a lot of this part and size would be sampled now.',
  query: z.object({
    partId: z.coerce.number().int().positive(),
    lotSize: z.coerce.number().int().min(1).max(1_000_000),
  }),
  reply: lotSampling,
});
export const drawSample = endpoint({
  method: 'POST',
  path: '/api/lots/:id/sample',
  who: BENCH,
  summary: 'Draw the sample: fixes severity, plan revision, n, Ac, Re and the unit positions.',
  params: byId,
  versioned: true,
  status: 201,
  reply: lot,
});
export const readPullList = endpoint({
  method: 'GET',
  path: '/api/lots/:id/pull-list',
  who: LOT_READERS,
  summary: 'Which units to pull, sorted by carton.',
  params: byId,
  reply: z.object({
    lot: lotHead,
    cartons: z.array(
      z.object({
        carton: z.int(),
        units: z.array(z.object({ unit: z.int(), position: z.int(), positionInCarton: z.int() })),
      }),
    ),
  }),
});
