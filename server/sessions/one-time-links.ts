import { type Db } from '#db/open-database';
import { people } from '#db/schema/people';
import { oneTimeLinks } from '#db/schema/sessions';
import { and, eq, gt, isNull, sql } from 'drizzle-orm';
import { type Environment } from '#server/environment';
import { Problem } from '#server/problems';
import { hashToken, newToken } from './secret-token';

const LIFE = 72 * 60 * 60 * 1000;

type Purpose = 'first-admin' | 'set-password';

/** A link as it is handed over, once. */
export interface OneTimeLink {
  link: string;
  expires: string;
}

/** The token stands in the fragment, which no browser sends to a server, so it is in no log. */
function address({ publicUrl, host, port }: Environment, token: string): string {
  const base = publicUrl ?? `http://${host}:${port}`;
  return `${base.replace(/\/+$/, '')}/link#${token}`;
}

/** Forgets the links of a person that were not used; the newest link is the only one that works. */
export function dropLinks(db: Db, purpose: Purpose, personId: number | null): void {
  const owner = personId === null ? isNull(oneTimeLinks.personId) : eq(oneTimeLinks.personId, personId);
  db.delete(oneTimeLinks)
    .where(and(eq(oneTimeLinks.purpose, purpose), owner, isNull(oneTimeLinks.usedAt)))
    .run();
}

/** Makes a link; call it inside the transaction that gives the reason for it. */
export function makeLink(
  db: Db,
  environment: Environment,
  { purpose, personId, now }: { purpose: Purpose; personId: number | null; now: Date },
): OneTimeLink {
  dropLinks(db, purpose, personId);
  const token = newToken();
  const expires = new Date(now.getTime() + LIFE).toISOString();
  db.insert(oneTimeLinks)
    .values({ tokenHash: hashToken(token), purpose, personId, issuedAt: now.toISOString(), expiresAt: expires })
    .run();
  return { link: address(environment, token), expires };
}

/**
 * What a link that still works is for.
 * @throws {Problem} 410 when it is unknown, used, replaced or too old: nobody is told which
 */
export function findLink(db: Db, token: string, now: Date) {
  const found = db
    .select({
      tokenHash: oneTimeLinks.tokenHash,
      purpose: oneTimeLinks.purpose,
      person: { id: people.id, name: people.name, email: people.email },
    })
    .from(oneTimeLinks)
    .leftJoin(people, eq(people.id, oneTimeLinks.personId))
    .where(
      and(
        eq(oneTimeLinks.tokenHash, hashToken(token)),
        isNull(oneTimeLinks.usedAt),
        gt(oneTimeLinks.expiresAt, now.toISOString()),
        sql`coalesce(${people.active}, 1) = 1`,
      ),
    )
    .get();
  if (!found)
    throw new Problem(
      410,
      'link-not-valid',
      'This link was used, replaced or is too old. Ask an administrator for a new one.',
    );
  return found;
}

export function useLink(db: Db, tokenHash: string, now: Date): void {
  db.update(oneTimeLinks).set({ usedAt: now.toISOString() }).where(eq(oneTimeLinks.tokenHash, tokenHash)).run();
}
