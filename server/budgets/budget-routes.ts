import { type Context } from '#server/context';
import { serve } from '#server/serve';
import * as contract from '#shared/contract/budgets';
import { type Router } from 'express';
import { readBudget } from './read-budget';

export function budgetRoutes(router: Router, { db }: Context): void {
  serve(router, contract.readBudget, ({ params: { id, unit, key }, query }) =>
    readBudget(db, { lotId: id, unit, key, readingId: query.reading }),
  );
}
