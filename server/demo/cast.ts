import { DEMO_PASSWORD, DEMO_SIGN_INS } from '#db/demo/sign-ins';
import { people } from '#db/schema/people';
import { record } from '#server/audit/record';
import { type Caller } from '#server/caller';
import { type Context } from '#server/context';
import { keepRoles } from '#server/people/person-rules';

/** The people of the demo, each at the work that is theirs. */
export interface Cast {
  receiving: Caller;
  inspectors: readonly [Caller, Caller];
  quality: readonly [Caller, Caller];
  admin: Caller;
}

function find(callers: readonly Caller[], email: string): Caller {
  const found = callers.find((caller) => caller.email === `${email}@hollowmere.example`);
  if (!found) throw new Error(`The demo has no ${email}.`);
  return found;
}

function castOf(callers: readonly Caller[]): Cast {
  return {
    receiving: find(callers, 'receiving'),
    inspectors: [find(callers, 'inspector'), find(callers, 'inspector2')],
    quality: [find(callers, 'quality'), find(callers, 'quality2')],
    admin: find(callers, 'admin'),
  };
}

/** Adds the people of the demo. They share one password, whose hash is made once because making it takes long on purpose. */
export async function addCast({ db, clock, passwords }: Context): Promise<Cast> {
  const passwordHash = await passwords.hash(DEMO_PASSWORD);
  return db.transaction((tx) => {
    const callers = DEMO_SIGN_INS.map(({ roles, ...person }): Caller => {
      const { id } = tx
        .insert(people)
        .values({ ...person, passwordHash })
        .returning({ id: people.id })
        .get();
      keepRoles(tx, id, roles);
      return { id, ...person, roles, sessionId: 'demo' };
    });
    const cast = castOf(callers);
    const added = callers.map(({ id, name, email, stampNumber, roles }) => ({
      at: clock.now(),
      person: id === cast.admin.id ? null : cast.admin,
      action: 'added',
      subject: 'person',
      subjectId: id,
      after: { name, email, stampNumber, roles },
    }));
    for (const change of added) record(tx, change);
    return cast;
  });
}
