import { DEMO_PASSWORD, DEMO_SIGN_INS } from '#db/demo/sign-ins';
import { type Db } from '#db/open-database';
import { people } from '#db/schema/people';
import { type Environment } from '#server/environment';
import { type Front } from '#shared/contract/site';
import { eq } from 'drizzle-orm';
import { readFileSync } from 'node:fs';
import path from 'node:path';
import * as z from 'zod';
import { findSite } from './site-queries';

/** The version of the program, as its package says. */
export function programVersion(root: string): string {
  const text = readFileSync(path.join(root, 'package.json'), 'utf8');
  return z.object({ version: z.string() }).parse(JSON.parse(text)).version;
}

/** The first person of each set of roles, while the account is active. */
function demoSignIns(db: Db): Front['signIns'] {
  const active = db.select({ email: people.email }).from(people).where(eq(people.active, true)).all();
  const known = new Set(active.map(({ email }) => email));
  const firsts = DEMO_SIGN_INS.filter(
    ({ roles }, index) => DEMO_SIGN_INS.findIndex((other) => other.roles.join() === roles.join()) === index,
  );
  return firsts
    .filter(({ email }) => known.has(email))
    .map(({ name, roles, email }) => ({ name, roles: [...roles], email, password: DEMO_PASSWORD }));
}

/** What the sign-in page may know. A production site never shows a password. */
export function findFront(db: Db, { mode }: Environment, version: string): Front {
  return { name: findSite(db).name, mode, version, signIns: mode === 'demo' ? demoSignIns(db) : [] };
}
