import { type Who } from '#shared/contract/endpoint';
import { type Role } from '#shared/contract/roles';

/** The person who calls, as the database knows them at this moment. */
export interface Caller {
  id: number;
  name: string;
  email: string;
  stampNumber: string | null;
  roles: readonly Role[];
  sessionId: string;
}

export function hasRole(caller: Caller, ...roles: readonly Role[]): boolean {
  return roles.some((role) => caller.roles.includes(role));
}

/** Whether the contract lets this caller use an endpoint. */
export function mayCall(caller: Caller, { who }: { who: Who }): boolean {
  return who === 'anyone' || who === 'signed-in' || (who !== 'rack' && hasRole(caller, ...who));
}
