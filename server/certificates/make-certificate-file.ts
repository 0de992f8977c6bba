import { certificateFiles, certificates, certificateStatuses } from '#db/schema/certificates';
import { record } from '#server/audit/record';
import { type Context } from '#server/context';
import { certificatePdf } from '#server/documents/certificate-pdf';
import { NotFound } from '#server/problems';
import { eq, isNull } from 'drizzle-orm';
import { createHash } from 'node:crypto';

/** Makes the file of an issued certificate and keeps it with its SHA-256; from then on the certificate is valid. */
async function makeCertificateFile({ db, clock }: Context, id: number): Promise<void> {
  const found = db.select().from(certificates).where(eq(certificates.id, id)).get();
  if (!found) throw new NotFound('This certificate');
  const bytes = await certificatePdf(found.data, found.dataDigest);
  const sha256 = createHash('sha256').update(bytes).digest('hex');
  const at = clock.now();
  db.transaction((tx) => {
    const made = tx
      .insert(certificateFiles)
      .values({ certificateId: id, sha256, bytes, madeAt: at.toISOString() })
      .onConflictDoNothing()
      .run();
    if (made.changes === 0) return;
    tx.insert(certificateStatuses).values({ certificateId: id, status: 'valid', at: at.toISOString() }).run();
    record(tx, { at, person: null, action: 'file made', subject: 'certificate', subjectId: id, after: { sha256 } });
  });
}

/**
 * Makes the file where that is possible. A release stands without it: what fails is logged, and tried again when the file is
 * opened and at the next start.
 */
export async function tryCertificateFile(context: Context, id: number): Promise<void> {
  try {
    await makeCertificateFile(context, id);
  } catch (error) {
    context.log.error({ err: error, certificate: id }, 'the file of a certificate could not be made');
  }
}

/** Makes the files that a stop or a failure left unmade between a decision and its paper. */
export async function makeMissingFiles(context: Context): Promise<void> {
  const missing = context.db
    .select({ id: certificates.id })
    .from(certificates)
    .leftJoin(certificateFiles, eq(certificateFiles.certificateId, certificates.id))
    .where(isNull(certificateFiles.certificateId))
    .all();
  for (const { id } of missing) await tryCertificateFile(context, id);
}
