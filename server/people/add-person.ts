import { people } from '#db/schema/people';
import { record } from '#server/audit/record';
import { type Caller } from '#server/caller';
import { type Context } from '#server/context';
import { makeLink, type OneTimeLink } from '#server/sessions/one-time-links';
import { type Person, type personBody } from '#shared/contract/people';
import type * as z from 'zod';
import { findPerson } from './people-queries';
import { holdOwnIdentity, keepRoles } from './person-rules';

/** A person with the link that sets the password; the administrator hands it over. */
export type PersonWithLink = OneTimeLink & { person: Person };

export function addPerson(
  { db, clock, environment }: Context,
  caller: Caller,
  body: z.output<typeof personBody>,
): PersonWithLink {
  return db.transaction((tx) => {
    const now = clock.now();
    holdOwnIdentity(tx, undefined, body);
    const { name, email, stampNumber, roles } = body;
    const { id } = tx.insert(people).values({ name, email, stampNumber }).returning({ id: people.id }).get();
    keepRoles(tx, id, roles);
    record(tx, { at: now, person: caller, action: 'added', subject: 'person', subjectId: id, after: body });
    return {
      person: findPerson(tx, id),
      ...makeLink(tx, environment, { purpose: 'set-password', personId: id, now }),
    };
  });
}
