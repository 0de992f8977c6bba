import { people } from '#db/schema/people';
import { record } from '#server/audit/record';
import { type Caller } from '#server/caller';
import { type Context } from '#server/context';
import { Conflict } from '#server/problems';
import { endSessionsOf } from '#server/sessions/end-sessions';
import { makeLink } from '#server/sessions/one-time-links';
import { eq } from 'drizzle-orm';
import { type PersonWithLink } from './add-person';
import { findPerson } from './people-queries';

/** Ends every session of a person, forgets the password and makes a link that sets a new one. */
export function resetPerson({ db, clock, environment }: Context, caller: Caller, id: number): PersonWithLink {
  return db.transaction((tx) => {
    const now = clock.now();
    const person = findPerson(tx, id);
    if (id === caller.id)
      throw new Conflict('own-account', 'Nobody resets the own account. Change your password under your name.');
    if (!person.active) throw new Conflict('inactive', 'The account is not active. Activate it first.');
    tx.update(people)
      .set({ passwordHash: null, version: person.version + 1 })
      .where(eq(people.id, id))
      .run();
    endSessionsOf(tx, id, 'reset', now);
    record(tx, { at: now, person: caller, action: 'reset', subject: 'person', subjectId: id });
    return {
      person: findPerson(tx, id),
      ...makeLink(tx, environment, { purpose: 'set-password', personId: id, now }),
    };
  });
}
