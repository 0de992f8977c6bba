import * as z from 'zod';
import { endpoint } from './endpoint';
import { day } from './fields';
import { type Role } from './roles';

const READERS = ['inspector', 'quality', 'engineering', 'auditor'] as const satisfies readonly Role[];

export const yieldRow = z.object({
  /** Month as 2026-03, or the id of the part or supplier. */
  key: z.string(),
  title: z.string(),
  note: z.string(),
  lotsDecided: z.int(),
  lotsAccepted: z.int(),
  lotsRejected: z.int(),
  unitsInspected: z.int(),
  unitsConforming: z.int(),
  unitsReleased: z.int(),
});
export type YieldRow = z.infer<typeof yieldRow>;

export const readYields = endpoint({
  method: 'GET',
  path: '/api/yields',
  who: READERS,
  summary: 'Lots and units accepted by month, supplier and part, from the summaries written at decision.',
  query: z.object({
    from: day.optional(),
    to: day.optional(),
    partId: z.coerce.number().int().positive().optional(),
    supplierId: z.coerce.number().int().positive().optional(),
  }),
  reply: z.object({
    months: z.array(yieldRow),
    suppliers: z.array(yieldRow),
    parts: z.array(yieldRow),
    total: yieldRow,
  }),
});
