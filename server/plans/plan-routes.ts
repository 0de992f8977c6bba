import { type Context } from '#server/context';
import { serve } from '#server/serve';
import * as contract from '#shared/contract/plans';
import { type Router } from 'express';
import { addPlan } from './add-plan';
import { addRevision } from './add-revision';
import { approveRevision } from './approve-revision';
import { changeRevision } from './change-revision';
import { findPlan, listPlans } from './plan-queries';
import { returnRevision, submitRevision } from './review-revision';

export function planRoutes(router: Router, context: Context): void {
  const { db } = context;
  serve(router, contract.listPlans, ({ caller }) => ({ items: listPlans(db, caller) }));
  serve(router, contract.readPlan, ({ caller, params }) => findPlan(db, caller, params.id));
  serve(router, contract.addPlan, ({ caller, body }) => addPlan(context, caller, body));
  serve(router, contract.addRevision, ({ caller, params }) => addRevision(context, caller, params.id));
  serve(router, contract.changeRevision, ({ caller, params, version, body }) =>
    changeRevision(context, caller, { ...params, version }, body),
  );
  serve(router, contract.submitRevision, ({ caller, params, version }) =>
    submitRevision(context, caller, { ...params, version }),
  );
  serve(router, contract.returnRevision, ({ caller, params, version, body }) =>
    returnRevision(context, caller, { ...params, version }, body.reason),
  );
  serve(router, contract.approveRevision, ({ caller, params, version }) =>
    approveRevision(context, caller, { ...params, version }),
  );
}
