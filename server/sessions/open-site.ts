import { type Db } from '#db/open-database';
import { people, personRoles } from '#db/schema/people';
import { type openSite as endpoint } from '#shared/contract/session';
import type * as z from 'zod';
import { record } from '#server/audit/record';
import { type Context } from '#server/context';
import { Conflict, Problem } from '#server/problems';
import { findLink, makeLink, useLink } from './one-time-links';

type FirstAdmin = z.output<(typeof endpoint)['body']>;

function isEmpty(db: Db): boolean {
  return db.select({ id: people.id }).from(people).limit(1).get() === undefined;
}

function holdSetUpLink(db: Db, token: string, now: Date): string {
  const { purpose, tokenHash } = findLink(db, token, now);
  if (purpose !== 'first-admin') throw new Problem(410, 'link-not-valid', 'This link does not set the site up.');
  if (!isEmpty(db)) throw new Conflict('site-open-already', 'The site has its first administrator already.');
  return tokenHash;
}

/** Creates the first administrator of a site where nobody has an account yet. */
export async function openSite({ db, clock, passwords }: Context, input: FirstAdmin): Promise<void> {
  holdSetUpLink(db, input.token, clock.now());
  const passwordHash = await passwords.hash(input.newPassword);
  db.transaction((tx) => {
    const now = clock.now();
    useLink(tx, holdSetUpLink(tx, input.token, now), now);
    const { name, email } = input;
    const person = tx
      .insert(people)
      .values({ name, email, passwordHash })
      .returning({ id: people.id, name: people.name })
      .get();
    tx.insert(personRoles).values({ personId: person.id, role: 'admin' }).run();
    const after = { name, email, roles: ['admin'] };
    record(tx, {
      at: now,
      // As it was kept: the database mends half characters, and the hash is of what is read again.
      person,
      action: 'added',
      subject: 'person',
      subjectId: person.id,
      after,
    });
  });
}

/** A new set-up link for a site where nobody has an account; undefined once somebody has. */
export function firstAdminLink({ db, clock, environment }: Context): string | undefined {
  return db.transaction((tx) => {
    if (!isEmpty(tx)) return undefined;
    return makeLink(tx, environment, { purpose: 'first-admin', personId: null, now: clock.now() }).link;
  });
}
