import { serve } from '#server/serve';
import { addInstrument, changeInstrument, listInstruments, readInstrument } from '#shared/contract/instruments';
import { endpoint } from '#shared/contract/endpoint';
import { listAudit } from '#shared/contract/audit';
import { Router } from 'express';
import * as z from 'zod';
import { type ApiClient, endpointResource } from '../../src/app/data/api';

/** What the contract must not let pass: each marked line does not compile, or this file does not. */
const router = Router();
const body = {
  assetNumber: 'OS-03',
  kind: 'oscilloscope',
  description: 'Two channels',
  serialNumber: '',
  place: '',
  calibrationDue: '2026-09-30',
  status: 'in-service',
} as const;
const stands = { ranges: [], dailyReference: null, dailyCheck: 'not-asked', openReview: null } as const;
const row = { ...body, ...stands, ranges: [], id: 1, version: 1, usable: true, daysLeft: 12 };

serve(router, readInstrument, ({ params }) => ({ ...row, id: params.id }));
serve(router, listInstruments, () => ({ items: [row] }));
serve(router, addInstrument, ({ body: given }) => Promise.resolve({ ...row, ...given, ranges: [] }));
// @ts-expect-error the reply lacks `usable`
serve(router, readInstrument, () => ({ ...body, ...stands, ranges: [], id: 1, version: 1, daysLeft: 12 }));
// @ts-expect-error params.id is a number
serve(router, readInstrument, ({ params }) => ({ ...row, place: params.id }));
// @ts-expect-error the body has no such field
serve(router, addInstrument, ({ body: given }) => ({ ...row, place: given.shelf }));
// @ts-expect-error `kind` is one of the contract's words
serve(router, readInstrument, () => ({ ...row, kind: 'telescope' }));

// @ts-expect-error the path has a parameter without a schema
endpoint({ method: 'GET', path: '/api/things/:id', who: 'anyone', summary: '', reply: z.object({}) });
const named = z.object({ number: z.string() });
// @ts-expect-error the schema names another parameter than the path
endpoint({ method: 'GET', path: '/api/things/:id', who: 'anyone', summary: '', params: named, reply: z.object({}) });

export function client(api: ApiClient): number | undefined {
  api.call(readInstrument, { params: { id: 3 } }).subscribe((one) => one.daysLeft.toFixed());
  api.call(listInstruments, {}).subscribe((list) => list.items[0]?.assetNumber);
  api.call(listAudit, { query: { limit: 20 } }).subscribe((page) => page.next);
  api.call(changeInstrument, { params: { id: 3 }, body, version: 2 });
  // @ts-expect-error the body lacks all but a number
  api.call(addInstrument, { body: { assetNumber: 'OS-03' } });
  // @ts-expect-error a body is required
  api.call(addInstrument, {});
  // @ts-expect-error params are required
  api.call(readInstrument, {});
  // @ts-expect-error no such field in the reply
  api.call(readInstrument, { params: { id: 3 } }).subscribe((one) => one.colour);
  const resource = endpointResource(readInstrument, () => ({ params: { id: 3 } }));
  return resource.value()?.daysLeft;
}
