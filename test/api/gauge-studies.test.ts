import { demoGaugeStudy, unfinished } from '#db/demo/gauge-study';
import { auditEntries } from '#db/schema/audit';
import { type GaugeStudy, type GaugeStudyBody, type GaugeStudyHead } from '#shared/contract/gauge-studies';
import { ROLES } from '#shared/contract/roles';
import { eq } from 'drizzle-orm';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import reference from '../reference/data/d-grr.json' with { type: 'json' };
import { buildInstrument } from '../support/builders';
import { type Agent, testSite, type TestSite } from '../support/test-site';

const PERSONS = ['I. Sandvær', 'P. Lindqvar', 'M. Aldoush'];

let site: TestSite;
let quality: Agent;
let whole: GaugeStudyBody;
beforeEach(async () => {
  site = await testSite();
  quality = site.as('quality');
  const { id } = buildInstrument(site.db, { assetNumber: 'DM-11' });
  whole = demoGaugeStudy('meter', { instrumentId: id, persons: PERSONS, seed: 4 });
});
afterEach(() => site.close());

async function begun(body: GaugeStudyBody = whole): Promise<GaugeStudy> {
  return (await quality.post('/api/gauge-studies').send(body).expect(201)).body as GaugeStudy;
}

function put({ id, version }: { id: number; version: number }, body: object) {
  return quality.put(`/api/gauge-studies/${id}`).set('if-match', `"${version}"`).send(body);
}

function close({ id, version }: { id: number; version: number }) {
  return quality.post(`/api/gauge-studies/${id}/closure`).set('if-match', `"${version}"`);
}

describe('a gauge study', () => {
  it('is numbered in the year it is begun, and lists newest first', async () => {
    expect(await begun()).toMatchObject({ number: 'GS-26-001', status: 'open', author: site.people.quality.name });
    await begun({ ...whole, title: 'Another' });
    const { items } = (await quality.get('/api/gauge-studies').expect(200)).body as { items: GaugeStudyHead[] };
    expect(items.map(({ number, entered, needed }) => ({ number, entered, needed }))).toEqual([
      { number: 'GS-26-002', entered: 90, needed: 90 },
      { number: 'GS-26-001', entered: 90, needed: 90 },
    ]);
    expect(items[0]).toMatchObject({ instrument: { assetNumber: 'DM-11' }, closedAt: null });
    expect(items[0]?.gaugeOfVariation).toBeLessThan(0.1);
  });

  it('says nothing until every reading is entered, and then gives the published results of its data', async () => {
    const [aiag] = reference.cases;
    const body = { ...whole, lowerLimit: null, values: aiag?.data ?? [] };
    const first = await begun(unfinished(body, 3));
    expect(first).toMatchObject({ results: null, gaugeOfVariation: null, entered: 69, needed: 90 });
    const study = (await put(first, body).expect(200)).body as GaugeStudy;
    expect(study.version).toBe(first.version + 1);
    expect(study.results?.pooled).toBe(true);
    expect(study.gaugeOfVariation).toBeCloseTo(0.2786065088, 9);
    const { analysis } = study.results?.averageRange ?? {};
    expect(analysis?.shares.find(({ spread }) => spread === 'gauge')?.sigma).toBeCloseTo(0.3057663457, 9);
    expect(analysis?.shares.every(({ ofTolerance }) => ofTolerance === null)).toBe(true);
  });

  it('says what share of the tolerance the gauge takes where there are two limits', async () => {
    const { results } = await begun();
    const gauge = results?.variancePooled.analysis.shares.find(({ spread }) => spread === 'gauge');
    expect(gauge?.ofTolerance).toBeCloseTo((6 * (gauge?.sigma ?? 0)) / 1.5, 12);
  });

  it('is not overwritten unseen', async () => {
    const study = await begun();
    await put(study, { ...whole, note: 'First' }).expect(200);
    const answer = await put(study, { ...whole, note: 'Second' }).expect(412);
    expect(answer.body).toMatchObject({ code: 'changed-meanwhile' });
  });

  it('closes when it is whole, and changes no more', async () => {
    const first = await begun(unfinished(whole, 9));
    const refused = await close(first).expect(409);
    expect(refused.body).toMatchObject({ code: 'readings-missing', title: '3 readings are missing.' });
    const study = (await put(first, whole).expect(200)).body as GaugeStudy;
    const closed = (await close(study).expect(200)).body as GaugeStudy;
    expect(closed).toMatchObject({ status: 'closed', closedAt: site.clock.now().toISOString() });
    expect((await put(closed, whole).expect(409)).body).toMatchObject({ code: 'study-closed' });
    expect((await close(closed).expect(409)).body).toMatchObject({ code: 'study-closed' });
  });

  it('leaves its changes in the trail under its number', async () => {
    const study = await begun(unfinished(whole, 9));
    const changed = (await put(study, whole).expect(200)).body as GaugeStudy;
    await close(changed).expect(200);
    const actions = site.db.select().from(auditEntries).where(eq(auditEntries.subject, 'gauge-study')).all();
    expect(actions.map(({ action }) => action)).toEqual(['added', 'changed', 'closed']);
    const trail = await quality.get('/api/audit').query({ subject: 'gauge-study', subjectId: 'GS-26-001' });
    expect((trail.body as { items: object[] }).items).toHaveLength(3);
  });
});

