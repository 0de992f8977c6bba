import { type Context } from '#server/context';
import { type RunningVerdicts } from '#server/judging/running-verdicts';
import { serve } from '#server/serve';
import * as contract from '#shared/contract/racks';
import { type Router } from 'express';
import { keepRackReadings } from './keep-rack-readings';
import { addRack, changeRack } from './keep-rack';
import { issueToken, revokeToken } from './keep-tokens';
import { rackLimit } from './rack-limit';
import { readRackLot } from './rack-lot';
import { findRack, listRacks } from './rack-queries';
import { keepRackWaveform } from './keep-rack-waveform';

/** What people do with racks, and behind it what racks do by themselves. */
export function rackRoutes(router: Router, context: Context, verdicts: RunningVerdicts): void {
  const { db } = context;
  serve(router, contract.listRacks, () => ({ items: listRacks(db) }));
  serve(router, contract.readRack, ({ params }) => findRack(db, params.id));
  serve(router, contract.addRack, ({ caller, body }) => addRack(context, caller, body));
  serve(router, contract.changeRack, ({ caller, params, version, body }) =>
    changeRack(context, caller, { id: params.id, version, body }),
  );
  serve(router, contract.issueRackToken, ({ caller, params }) => issueToken(context, caller, params.id));
  serve(router, contract.revokeRackToken, ({ caller, params }) =>
    revokeToken(context, caller, { rackId: params.id, tokenId: params.token }),
  );

  router.use('/api/rack', rackLimit());
  serve(router, contract.readRackLot, ({ rack, params }) => readRackLot(db, verdicts, rack, params.number));
  serve(router, contract.sendRackReadings, ({ rack, params, body }) =>
    keepRackReadings(context, verdicts, rack, params.number, body.readings),
  );
  serve(router, contract.sendRackWaveform, ({ rack, params, query, request }) =>
    keepRackWaveform(context, rack, params, { ...query, stream: request }),
  );
}
