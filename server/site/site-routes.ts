import { type Context } from '#server/context';
import { serve } from '#server/serve';
import * as contract from '#shared/contract/site';
import { type Router } from 'express';
import { changeSite } from './change-site';
import { findFront, programVersion } from './front';
import { findSite } from './site-queries';

export function siteRoutes(router: Router, context: Context): void {
  const { db, environment } = context;
  const version = programVersion(environment.root);
  serve(router, contract.readFront, () => findFront(db, environment, version));
  serve(router, contract.readSite, () => findSite(db));
  serve(router, contract.changeSite, ({ caller, version: named, body }) =>
    changeSite(context, caller, { version: named, body }),
  );
}
