import { type Db } from '#db/open-database';
import { people, personRoles } from '#db/schema/people';
import { holdUnique } from '#server/taken';
import { type Role } from '#shared/contract/roles';
import { eq } from 'drizzle-orm';

/** An e-mail address signs in one person, a stamp marks the work of one person. */
export function holdOwnIdentity(
  db: Db,
  own: number | undefined,
  { email, stampNumber }: { email: string; stampNumber: string | null },
): void {
  holdUnique(db, people, own, [
    { column: people.email, value: email, path: ['email'], message: 'This address is taken.' },
    { column: people.stampNumber, value: stampNumber, path: ['stampNumber'], message: 'This number is taken.' },
  ]);
}

export function keepRoles(db: Db, personId: number, roles: readonly Role[]): void {
  db.delete(personRoles).where(eq(personRoles.personId, personId)).run();
  for (const role of new Set(roles)) db.insert(personRoles).values({ personId, role }).run();
}
