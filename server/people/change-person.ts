import { type Db } from '#db/open-database';
import { people } from '#db/schema/people';
import { record } from '#server/audit/record';
import { type Caller } from '#server/caller';
import { type Context } from '#server/context';
import { Conflict, holdVersion } from '#server/problems';
import { endSessionsOf } from '#server/sessions/end-sessions';
import { dropLinks } from '#server/sessions/one-time-links';
import { type changePerson as endpoint, type Person } from '#shared/contract/people';
import { eq } from 'drizzle-orm';
import type * as z from 'zod';
import { findPerson, hasOtherAdmin } from './people-queries';
import { holdOwnIdentity, keepRoles } from './person-rules';

type Body = z.output<(typeof endpoint)['body']>;

/** Somebody must stay who can let people in. */
function holdAdministration(db: Db, caller: Caller, id: number, body: Body): void {
  if (!body.active && id === caller.id)
    throw new Conflict('own-account', 'Nobody deactivates the own account. Ask another administrator.');
  const staysAdmin = body.active && body.roles.includes('admin');
  if (!staysAdmin && !hasOtherAdmin(db, id))
    throw new Conflict('last-admin', 'This is the last administrator who can sign in. Make another one first.');
}

function shut(db: Db, id: number, now: Date): void {
  endSessionsOf(db, id, 'deactivated', now);
  dropLinks(db, 'set-password', id);
}

/** Changes a person; roles and deactivation act on the very next request. */
export function changePerson(
  { db, clock }: Context,
  caller: Caller,
  { id, version, body }: { id: number; version: number; body: Body },
): Person {
  return db.transaction((tx) => {
    const now = clock.now();
    const { name, email, stampNumber, roles, active, version: current } = findPerson(tx, id);
    holdVersion('The person', current, version);
    holdAdministration(tx, caller, id, body);
    holdOwnIdentity(tx, id, body);
    const columns = { name: body.name, email: body.email, stampNumber: body.stampNumber, active: body.active };
    tx.update(people)
      .set({ ...columns, version: current + 1 })
      .where(eq(people.id, id))
      .run();
    keepRoles(tx, id, body.roles);
    if (!body.active) shut(tx, id, now);
    const before = { name, email, stampNumber, roles, active };
    record(tx, { at: now, person: caller, action: 'changed', subject: 'person', subjectId: id, before, after: body });
    return findPerson(tx, id);
  });
}
