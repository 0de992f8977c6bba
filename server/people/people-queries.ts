import { type Db } from '#db/open-database';
import { people, personRoles } from '#db/schema/people';
import { NotFound } from '#server/problems';
import { type Person } from '#shared/contract/people';
import { ROLES, type Role } from '#shared/contract/roles';
import { and, asc, eq, isNotNull, ne } from 'drizzle-orm';

type PersonRow = typeof people.$inferSelect;

function personOf(row: PersonRow, roles: readonly Role[]): Person {
  const { passwordHash, lastSignInAt, ...rest } = row;
  const inOrder = ROLES.filter((role) => roles.includes(role));
  return { ...rest, roles: inOrder, hasPassword: passwordHash !== null, lastSignIn: lastSignInAt };
}

export function listPeople(db: Db): Person[] {
  const rows = db.select().from(people).orderBy(asc(people.name)).all();
  const held = db.select().from(personRoles).all();
  const rolesOf = (id: number) => held.filter(({ personId }) => personId === id).map(({ role }) => role);
  return rows.map((row) => personOf(row, rolesOf(row.id)));
}

/** @throws {NotFound} */
export function findPerson(db: Db, id: number): Person {
  const row = db.select().from(people).where(eq(people.id, id)).get();
  if (!row) throw new NotFound('This person');
  const roles = db.select().from(personRoles).where(eq(personRoles.personId, id)).all();
  return personOf(
    row,
    roles.map(({ role }) => role),
  );
}

/** Whether somebody other than this person can administer the site: active, with the role, and with a password set. */
export function hasOtherAdmin(db: Db, personId: number): boolean {
  const other = db
    .select({ id: people.id })
    .from(people)
    .innerJoin(personRoles, and(eq(personRoles.personId, people.id), eq(personRoles.role, 'admin')))
    .where(and(ne(people.id, personId), eq(people.active, true), isNotNull(people.passwordHash)))
    .get();
  return other !== undefined;
}
