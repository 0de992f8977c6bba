import { auditEntries } from '#db/schema/audit';
import { type Part } from '#shared/contract/parts';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { buildPart, buildPlan } from '../support/builders';
import { type Agent, testSite, type TestSite } from '../support/test-site';

const BODY = {
  number: 'HC-1205',
  name: 'Supply 12 V 0.5 A',
  form: 'open-frame',
  model: {
    topology: 'bridge',
    lineVolts: 230,
    lineHertz: 50,
    ratedVolts: 12,
    ratedAmperes: 0.5,
    secondaryPeakVolts: 17,
    sourceOhms: 1.5,
    diodeDropVolts: 1.4,
    filterFarads: 0.0022,
    filterTolerance: 0.2,
    filterEsrOhms: null,
  },
  active: true,
};

let site: TestSite;
let quality: Agent;
beforeEach(async () => {
  site = await testSite();
  quality = site.as('quality');
});
afterEach(() => site.close());

describe('parts', () => {
  it('are kept with what they are electrically', async () => {
    const added = (await quality.post('/api/parts').send(BODY).expect(201)).body as Part;
    expect(added).toMatchObject({ ...BODY, plan: null, version: 1 });
    const model = { ...BODY.model, filterFarads: 0.0047 };
    const changed = await quality
      .put(`/api/parts/${added.id}`)
      .set('if-match', '"1"')
      .send({ ...BODY, model })
      .expect(200);
    expect(changed.body).toMatchObject({ model, version: 2 });
    const entry = site.db.select().from(auditEntries).all().at(-1);
    expect(entry?.before).toContain('"filterFarads":0.0022');
    expect(entry?.after).toContain('"filterFarads":0.0047');
    await quality.put(`/api/parts/${added.id}`).set('if-match', '"1"').send(BODY).expect(412);
  });

  it('have a number of their own', async () => {
    buildPart(site.db);
    const answer = await quality
      .post('/api/parts')
      .send({ ...BODY, number: 'HC-2402' })
      .expect(422);
    expect(answer.body).toMatchObject({ errors: [{ path: ['number'], message: 'This number is taken.' }] });
  });

  it('say which plan is in force', async () => {
    const authorId = site.people.quality.id;
    const planned = buildPart(site.db);
    const drafted = buildPart(site.db, { number: 'HC-2403' });
    buildPart(site.db, { number: 'HC-2404' });
    const { planId } = buildPlan(site.db, { partId: planned.id, authorId });
    buildPlan(site.db, { partId: drafted.id, authorId, number: 'P-002', status: 'draft' });
    const { items } = (await quality.get('/api/parts').expect(200)).body as { items: Part[] };
    expect(items.map(({ number, plan }) => [number, plan])).toEqual([
      ['HC-2402', { id: planId, number: 'P-001', effectiveRevision: 1 }],
      ['HC-2403', expect.objectContaining({ number: 'P-002', effectiveRevision: null })],
      ['HC-2404', null],
    ]);
  });

  it('with a transformer name their filter capacitor', async () => {
    const model = { ...BODY.model, filterFarads: null };
    const answer = await quality
      .post('/api/parts')
      .send({ ...BODY, model })
      .expect(400);
    expect(answer.body).toMatchObject({ errors: [{ path: ['model', 'filterFarads'] }] });
    await quality
      .post('/api/parts')
      .send({ ...BODY, model: { ...model, topology: 'switch-mode' } })
      .expect(201);
  });
});
