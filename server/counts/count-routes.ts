import { type Context } from '#server/context';
import { serve } from '#server/serve';
import { readCounts, readRecordCounts } from '#shared/contract/counts';
import { type Router } from 'express';
import { countStations } from './count-queries';
import { countRecords } from './record-counts';

export function countRoutes(router: Router, { db, clock }: Context): void {
  serve(router, readCounts, () => countStations(db, clock.now()));
  serve(router, readRecordCounts, ({ caller }) => countRecords(db, caller, clock.now()));
}
