import * as z from 'zod';
import { endpoint } from './endpoint';
import { LOT_READERS } from './roles';

/** Lots at each station of the line, now; released counts the last 30 days. */
export const counts = z.object({
  arrivals: z.int(),
  bench: z.int(),
  decision: z.int(),
  released: z.int(),
  onHold: z.int(),
  at: z.iso.datetime(),
});
export type Counts = z.infer<typeof counts>;

/** What /api/events sends (event "lot") when something of a lot was changed; what it is, the lot's own endpoints tell. */
export const lotChange = z.object({ lotId: z.int() });
export type LotChange = z.infer<typeof lotChange>;

export const readCounts = endpoint({
  method: 'GET',
  path: '/api/counts',
  who: LOT_READERS,
  summary: 'Lots at each station of the line; the stream /api/events sends the same whenever it changes.',
  reply: counts,
});

/** Sizes of the record collections the caller may read; a collection without permission is absent. */
export const recordCounts = z.object({
  plans: z.int().optional(),
  parts: z.int().optional(),
  suppliers: z.int().optional(),
  instruments: z.int().optional(),
  instrumentsDue: z.int().optional(),
  racks: z.int().optional(),
  certificates: z.int().optional(),
  openNonconformances: z.int().optional(),
  people: z.int().optional(),
});
export const readRecordCounts = endpoint({
  method: 'GET',
  path: '/api/record-counts',
  who: 'signed-in',
  summary: 'How many records of each kind the caller may read.',
  reply: recordCounts,
});

export const hit = z.object({
  kind: z.enum(['lot', 'part', 'supplier', 'certificate', 'nonconformance']),
  id: z.int(),
  title: z.string(),
  note: z.string(),
});
export type Hit = z.infer<typeof hit>;

export const search = endpoint({
  method: 'GET',
  path: '/api/search',
  who: 'signed-in',
  summary: 'Find lots, parts, suppliers, certificates and nonconformances by number or name.',
  query: z.object({ text: z.string().trim().min(1).max(80) }),
  reply: z.object({ items: z.array(hit) }),
});
