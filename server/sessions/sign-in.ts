import { type Db } from '#db/open-database';
import { people } from '#db/schema/people';
import { type signIn as endpoint } from '#shared/contract/session';
import { eq } from 'drizzle-orm';
import type * as z from 'zod';
import { record } from '#server/audit/record';
import { type Context } from '#server/context';
import { Unauthenticated } from '#server/problems';
import { unmatchableHash } from './passwords';
import { findByEmail } from './session-queries';
import { startSession, type SessionTokens } from './start-session';

type Credentials = z.output<(typeof endpoint)['body']>;
type Found = ReturnType<typeof findByEmail>;

/** Why a sign-in was refused: for the audit trail only, the answer is the same for all. */
function whyRefused(person: Found, passwordRight: boolean): string | undefined {
  if (!person) return 'unknown-person';
  if (!person.active) return 'inactive';
  if (person.passwordHash === null) return 'no-password-yet';
  return passwordRight ? undefined : 'wrong-password';
}

function recordRefusal(db: Db, person: Found, email: string, why: string, at: Date): void {
  record(db, {
    at,
    person: null,
    action: 'sign-in-refused',
    subject: 'person',
    subjectId: person?.id ?? 'unknown',
    after: { email, why },
  });
}

/** Opens a session for whoever knows the password. */
export async function signIn(context: Context, { email, password, keep }: Credentials): Promise<SessionTokens> {
  const { db, clock, environment, passwords } = context;
  const known = findByEmail(db, email);
  // Somebody unknown takes as long to refuse as a wrong password does.
  const right = await passwords.matches(password, known?.passwordHash ?? unmatchableHash(environment.passwordCost));
  const tokens = db.transaction((tx) => {
    const now = clock.now();
    // The hash was checked outside the transaction; whatever changed meanwhile counts.
    const person = findByEmail(tx, email);
    const refused = whyRefused(person, right && person?.passwordHash === known?.passwordHash);
    if (!person || refused !== undefined) {
      recordRefusal(tx, person, email, refused ?? 'unknown-person', now);
      return undefined;
    }
    tx.update(people).set({ lastSignInAt: now.toISOString() }).where(eq(people.id, person.id)).run();
    record(tx, { at: now, person, action: 'signed-in', subject: 'person', subjectId: person.id, after: { keep } });
    return startSession(tx, { personId: person.id, keep, now });
  });
  if (!tokens) throw new Unauthenticated('sign-in-refused', 'E-mail or password is not right.');
  return tokens;
}
