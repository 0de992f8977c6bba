import { type Context } from '#server/context';
import { serve } from '#server/serve';
import * as contract from '#shared/contract/certificates';
import { type Router } from 'express';
import { certificateFile, listCertificates, readCertificate } from './certificate-queries';
import { tryCertificateFile } from './make-certificate-file';

export function certificateRoutes(router: Router, context: Context): void {
  const { db } = context;
  serve(router, contract.listCertificates, ({ query }) => listCertificates(db, query));
  serve(router, contract.readCertificate, ({ params }) => readCertificate(db, params.id));
  serve(router, contract.openCertificate, async ({ params }) => {
    // A file that could not be made at the release is tried again by whoever asks for it.
    if (readCertificate(db, params.id).sha256 === null) await tryCertificateFile(context, params.id);
    return certificateFile(db, params.id);
  });
}
