import { type Db } from '#db/open-database';
import { people } from '#db/schema/people';
import { eq, sql } from 'drizzle-orm';
import { record } from '#server/audit/record';
import { type Caller } from '#server/caller';
import { type Context } from '#server/context';
import { Refused, Unauthenticated } from '#server/problems';
import { endSessionsOf } from './end-sessions';

export function keepPassword(db: Db, personId: number, passwordHash: string): void {
  db.update(people)
    .set({ passwordHash, version: sql`${people.version} + 1` })
    .where(eq(people.id, personId))
    .run();
}

function hashOf(db: Db, personId: number): string | null {
  return db.select({ hash: people.passwordHash }).from(people).where(eq(people.id, personId)).get()?.hash ?? null;
}

/** Changes the own password and ends every other session of the person. */
export async function changePassword(
  context: Context,
  caller: Caller,
  { password, newPassword }: { password: string; newPassword: string },
): Promise<void> {
  const { db, clock, passwords } = context;
  const own = hashOf(db, caller.id);
  if (own === null || !(await passwords.matches(password, own)))
    throw new Refused('wrong-password', 'The password was not changed.', [
      { path: ['password'], message: 'This is not the password you have now.' },
    ]);
  if (newPassword === password)
    throw new Refused('same-password', 'The password was not changed.', [
      { path: ['newPassword'], message: 'This is the password you have now.' },
    ]);
  const hash = await passwords.hash(newPassword);
  db.transaction((tx) => {
    const now = clock.now();
    // Hashing takes a while: whoever reset the account meanwhile keeps the last word.
    if (hashOf(tx, caller.id) !== own)
      throw new Unauthenticated('session-ended', 'Your session has ended. Sign in again.');
    keepPassword(tx, caller.id, hash);
    endSessionsOf(tx, caller.id, 'password-changed', now, caller.sessionId);
    record(tx, { at: now, person: caller, action: 'password-changed', subject: 'person', subjectId: caller.id });
  });
}
