import { computed, inject, type Signal } from '@angular/core';
import { type Endpoint } from '#shared/contract/endpoint';
import { Session } from './session';

/** Whether the person may call an endpoint, as the contract says. Call it where injection is possible. */
export function may(endpoint: Pick<Endpoint, 'who'>): Signal<boolean> {
  const session = inject(Session);
  return computed(() => session.mayCall(endpoint));
}
