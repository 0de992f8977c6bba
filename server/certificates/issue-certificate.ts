import { type Db } from '#db/open-database';
import { certificates, certificateStatuses } from '#db/schema/certificates';
import { canonicalJson } from '#server/audit/canonical-json';
import { record } from '#server/audit/record';
import { nextNumber } from '#server/numbers/next-number';
import { createHash } from 'node:crypto';
import { certificateData, type Release } from './certificate-data';

/** Numbers and records a certificate inside the deciding transaction; its file is made afterwards. */
export function issueCertificate(db: Db, release: Release): { id: number; number: string } {
  const { lot, caller, at, unitsReleased } = release;
  const number = nextNumber(db, 'CC', at.getUTCFullYear());
  const data = certificateData(db, number, release);
  const dataDigest = createHash('sha256').update(canonicalJson(data)).digest('hex');
  const issuedAt = at.toISOString();
  const { id } = db
    .insert(certificates)
    .values({ number, lotId: lot.id, data, dataDigest, unitsReleased, issuedAt, issuedById: caller.id })
    .returning({ id: certificates.id })
    .get();
  db.insert(certificateStatuses).values({ certificateId: id, status: 'issuing', at: issuedAt }).run();
  record(db, {
    at,
    person: caller,
    action: 'issued',
    subject: 'certificate',
    subjectId: id,
    after: { number, dataDigest },
  });
  return { id, number };
}
