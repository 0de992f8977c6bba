import { type Context } from '#server/context';
import { serve } from '#server/serve';
import * as contract from '#shared/contract/people';
import { type Router } from 'express';
import { addPerson } from './add-person';
import { changePerson } from './change-person';
import { listPeople } from './people-queries';
import { resetPerson } from './reset-person';

export function peopleRoutes(router: Router, context: Context): void {
  serve(router, contract.listPeople, () => ({ items: listPeople(context.db) }));
  serve(router, contract.addPerson, ({ caller, body }) => addPerson(context, caller, body));
  serve(router, contract.changePerson, ({ caller, params, version, body }) =>
    changePerson(context, caller, { id: params.id, version, body }),
  );
  serve(router, contract.resetPerson, ({ caller, params }) => resetPerson(context, caller, params.id));
}
