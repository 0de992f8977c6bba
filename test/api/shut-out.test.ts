import { people } from '#db/schema/people';
import { createApp } from '#server/app';
import { verifyChain } from '#server/audit/verify-chain';
import { Stream } from '#server/events/stream';
import { firstAdminLink } from '#server/sessions/open-site';
import { eq } from 'drizzle-orm';
import { type AddressInfo, type Server } from 'node:net';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { buildLot, buildPart, buildSupplier } from '../support/builders';
import { sentBack } from '../support/cookies';
import { PASSWORD } from '../support/test-people';
import { testSite, type TestSite } from '../support/test-site';

const NEW_PASSWORD = 'another plain long password';

let site: TestSite;
beforeEach(async () => {
  site = await testSite();
});
afterEach(() => site.close());

describe('a name with half a character in it', () => {
  it('does not break the chain of the audit trail', async () => {
    site.db.$client.exec('delete from person_roles; delete from sessions; delete from people');
    const link = firstAdminLink(site.context) ?? '';
    const token = link.slice(link.indexOf('#') + 1);
    const body = { token, name: 'Addis \ud800', email: 'admin@hollowmere.example', newPassword: NEW_PASSWORD };
    await site.nobody().post('/api/one-time-link/first-admin').send(body).expect(200);
    expect(await verifyChain(site.db)).toMatchObject({ entries: 1, intact: true });
  });
});

describe('signing out', () => {
  it('ends the session also where only the access cookie is left', async () => {
    const inspector = site.as('inspector');
    await inspector.get('/api/session').expect(200);
    await inspector.delete('/api/session').expect(200);
    await inspector.get('/api/session').expect(401);
  });
});

describe('a person who is reset by an administrator', () => {
  it('does not bring the password back with a change that was under way', async () => {
    const { passwords } = site.context;
    const { id } = site.people.inspector;
    site.context.passwords = {
      ...passwords,
      hash: async (password) => {
        await site.as('admin').post(`/api/people/${id}/reset`).expect(200);
        return passwords.hash(password);
      },
    };
    await site
      .as('inspector')
      .put('/api/session/password')
      .send({ password: PASSWORD, newPassword: NEW_PASSWORD })
      .expect(401);
    expect(site.db.select().from(people).where(eq(people.id, id)).get()?.passwordHash).toBeNull();
  });
});

describe('a person who was deactivated while listening', () => {
  let server: Server;
  let stream: Stream;
  beforeEach(async () => {
    stream = new Stream({ db: site.db, clock: site.clock, heartbeat: 600_000 });
    const app = createApp({ ...site.context, stream });
    server = await new Promise<Server>((resolve) => {
      const listening = app.listen(0, '127.0.0.1', () => resolve(listening));
    });
  });
  afterEach(async () => {
    stream.close();
    await new Promise((resolve) => server.close(resolve));
  });

  it('is not told the next change', async () => {
    const { email, id } = site.people.quality;
    const cookie = sentBack(await site.nobody().post('/api/session').send({ email, password: PASSWORD }), 'qr_access');
    const address = `http://127.0.0.1:${(server.address() as AddressInfo).port}/api/events`;
    const response = await fetch(address, { headers: { cookie } });
    const reader = response.body?.pipeThrough(new TextDecoderStream()).getReader();
    expect((await reader?.read())?.value).toContain('"arrivals":0');
    site.db.update(people).set({ active: false }).where(eq(people.id, id)).run();
    const references = { partId: buildPart(site.db).id, supplierId: buildSupplier(site.db).id };
    buildLot(site.db, { number: 'L-1', ...references, bookedById: site.people.receiving.id });
    stream.announce();
    expect(await reader?.read()).toMatchObject({ done: true });
  });
});
