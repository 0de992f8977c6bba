import { type Context } from '#server/context';
import { serve } from '#server/serve';
import * as contract from '#shared/contract/nonconformances';
import { type Router } from 'express';
import { listNonconformances, readNonconformance } from './nonconformance-queries';

export function nonconformanceRoutes(router: Router, { db }: Context): void {
  serve(router, contract.listNonconformances, ({ caller, query }) => listNonconformances(db, caller, query));
  serve(router, contract.readNonconformance, ({ caller, params }) => readNonconformance(db, caller, params.id));
}
