import { lotSummaries } from '#db/schema/summaries';
import { type Supplier } from '#shared/contract/suppliers';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { buildLot, buildPart, buildSupplier } from '../support/builders';
import { type Agent, testSite, type TestSite } from '../support/test-site';

const BODY = {
  code: 'OVS',
  name: 'Omdal Vik Supply',
  address: '1 Quay Road\nOmdal Vik',
  contactName: 'Vera Quay',
  contactEmail: 'Vera@omdalvik.example',
  active: true,
};

let site: TestSite;
let quality: Agent;
beforeEach(async () => {
  site = await testSite();
  quality = site.as('quality');
});
afterEach(() => site.close());

describe('suppliers', () => {
  it('are added, read and changed', async () => {
    const added = (await quality.post('/api/suppliers').send(BODY).expect(201)).body as Supplier;
    expect(added).toMatchObject({ ...BODY, contactEmail: 'vera@omdalvik.example', lots: 0, version: 1 });
    const changed = await quality
      .put(`/api/suppliers/${added.id}`)
      .set('if-match', '"1"')
      .send({ ...BODY, active: false })
      .expect(200);
    expect(changed.body).toMatchObject({ active: false, version: 2 });
    const read = await site.as('admin').get(`/api/suppliers/${added.id}`).expect(200);
    expect(read.body).toEqual(changed.body);
    expect(read.headers['etag']).toBe('"2"');
  });

  it('have a code and a name of their own', async () => {
    buildSupplier(site.db);
    const answer = await quality
      .post('/api/suppliers')
      .send({ ...BODY, code: 'KST', name: 'Kestrin Power' })
      .expect(422);
    expect(answer.body).toMatchObject({
      code: 'taken',
      errors: [
        { path: ['code'], message: 'This code is taken.' },
        { path: ['name'], message: 'This name is taken.' },
      ],
    });
  });

  it('keep their own code when they change', async () => {
    const { id } = buildSupplier(site.db, BODY);
    await quality.put(`/api/suppliers/${id}`).set('if-match', '"1"').send(BODY).expect(200);
  });

  it('that somebody else changed first are not overwritten', async () => {
    const { id } = buildSupplier(site.db, BODY);
    const put = () => quality.put(`/api/suppliers/${id}`).set('if-match', '"1"').send(BODY);
    const answers = await Promise.all([put(), put()]);
    expect(answers.map(({ status }) => status).sort()).toEqual([200, 412]);
  });

  it('count their lots, without the cancelled ones', async () => {
    const supplier = buildSupplier(site.db);
    buildSupplier(site.db, BODY);
    const part = buildPart(site.db);
    const of = { partId: part.id, supplierId: supplier.id, bookedById: site.people.receiving.id };
    buildLot(site.db, { ...of, number: 'L-26-0001', status: 'cancelled' });
    for (const [index, verdict] of (['accepted', 'accepted', 'rejected'] as const).entries()) {
      const lot = buildLot(site.db, { ...of, number: `L-26-000${index + 2}` });
      site.db
        .insert(lotSummaries)
        .values({
          ...{ lotId: lot.id, supplierId: supplier.id, partId: part.id, verdict, month: '2026-03' },
          ...{ decidedAt: '2026-03-01T00:00:00.000Z', lotSize: 400, unitsJudged: 50, unitsConforming: 50 },
          ...{ criticalUnits: 0, majorUnits: 0, minorUnits: 0, unitsReleased: 400 },
        })
        .run();
    }
    const { items } = (await quality.get('/api/suppliers').expect(200)).body as { items: Supplier[] };
    expect(items.map(({ name, lots, lotsDecided, lotsAccepted }) => [name, lots, lotsDecided, lotsAccepted])).toEqual([
      ['Kestrin Power', 3, 3, 2],
      ['Omdal Vik Supply', 0, 0, 0],
    ]);
  });

  it('that do not exist are not found', async () => {
    const answer = await quality.get('/api/suppliers/77').expect(404);
    expect(answer.body).toMatchObject({ code: 'not-found', title: 'This supplier does not exist.' });
  });
});
