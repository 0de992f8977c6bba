import { type Context } from '#server/context';
import { serve } from '#server/serve';
import * as contract from '#shared/contract/gauge-studies';
import { type Router } from 'express';
import { listGaugeStudies, readGaugeStudy } from './gauge-study-queries';
import { addGaugeStudy, changeGaugeStudy, closeGaugeStudy } from './keep-gauge-study';
import { printGaugeStudy } from './print-gauge-study';

export function gaugeStudyRoutes(router: Router, context: Context): void {
  const { db } = context;
  serve(router, contract.listGaugeStudies, ({ query }) => listGaugeStudies(db, query));
  serve(router, contract.readGaugeStudy, ({ params }) => readGaugeStudy(db, params.id));
  serve(router, contract.addGaugeStudy, ({ caller, body }) => addGaugeStudy(context, caller, body));
  serve(router, contract.changeGaugeStudy, ({ caller, params, version, body }) =>
    changeGaugeStudy(context, caller, { id: params.id, version, body }),
  );
  serve(router, contract.closeGaugeStudy, ({ caller, params, version }) =>
    closeGaugeStudy(context, caller, { id: params.id, version }),
  );
  serve(router, contract.printGaugeStudy, ({ params }) => printGaugeStudy(context, params.id));
}
