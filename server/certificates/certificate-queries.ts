import { type Db } from '#db/open-database';
import { certificateFiles, certificates, certificateStatuses } from '#db/schema/certificates';
import { lots } from '#db/schema/lots';
import { parts } from '#db/schema/parts';
import { people } from '#db/schema/people';
import { suppliers } from '#db/schema/suppliers';
import { pageAfter } from '#server/page-after';
import { Conflict, NotFound } from '#server/problems';
import { type Certificate } from '#shared/contract/certificates';
import { desc, eq, lt } from 'drizzle-orm';

function statusOf(db: Db, certificateId: number): Certificate['status'] {
  const newest = db
    .select({ status: certificateStatuses.status })
    .from(certificateStatuses)
    .where(eq(certificateStatuses.certificateId, certificateId))
    .orderBy(desc(certificateStatuses.id))
    .limit(1)
    .get();
  return newest?.status ?? 'issuing';
}

function joined(db: Db) {
  return db
    .select({
      id: certificates.id,
      number: certificates.number,
      lot: { id: lots.id, number: lots.number },
      part: { id: parts.id, number: parts.number, name: parts.name },
      supplier: { id: suppliers.id, name: suppliers.name },
      unitsReleased: certificates.unitsReleased,
      issuedAt: certificates.issuedAt,
      issuedBy: people.name,
      sha256: certificateFiles.sha256,
      dataDigest: certificates.dataDigest,
    })
    .from(certificates)
    .innerJoin(lots, eq(lots.id, certificates.lotId))
    .innerJoin(parts, eq(parts.id, lots.partId))
    .innerJoin(suppliers, eq(suppliers.id, lots.supplierId))
    .innerJoin(people, eq(people.id, certificates.issuedById))
    .leftJoin(certificateFiles, eq(certificateFiles.certificateId, certificates.id));
}

/** A page of certificates, newest first. */
export function listCertificates(db: Db, page: { after?: string | undefined; limit: number }) {
  return pageAfter(page, (before, limit) =>
    joined(db)
      .where(before === undefined ? undefined : lt(certificates.id, before))
      .orderBy(desc(certificates.id))
      .limit(limit)
      .all()
      .map((row) => ({ ...row, status: statusOf(db, row.id) })),
  );
}

/** The certificates of a lot, with where each stands. */
export function certificatesOfLot(db: Db, lotId: number): Pick<Certificate, 'id' | 'number' | 'status'>[] {
  return db
    .select({ id: certificates.id, number: certificates.number })
    .from(certificates)
    .where(eq(certificates.lotId, lotId))
    .all()
    .map((row) => ({ ...row, status: statusOf(db, row.id) }));
}

/** @throws {NotFound} */
export function readCertificate(db: Db, id: number): Certificate {
  const found = joined(db).where(eq(certificates.id, id)).get();
  if (!found) throw new NotFound('This certificate');
  return { ...found, status: statusOf(db, id) };
}

/** The file exactly as it was issued. @throws {Conflict} while it is being made */
export function certificateFile(db: Db, id: number): { bytes: Uint8Array; fileName: string } {
  const { number } = readCertificate(db, id);
  const found = db
    .select({ bytes: certificateFiles.bytes })
    .from(certificateFiles)
    .where(eq(certificateFiles.certificateId, id))
    .get();
  if (!found) throw new Conflict('file-being-made', `The file of ${number} is being made; try again in a moment.`);
  return { bytes: found.bytes, fileName: `${number}.pdf` };
}
