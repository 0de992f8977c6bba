import { auditEntries } from '#db/schema/audit';
import { people } from '#db/schema/people';
import { site as siteTable } from '#db/schema/site';
import { DEMO_SIGN_INS } from '#db/demo/sign-ins';
import { type Front, type Site } from '#shared/contract/site';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { testSite, type TestSite } from '../support/test-site';

let site: TestSite;
beforeEach(async () => {
  site = await testSite();
});
afterEach(() => site.close());

describe('the front', () => {
  it('names the site, and in the demo the sign-ins that work', async () => {
    const answer = await site.nobody().get('/api/front').expect(200);
    const front = answer.body as Front;
    expect(front).toMatchObject({ name: 'Hollowmere Controls', mode: 'demo', version: '0.1.0' });
    const known = new Set(DEMO_SIGN_INS.map(({ email }) => email));
    expect(front.signIns.length).toBeGreaterThan(0);
    for (const { email, password } of front.signIns) {
      expect(known).toContain(email);
      expect(password).not.toBe('');
    }
    site.db.update(people).set({ active: false }).run();
    expect(((await site.nobody().get('/api/front')).body as Front).signIns).toEqual([]);
  });

  it('shows no sign-in of a production site', async () => {
    site.close();
    site = await testSite({ mode: 'production' });
    expect((await site.nobody().get('/api/front')).body).toMatchObject({ mode: 'production', signIns: [] });
  });
});

describe('the settings', () => {
  it('are changed by the administrator, on record with before and after', async () => {
    const admin = site.as('admin');
    const { version, ...before } = (await admin.get('/api/site').expect(200)).body as Site;
    const body = { ...before, approveOwnPlans: true, engineeringList: ['Lab@hollowmere.example'] };
    const answer = await admin.put('/api/site').set('if-match', `"${version}"`).send(body).expect(200);
    expect(answer.body).toMatchObject({
      approveOwnPlans: true,
      engineeringList: ['lab@hollowmere.example'],
      version: 2,
    });
    expect(answer.headers['etag']).toBe('"2"');
    const entry = site.db.select().from(auditEntries).all().at(-1);
    expect(entry?.before).toContain('"approveOwnPlans":false');
    expect(entry?.after).toContain('"approveOwnPlans":true');
    await admin.put('/api/site').set('if-match', `"${version}"`).send(body).expect(412);
  });

  it('are those of a fresh site until some were kept', async () => {
    site.db.delete(siteTable).run();
    const admin = site.as('admin');
    const { version, ...fresh } = (await admin.get('/api/site').expect(200)).body as Site;
    expect(fresh).toMatchObject({ approveOwnPlans: false, releaseOwnReadings: false });
    await admin.put('/api/site').set('if-match', `"${version}"`).send(fresh).expect(200);
  });

  it('name each address that is none', async () => {
    const body = { name: '', department: 'x', address: '', engineeringList: ['a@b.example', 'nothing'] };
    const answer = await site.as('admin').put('/api/site').set('if-match', '"1"').send(body).expect(400);
    const { errors } = answer.body as { errors: { path: unknown[] }[] };
    expect(errors.map(({ path }) => path)).toEqual(
      expect.arrayContaining([['name'], ['engineeringList', 1], ['waitingTargetHours'], ['approveOwnPlans']]),
    );
  });
});
