import { auditEntries } from '#db/schema/audit';
import { people, personRoles } from '#db/schema/people';
import { sessions } from '#db/schema/sessions';
import { firstAdminLink } from '#server/sessions/open-site';
import { type Person } from '#shared/contract/people';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { addTestPerson, PASSWORD } from '../support/test-people';
import { type Agent, testSite, type TestSite } from '../support/test-site';

const NEW_PASSWORD = 'another plain long password';
const NEWCOMER = { name: 'Nia Newcome', email: 'nia@hollowmere.example', stampNumber: '21', roles: ['inspector'] };

let site: TestSite;
let admin: Agent;
beforeEach(async () => {
  site = await testSite();
  admin = site.as('admin');
});
afterEach(() => site.close());

async function personOf(email: string): Promise<Person> {
  const { items } = (await admin.get('/api/people').expect(200)).body as { items: Person[] };
  const found = items.find((one) => one.email === email);
  if (!found) throw new Error(`Nobody has ${email}.`);
  return found;
}

function change(person: Person, given: Partial<Person>) {
  const { id, version, name, email, stampNumber, roles, active } = { ...person, ...given };
  const body = { name, email, stampNumber, roles, active };
  return admin.put(`/api/people/${id}`).set('if-match', `"${version}"`).send(body);
}

function tokenOf(link: string): string {
  return new URL(link).hash.slice(1);
}

function signIn(email: string, password: string) {
  return site.nobody().post('/api/session').send({ email, password });
}

