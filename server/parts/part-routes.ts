import { type Context } from '#server/context';
import { serve } from '#server/serve';
import * as contract from '#shared/contract/parts';
import { type Router } from 'express';
import { addPart, changePart } from './keep-part';
import { findPart, listParts } from './part-queries';

export function partRoutes(router: Router, context: Context): void {
  const { db } = context;
  serve(router, contract.listParts, () => ({ items: listParts(db) }));
  serve(router, contract.readPart, ({ params }) => findPart(db, params.id));
  serve(router, contract.addPart, ({ caller, body }) => addPart(context, caller, body));
  serve(router, contract.changePart, ({ caller, params, version, body }) =>
    changePart(context, caller, { id: params.id, version, body }),
  );
}
