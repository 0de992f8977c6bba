import { type Context } from '#server/context';
import { serve } from '#server/serve';
import * as contract from '#shared/contract/instruments';
import { type Router } from 'express';
import { dayOf, findInstrument, listInstruments } from './instrument-queries';
import { addInstrument, changeInstrument } from './keep-instrument';

export function instrumentRoutes(router: Router, context: Context): void {
  const { db, clock } = context;
  serve(router, contract.listInstruments, () => ({ items: listInstruments(db, dayOf(clock.now())) }));
  serve(router, contract.readInstrument, ({ params }) => findInstrument(db, params.id, dayOf(clock.now())));
  serve(router, contract.addInstrument, ({ caller, body }) => addInstrument(context, caller, body));
  serve(router, contract.changeInstrument, ({ caller, params, version, body }) =>
    changeInstrument(context, caller, { id: params.id, version, body }),
  );
}
