import { type Context } from '#server/context';
import { serve } from '#server/serve';
import { listAudit, verifyAudit } from '#shared/contract/audit';
import { type Router } from 'express';
import { listEntries } from './audit-queries';
import { verifyChain } from './verify-chain';

export function auditRoutes(router: Router, { db }: Context): void {
  serve(router, listAudit, ({ caller, query }) => listEntries(db, caller, query));
  serve(router, verifyAudit, () => verifyChain(db));
}
