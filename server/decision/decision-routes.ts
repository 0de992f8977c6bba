import { type Context } from '#server/context';
import { serve } from '#server/serve';
import * as contract from '#shared/contract/decision';
import { type Router } from 'express';
import { assessLot } from './assess-lot';
import { decideLot } from './decide-lot';
import { holdLot, liftHold } from './hold-lot';

export function decisionRoutes(router: Router, context: Context): void {
  serve(router, contract.readAssessment, ({ params, caller }) => assessLot(context.db, params.id, caller));
  serve(router, contract.decideLot, ({ params, caller, version, body }) =>
    decideLot(context, caller, params.id, version, body),
  );
  serve(router, contract.holdLot, ({ params, caller, version, body }) =>
    holdLot(context, caller, params.id, version, body),
  );
  serve(router, contract.liftHold, ({ params, caller, version, body }) =>
    liftHold(context, caller, params.id, version, body.reason),
  );
}