describe('what a gauge study is refused for', () => {
  const refused = async (change: Partial<Record<keyof GaugeStudyBody, unknown>>, path: (string | number)[]) => {
    const answer = await quality.post('/api/gauge-studies').send({ ...whole, ...change });
    expect([400, 422]).toContain(answer.status);
    expect((answer.body as { errors: unknown[] }).errors).toContainEqual(expect.objectContaining({ path }));
  };

  it('an instrument that does not exist', async () => {
    await refused({ instrumentId: 999 }, ['instrumentId']);
  });

  it('limits the wrong way round', async () => {
    await refused({ lowerLimit: 2, upperLimit: 1 }, ['upperLimit']);
  });

  it('two persons of one name, or one alone', async () => {
    await refused({ persons: ['A', 'A', 'B'] }, ['persons']);
    await refused({ persons: ['A'] }, ['persons']);
  });

  it('readings that have not the shape of the study', async () => {
    await refused({ trials: 2 }, ['values']);
    await refused({ values: whole.values.slice(1) }, ['values']);
  });

  it('a reading beyond any instrument', async () => {
    const values = whole.values.map((rows) => rows.map((cell) => [...cell]));
    const [[cell = []] = []] = values;
    cell[1] = 1e13;
    await refused({ values }, ['values', 0, 0, 1]);
  });
});

describe('readings at the edge of what numbers hold', () => {
  it('are answered without dividing by nothing', async () => {
    const tiny = whole.values.map((rows, part) => rows.map((cell) => cell.map(() => part * 5e-324)));
    const vast = whole.values.map((rows, part) => rows.map((cell, person) => cell.map(() => (part + person) * 9e10)));
    for (const values of [tiny, vast]) {
      const study = await begun({ ...whole, values, lowerLimit: 0, upperLimit: 5e-324 });
      expect(study.results).not.toBeNull();
      await quality.get(`/api/gauge-studies/${study.id}/file`).expect(200);
    }
  });
});

describe('a gauge study as a file', () => {
  it('is a tagged PDF once its readings are entered', async () => {
    const { id, number } = await begun();
    const answer = await site.as('auditor').get(`/api/gauge-studies/${id}/file`).buffer().expect(200);
    expect(answer.type).toBe('application/pdf');
    expect(answer.get('content-disposition')).toContain(`${number}.pdf`);
    const pdf = (answer.body as Buffer).toString('latin1');
    for (const words of ['/StructTreeRoot', `Gauge study ${number}`, '/S /Figure', '/Alt'])
      expect(pdf).toContain(words);
  });

  it('is not made while a reading is missing', async () => {
    const { id } = await begun(unfinished(whole, 9));
    expect((await quality.get(`/api/gauge-studies/${id}/file`).expect(409)).body).toMatchObject({
      code: 'readings-missing',
    });
  });
});

describe('who works with gauge studies', () => {
  it.each(ROLES.filter((role) => role !== 'quality'))('%s changes none', async (role) => {
    await site.as(role).post('/api/gauge-studies').send(whole).expect(403);
    const reads = role === 'receiving' ? 403 : 200;
    await site.as(role).get('/api/gauge-studies').expect(reads);
  });
});
