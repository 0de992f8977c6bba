import { type Context } from '#server/context';
import { serve } from '#server/serve';
import { readCounts } from '#shared/contract/counts';
import { type Router } from 'express';
import { countStations } from './count-queries';

export function countRoutes(router: Router, { db, clock }: Context): void {
  serve(router, readCounts, () => countStations(db, clock.now()));
}
