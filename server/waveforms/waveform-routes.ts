import { type Context } from '#server/context';
import { serve } from '#server/serve';
import * as contract from '#shared/contract/waveforms';
import { type Router } from 'express';
import { movePeaks, withdrawWaveform } from './change-waveform';
import { keepWaveform } from './keep-waveform';
import { findWaveform, findWaveformRow, listWaveforms } from './waveform-view';

export function waveformRoutes(router: Router, context: Context): void {
  const { db, files } = context;
  serve(router, contract.listWaveforms, ({ params }) => ({ items: listWaveforms(db, params.id) }));
  serve(router, contract.keepWaveform, async ({ caller, params, query, request }) => {
    const sent = { ...query, id: params.waveform };
    const upload = { ...sent, stream: request, most: contract.LARGEST_WAVEFORM };
    return (await keepWaveform(context, params.id, { person: caller, rackId: null }, upload)).waveform;
  });
  serve(router, contract.readWaveform, ({ params }) => findWaveform(db, params.waveform));
  serve(router, contract.readWaveformSamples, ({ params }) =>
    files.find(db, findWaveformRow(db, params.waveform).samplesId),
  );
  serve(router, contract.readWaveformFile, ({ params }) => files.find(db, findWaveformRow(db, params.waveform).fileId));
  serve(router, contract.moveWaveformPeaks, ({ caller, params, version, body }) =>
    movePeaks(context, caller, { id: params.waveform, version }, body.indices),
  );
  serve(router, contract.withdrawWaveform, ({ caller, params, version, body }) =>
    withdrawWaveform(context, caller, { id: params.waveform, version }, body.reason),
  );
}
