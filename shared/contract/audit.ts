import * as z from 'zod';
import { endpoint } from './endpoint';
import { id, moment } from './fields';
import { pageOf, pageQuery } from './page';

export const auditEntry = z.object({
  id,
  at: moment,
  person: z.string(),
  action: z.string(),
  subject: z.string(),
  subjectId: z.string(),
  /** What people call it: a lot's number, a part's number. */
  subjectName: z.string(),
  before: z.unknown().nullable(),
  after: z.unknown().nullable(),
  hash: z.string(),
});
export type AuditEntry = z.infer<typeof auditEntry>;

export const listAudit = endpoint({
  method: 'GET',
  path: '/api/audit',
  who: ['receiving', 'inspector', 'quality', 'engineering', 'auditor', 'admin'],
  summary:
    'Audit entries, newest first, also of one record by its id or number; receiving, inspectors and engineering see their own.',
  query: pageQuery.extend({ subject: z.string().max(40).optional(), subjectId: z.string().max(60).optional() }),
  reply: pageOf(auditEntry),
});
export const verifyAudit = endpoint({
  method: 'GET',
  path: '/api/audit/verification',
  who: ['quality', 'auditor', 'admin'],
  summary: 'Recomputes the hash chain over all entries.',
  reply: z.object({ entries: z.int(), intact: z.boolean(), firstBroken: id.nullable(), head: z.string() }),
});
