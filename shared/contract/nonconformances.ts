import * as z from 'zod';
import { byId, endpoint } from './endpoint';
import { id, moment } from './fields';
import { pageOf, pageQuery } from './page';
import { LOT_READERS } from './roles';
import { nonconformityClass } from './plans';

/** What failed, as it stood when the lot was rejected. SI base units. */
export const failure = z.object({
  characteristicKey: z.string(),
  name: z.string(),
  class: nonconformityClass,
  unit: z.string().nullable(),
  decimals: z.int(),
  lowerLimit: z.number().nullable(),
  upperLimit: z.number().nullable(),
  requirement: z.string().nullable(),
  readings: z.array(
    z.object({ unit: z.int(), value: z.number().nullable(), reason: z.string().nullable(), attempt: z.int() }),
  ),
});
export type Failure = z.infer<typeof failure>;

export const nonconformanceHead = z.object({
  id,
  number: z.string(),
  status: z.enum(['open']),
  lot: z.object({ id, number: z.string() }),
  part: z.object({ id, number: z.string(), name: z.string() }),
  supplier: z.object({ id, name: z.string() }),
  openedAt: moment,
  openedBy: z.string(),
  summary: z.string(),
});
export type NonconformanceHead = z.infer<typeof nonconformanceHead>;

export const nonconformance = nonconformanceHead.extend({
  failures: z.array(failure),
  containment: z.string(),
  notices: z.array(
    z.object({
      id,
      to: z.array(z.string()),
      subject: z.string(),
      status: z.enum(['queued', 'sent', 'failed']),
      queuedAt: moment,
      sentAt: moment.nullable(),
    }),
  ),
});
export type Nonconformance = z.infer<typeof nonconformance>;

export const listNonconformances = endpoint({
  method: 'GET',
  path: '/api/nonconformances',
  who: LOT_READERS,
  summary: 'Nonconformances, newest first; receiving sees those of lots it booked in.',
  query: pageQuery,
  reply: pageOf(nonconformanceHead),
});
export const readNonconformance = endpoint({
  method: 'GET',
  path: '/api/nonconformances/:id',
  who: LOT_READERS,
  summary: 'One nonconformance: what failed and who was told.',
  params: byId,
  reply: nonconformance,
});
