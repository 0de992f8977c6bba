import { type Db } from '#db/open-database';
import { record } from '#server/audit/record';
import { type Context } from '#server/context';
import { Problem } from '#server/problems';
import { keepPassword } from './change-password';
import { endSessionsOf } from './end-sessions';
import { findLink, useLink } from './one-time-links';

function ownerOf(db: Db, token: string, now: Date) {
  const { purpose, person, tokenHash } = findLink(db, token, now);
  if (purpose !== 'set-password' || !person)
    throw new Problem(410, 'link-not-valid', 'This link does not set a password.');
  return { person, tokenHash };
}

/** Sets the password of the person to whom the link was handed over; the link works once. */
export async function setPassword(
  { db, clock, passwords }: Context,
  { token, newPassword }: { token: string; newPassword: string },
): Promise<void> {
  // Checked before the costly hash, and again inside the transaction: of two uses at once one wins.
  ownerOf(db, token, clock.now());
  const hash = await passwords.hash(newPassword);
  db.transaction((tx) => {
    const now = clock.now();
    const { person, tokenHash } = ownerOf(tx, token, now);
    useLink(tx, tokenHash, now);
    keepPassword(tx, person.id, hash);
    endSessionsOf(tx, person.id, 'password-set', now);
    record(tx, { at: now, person, action: 'password-set', subject: 'person', subjectId: person.id });
  });
}
