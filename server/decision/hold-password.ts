import { auditEntries } from '#db/schema/audit';
import { people } from '#db/schema/people';
import { record } from '#server/audit/record';
import { type Caller } from '#server/caller';
import { type Context } from '#server/context';
import { Problem, Refused } from '#server/problems';
import { and, count, eq, gte } from 'drizzle-orm';

/** As long as at the sign-in: within it so many wrong passwords are told apart from slips. */
const MINUTES = 15;
const WRONG = 'signature refused';

function recentlyWrong({ db, clock }: Context, caller: Caller): number {
  const since = new Date(clock.now().getTime() - MINUTES * 60_000).toISOString();
  const counted = db
    .select({ times: count() })
    .from(auditEntries)
    .where(and(eq(auditEntries.personId, caller.id), eq(auditEntries.action, WRONG), gte(auditEntries.at, since)))
    .get();
  return counted?.times ?? 0;
}

/**
 * Signing asks for the password once more; wrong ones go into the audit trail, which also limits them.
 *
 * @throws {Refused} naming the field
 * @throws {Problem} 429 after too many wrong ones
 */
export async function holdPassword(context: Context, caller: Caller, password: string): Promise<void> {
  const { db, passwords, clock, environment } = context;
  const holdLimit = () => {
    if (recentlyWrong(context, caller) >= environment.signInAttempts)
      throw new Problem(429, 'too-many-attempts', `Too many wrong passwords; sign again in ${MINUTES} minutes.`);
  };
  holdLimit();
  const found = db.select({ hash: people.passwordHash }).from(people).where(eq(people.id, caller.id)).get();
  const right = typeof found?.hash === 'string' && (await passwords.matches(password, found.hash));
  // Once more: others may have been tried while this one was checked.
  holdLimit();
  if (right) return;
  record(db, { at: clock.now(), person: caller, action: WRONG, subject: 'person', subjectId: caller.id });
  const message = 'This is not your password.';
  throw new Refused('password-wrong', message, [{ path: ['password'], message }]);
}
