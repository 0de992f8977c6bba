import { type Context } from '#server/context';
import { serve } from '#server/serve';
import * as contract from '#shared/contract/yields';
import { type Router } from 'express';
import { readYields } from './yield-queries';

export function yieldRoutes(router: Router, { db }: Context): void {
  serve(router, contract.readYields, ({ query }) => readYields(db, query));
}
