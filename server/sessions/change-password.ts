import { type Db } from '#db/open-database';
import { people } from '#db/schema/people';
import { eq, sql } from 'drizzle-orm';
import { record } from '#server/audit/record';
import { type Caller } from '#server/caller';
import { type Context } from '#server/context';
import { Refused } from '#server/problems';
import { endSessionsOf } from './end-sessions';

export function keepPassword(db: Db, personId: number, passwordHash: string): void {
  db.update(people)
    .set({ passwordHash, version: sql`${people.version} + 1` })
    .where(eq(people.id, personId))
    .run();
}

/** Whether the password is the one the person has now. */
async function isOwnPassword({ db, passwords }: Context, personId: number, password: string): Promise<boolean> {
  const person = db.select({ hash: people.passwordHash }).from(people).where(eq(people.id, personId)).get();
  return typeof person?.hash === 'string' && (await passwords.matches(password, person.hash));
}

/** Changes the own password and ends every other session of the person. */
export async function changePassword(
  context: Context,
  caller: Caller,
  { password, newPassword }: { password: string; newPassword: string },
): Promise<void> {
  const { db, clock, passwords } = context;
  if (!(await isOwnPassword(context, caller.id, password)))
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
    keepPassword(tx, caller.id, hash);
    endSessionsOf(tx, caller.id, 'password-changed', now, caller.sessionId);
    record(tx, { at: now, person: caller, action: 'password-changed', subject: 'person', subjectId: caller.id });
  });
}