describe('a new person', () => {
  it('gets a link once, sets a password with it and signs in', async () => {
    const { person, link } = (await admin.post('/api/people').send(NEWCOMER).expect(201)).body as {
      person: Person;
      link: string;
    };
    expect(person).toMatchObject({ ...NEWCOMER, active: true, hasPassword: false, lastSignIn: null });
    expect(link).toMatch(/^http:\/\/127\.0\.0\.1:3000\/link#[\w-]{43}$/);
    const token = tokenOf(link);
    await signIn(NEWCOMER.email, NEW_PASSWORD).expect(401);

    const read = await site.nobody().post('/api/one-time-link/read').send({ token }).expect(200);
    expect(read.body).toEqual({ purpose: 'set-password', name: NEWCOMER.name, email: NEWCOMER.email });
    const body = { token, newPassword: NEW_PASSWORD };
    await site.nobody().post('/api/one-time-link/password').send(body).expect(200);
    await signIn(NEWCOMER.email, NEW_PASSWORD).expect(200);
    const again = await site.nobody().post('/api/one-time-link/password').send(body).expect(410);
    expect(again.body).toMatchObject({ code: 'link-not-valid' });
    expect((await personOf(NEWCOMER.email)).lastSignIn).toBe(site.clock.now().toISOString());
  });

  it('has an address and a stamp that nobody else has', async () => {
    const taken = { ...NEWCOMER, email: 'Quality@hollowmere.example', stampNumber: '7' };
    const answer = await admin.post('/api/people').send(taken).expect(422);
    expect(answer.body).toMatchObject({
      code: 'taken',
      errors: [{ path: ['email'] }, { path: ['stampNumber'], message: 'This number is taken.' }],
    });
  });
});

describe('a one-time link', () => {
  async function reset(email: string): Promise<string> {
    const { id } = await personOf(email);
    const answer = await admin.post(`/api/people/${id}/reset`).expect(200);
    return tokenOf((answer.body as { link: string }).link);
  }
  const use = (token: string) =>
    site.nobody().post('/api/one-time-link/password').send({ token, newPassword: NEW_PASSWORD });

  it('ends all sessions of the person and the old password', async () => {
    const agent = await site.signIn('quality');
    const token = await reset('quality@hollowmere.example');
    await agent.get('/api/session').expect(401);
    await signIn('quality@hollowmere.example', PASSWORD).expect(401);
    await use(token).expect(200);
    await signIn('quality@hollowmere.example', NEW_PASSWORD).expect(200);
  });

  it('is replaced by a newer one', async () => {
    const older = await reset('quality@hollowmere.example');
    const newer = await reset('quality@hollowmere.example');
    await use(older).expect(410);
    await use(newer).expect(200);
  });

  it('works for three days', async () => {
    const token = await reset('quality@hollowmere.example');
    site.clock.advance({ hours: 72 });
    await use(token).expect(410);
  });

  it('works once when it is used twice at the same time', async () => {
    const token = await reset('quality@hollowmere.example');
    const answers = await Promise.all([use(token), use(token)]);
    expect(answers.map(({ status }) => status).sort()).toEqual([200, 410]);
  });

  it('is not made for the own account', async () => {
    const { id } = site.people.admin;
    const answer = await admin.post(`/api/people/${id}/reset`).expect(409);
    expect(answer.body).toMatchObject({ code: 'own-account' });
  });
});

describe('a change of a person', () => {
  it('acts at once when it takes a role away', async () => {
    const agent = await site.signIn('quality');
    await agent.get('/api/instruments').expect(200);
    await change(await personOf('quality@hollowmere.example'), { roles: ['receiving'] }).expect(200);
    await agent.get('/api/instruments').expect(403);
  });

  it('acts at once when it deactivates', async () => {
    const agent = await site.signIn('quality');
    const person = await personOf('quality@hollowmere.example');
    await change(person, { active: false }).expect(200);
    await agent.get('/api/session').expect(401);
    await agent.post('/api/session/refresh').expect(401);
    await signIn(person.email, PASSWORD).expect(401);
    const ended = site.db.select({ reason: sessions.endReason }).from(sessions).all();
    expect(ended).toContainEqual({ reason: 'deactivated' });
  });

  it('never leaves the site without an administrator who can sign in', async () => {
    const self = await personOf('admin@hollowmere.example');
    const last = await change(self, { roles: ['auditor'] }).expect(409);
    expect(last.body).toMatchObject({ code: 'last-admin' });
    site.db.insert(people).values({ name: 'Not Yet', email: 'notyet@hollowmere.example' }).run();
    const { id } = await personOf('notyet@hollowmere.example');
    site.db.insert(personRoles).values({ personId: id, role: 'admin' }).run();
    await change(self, { roles: ['auditor'] }).expect(409);
    await addTestPerson(site.db, { name: 'Second Key', email: 'second@hollowmere.example', roles: ['admin'] });
    await change(self, { roles: ['auditor'] }).expect(200);
  });

  it('is refused for the own account when it deactivates', async () => {
    await addTestPerson(site.db, { name: 'Second Key', email: 'second@hollowmere.example', roles: ['admin'] });
    const answer = await change(await personOf('admin@hollowmere.example'), { active: false }).expect(409);
    expect(answer.body).toMatchObject({ code: 'own-account' });
  });

  it('is refused when somebody else was faster', async () => {
    const person = await personOf('quality@hollowmere.example');
    await change(person, { name: 'First Name' }).expect(200);
    const late = await change(person, { name: 'Second Name' }).expect(412);
    expect(late.body).toMatchObject({ code: 'changed-meanwhile' });
    const { id } = person;
    await admin
      .put(`/api/people/${id}`)
      .send({ ...NEWCOMER, active: true })
      .expect(428);
  });

  it('stands in the audit trail with before and after', async () => {
    await change(await personOf('quality@hollowmere.example'), { stampNumber: '77' }).expect(200);
    const entry = site.db.select().from(auditEntries).all().at(-1);
    expect(entry).toMatchObject({ action: 'changed', subject: 'person', actor: site.people.admin.name });
    expect(entry?.before).toContain('"stampNumber":"7"');
    expect(entry?.after).toContain('"stampNumber":"77"');
  });
});

describe('an empty site', () => {
  const first = { name: 'Addis Keyman', email: 'first@hollowmere.example', newPassword: NEW_PASSWORD };

  function empty(): void {
    for (const table of ['refresh_tokens', 'sessions', 'person_roles', 'people'])
      site.db.$client.exec(`delete from ${table}`);
  }

  it('is opened by the link that the program printed, once', async () => {
    empty();
    const token = tokenOf(firstAdminLink(site.context) ?? '');
    const read = await site.nobody().post('/api/one-time-link/read').send({ token }).expect(200);
    expect(read.body).toEqual({ purpose: 'first-admin', name: null, email: null });
    await site.nobody().post('/api/one-time-link/password').send({ token, newPassword: NEW_PASSWORD }).expect(410);
    await site
      .nobody()
      .post('/api/one-time-link/first-admin')
      .send({ token, ...first })
      .expect(200);
    await signIn(first.email, NEW_PASSWORD).expect(200);
    await site
      .nobody()
      .post('/api/one-time-link/first-admin')
      .send({ token, ...first })
      .expect(410);
    expect(firstAdminLink(site.context)).toBeUndefined();
  });

  it('takes the newest of two printed links', async () => {
    empty();
    const older = tokenOf(firstAdminLink(site.context) ?? '');
    firstAdminLink(site.context);
    await site
      .nobody()
      .post('/api/one-time-link/first-admin')
      .send({ token: older, ...first })
      .expect(410);
  });
});
