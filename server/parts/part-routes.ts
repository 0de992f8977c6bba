import { type Context } from '#server/context';
import { serve } from '#server/serve';
import * as contract from '#shared/contract/parts';
import { type Router } from 'express';
import { addPart, changePart } from './keep-part';
import { findPart, listParts } from './part-queries';

export function partRoutes(router: Router, context: Context): void {
  const { db } = context;
  serve(router, contract.listParts, ({ caller }) => ({ items: listParts(db, caller) }));
  serve(router, contract.readPart, ({ caller, params }) => findPart(db, caller, params.id));
  serve(router, contract.addPart, ({ caller, body }) => addPart(context, caller, body));
  serve(router, contract.changePart, ({ caller, params, version, body }) =>
    changePart(context, caller, { id: params.id, version, body }),
  );
}
