import * as z from 'zod';
import { byId, endpoint } from './endpoint';
import { id, line, mailAddress, optionalLine, prose, version } from './fields';
import { ROLES } from './roles';

const WRITERS = ['receiving', 'quality'] as const;

export const supplierBody = z.object({
  code: z
    .string()
    .trim()
    .regex(/^[A-Z0-9]{2,8}$/, 'Two to eight capital letters or digits.'),
  name: line(120),
  address: prose(300),
  contactName: optionalLine(80),
  contactEmail: mailAddress.nullable(),
  active: z.boolean(),
});
export const supplier = supplierBody.extend({
  id,
  version,
  contactEmail: z.string().nullable(),
  lots: z.int(),
  lotsAccepted: z.int(),
  lotsDecided: z.int(),
});
export type Supplier = z.infer<typeof supplier>;

export const listSuppliers = endpoint({
  method: 'GET',
  path: '/api/suppliers',
  who: ROLES,
  summary: 'All suppliers.',
  reply: z.object({ items: z.array(supplier) }),
});
export const readSupplier = endpoint({
  method: 'GET',
  path: '/api/suppliers/:id',
  who: ROLES,
  summary: 'One supplier.',
  params: byId,
  reply: supplier,
});
export const addSupplier = endpoint({
  method: 'POST',
  path: '/api/suppliers',
  who: WRITERS,
  summary: 'Add a supplier.',
  body: supplierBody,
  status: 201,
  reply: supplier,
});
export const changeSupplier = endpoint({
  method: 'PUT',
  path: '/api/suppliers/:id',
  who: WRITERS,
  summary: 'Change a supplier.',
  params: byId,
  body: supplierBody,
  versioned: true,
  reply: supplier,
});
