import { type Db } from '#db/open-database';
import { people, personRoles } from '#db/schema/people';
import { inProcessPasswords } from '#server/sessions/passwords';
import { ROLES, type Role } from '#shared/contract/roles';

export const PASSWORD = 'a plain long password';
export const PASSWORD_COST = 4;

const passwordHash = inProcessPasswords(PASSWORD_COST).hash(PASSWORD);

export interface TestPerson {
  id: number;
  name: string;
  email: string;
}

const NAMES: Record<Role, string> = {
  receiving: 'Rafe Dockett',
  inspector: 'Ines Benchley',
  quality: 'Quill Averard',
  engineering: 'Enno Designo',
  auditor: 'Auda Trailby',
  admin: 'Addis Keyman',
};
const STAMPS: Partial<Record<Role, string>> = { inspector: '14', quality: '7' };

export async function addTestPerson(
  db: Db,
  person: { name: string; email: string; roles: readonly Role[]; stampNumber?: string | null },
): Promise<TestPerson> {
  const { name, email, roles, stampNumber = null } = person;
  const hash = await passwordHash;
  const { id } = db
    .insert(people)
    .values({ name, email, stampNumber, passwordHash: hash })
    .returning({ id: people.id })
    .get();
  for (const role of roles) db.insert(personRoles).values({ personId: id, role }).run();
  return { id, name, email };
}

/** One person for each role, at `<role>@hollowmere.example`. */
export async function addTestPeople(db: Db): Promise<Record<Role, TestPerson>> {
  const added: Partial<Record<Role, TestPerson>> = {};
  for (const role of ROLES) {
    const stampNumber = STAMPS[role] ?? null;
    const email = `${role}@hollowmere.example`;
    added[role] = await addTestPerson(db, { name: NAMES[role], email, roles: [role], stampNumber });
  }
  return added as Record<Role, TestPerson>;
}
