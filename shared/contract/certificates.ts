import * as z from 'zod';
import { byId, endpoint, file } from './endpoint';
import { id, moment } from './fields';
import { pageOf, pageQuery } from './page';
import { type Role } from './roles';

const READERS = ['inspector', 'quality', 'engineering', 'auditor'] as const satisfies readonly Role[];

export const CERTIFICATE_STATUSES = ['issuing', 'valid', 'superseded', 'revoked'] as const;

export const certificate = z.object({
  id,
  number: z.string(),
  lot: z.object({ id, number: z.string() }),
  part: z.object({ id, number: z.string(), name: z.string() }),
  supplier: z.object({ id, name: z.string() }),
  unitsReleased: z.int(),
  issuedAt: moment,
  issuedBy: z.string(),
  status: z.enum(CERTIFICATE_STATUSES),
  /** SHA-256 of the file, hexadecimal; null while the file is being made. */
  sha256: z.string().nullable(),
  /** SHA-256 of the certificate's data, printed inside it. */
  dataDigest: z.string(),
});
export type Certificate = z.infer<typeof certificate>;

export const listCertificates = endpoint({
  method: 'GET',
  path: '/api/certificates',
  who: READERS,
  summary: 'Certificates, newest first.',
  query: pageQuery,
  reply: pageOf(certificate),
});
export const readCertificate = endpoint({
  method: 'GET',
  path: '/api/certificates/:id',
  who: READERS,
  summary: 'One certificate.',
  params: byId,
  reply: certificate,
});
export const openCertificate = endpoint({
  method: 'GET',
  path: '/api/certificates/:id/file',
  who: READERS,
  summary: 'The certificate as PDF, exactly as it was issued.',
  params: byId,
  media: 'application/pdf',
  reply: file,
});
