import { type Context } from '#server/context';
import { serve } from '#server/serve';
import { search } from '#shared/contract/counts';
import { type Router } from 'express';
import { findHits } from './find-hits';

export function searchRoutes(router: Router, { db }: Context): void {
  serve(router, search, ({ caller, query }) => ({ items: findHits(db, caller, query.text) }));
}
