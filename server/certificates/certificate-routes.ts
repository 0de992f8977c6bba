import { type Context } from '#server/context';
import { serve } from '#server/serve';
import * as contract from '#shared/contract/certificates';
import { type Router } from 'express';
import { certificateFile, listCertificates, readCertificate } from './certificate-queries';

export function certificateRoutes(router: Router, { db }: Context): void {
  serve(router, contract.listCertificates, ({ query }) => listCertificates(db, query));
  serve(router, contract.readCertificate, ({ params }) => readCertificate(db, params.id));
  serve(router, contract.openCertificate, ({ params }) => certificateFile(db, params.id));
}
