import { type Context } from '#server/context';
import { dayOf } from '#server/instruments/instrument-queries';
import { serve } from '#server/serve';
import * as contract from '#shared/contract/calibrations';
import { type Router } from 'express';
import { attachFile, calibrationFile } from './calibration-file';
import { instrumentHistory } from './calibration-view';
import { recordCalibration } from './record-calibration';
import { recordCheck } from './record-check';

export function calibrationRoutes(router: Router, context: Context): void {
  const { db, clock } = context;
  serve(router, contract.readInstrumentHistory, ({ params }) => instrumentHistory(db, params.id, dayOf(clock.now())));
  serve(router, contract.recordCalibration, ({ caller, params, version, body }) =>
    recordCalibration(context, caller, { id: params.id, version, body }),
  );
  serve(router, contract.attachCalibrationFile, ({ caller, params, query, request }) =>
    attachFile(
      context,
      caller,
      { instrumentId: params.id, id: params.calibration },
      { fileName: query.fileName, stream: request },
    ),
  );
  serve(router, contract.readCalibrationFile, ({ params }) =>
    calibrationFile(context, { instrumentId: params.id, id: params.calibration }),
  );
  serve(router, contract.recordCheck, ({ caller, params, body }) =>
    recordCheck(context, caller, params.id, body.observed),
  );
}
