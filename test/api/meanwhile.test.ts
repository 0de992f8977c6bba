import { instruments } from '#db/schema/instruments';
import { type ProblemDetails } from '#shared/contract/problem';
import { type Bench } from '#shared/contract/bench';
import { type Plan } from '#shared/contract/plans';
import { eq } from 'drizzle-orm';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { keep, lotNow, planOf, submit, typedReading } from '../support/bench-acts';
import { addInstrument, addPlannedPart, booking, drawnLot, measured } from '../support/bench-fixtures';
import { addTestPerson } from '../support/test-people';
import { testSite, type TestSite } from '../support/test-site';

let site: TestSite;
beforeEach(async () => {
  site = await testSite();
});
afterEach(() => site.close());

const PLAN = planOf(measured('v_loaded', 'major', { lower: 11.4 }, { instrumentKind: 'multimeter' }));
const planned = () => addPlannedPart(site.db, site.people.quality.id, PLAN);

describe('an instrument', () => {
  it('withdrawn between the preview of a rack file and its import is refused, and nothing is imported', async () => {
    const lot = await drawnLot(site, planned(), 3);
    const id = addInstrument(site.db, 'multimeter', 'MM-01');
    const file = { fileName: 'rack.csv', text: 'unit,v_loaded\n1,12', instrumentIds: [id] };
    const inspector = site.as('inspector');
    await inspector.post(`/api/lots/${lot.id}/rack-file/preview`).send(file).expect(200);
    site.db.update(instruments).set({ status: 'withdrawn' }).where(eq(instruments.id, id)).run();
    const { body } = await inspector.post(`/api/lots/${lot.id}/rack-file`).send(file).expect(422);
    expect((body as ProblemDetails).code).toBe('instrument-refused');
    expect((await lotNow(site, lot)).status).toBe('drawn');
  });

  it('is good to the end of its last day and not a second longer', async () => {
    const lot = await drawnLot(site, planned(), 3);
    const id = addInstrument(site.db, 'multimeter', 'MM-01', { calibrationDue: '2026-03-12' });
    site.clock.advance({ hours: 15, minutes: 59, seconds: 59 });
    await keep(site, lot, typedReading(1, 'v_loaded', '12', { instrumentId: id })).expect(200);
    site.clock.advance({ seconds: 1 });
    const late = site.as('quality');
    const body = typedReading(2, 'v_loaded', '12', { instrumentId: id });
    await late.put(`/api/lots/${lot.id}/readings/0197a000-0000-7000-8000-000000000002`).send(body).expect(422);
  });
});

describe('a plan that is revised while a lot is open', () => {
  it('leaves the lot under the revision it was drawn to; the next lot comes under the new one', async () => {
    const references = planned();
    const id = addInstrument(site.db, 'multimeter', 'MM-01');
    const lot = await drawnLot(site, references, 3);
    const { body: before } = await site.as('receiving').post('/api/lots').send(booking(references, 3)).expect(201);
    const second = { name: 'Quinn Secondry', email: 'second@hollowmere.example', roles: ['quality'] } as const;
    const other = await addTestPerson(site.db, second);
    const plan = `/api/plans/${references.planId}/revisions`;
    const step = async (path: string, version: number, who: Parameters<TestSite['as']>[0], content?: object) => {
      const agent = site.as(who);
      const request = content ? agent.put(path) : agent.post(path);
      return (await request.set('if-match', `"${version}"`).send(content).expect(200)).body as Plan;
    };
    await site.as('quality').post(plan).expect(201);
    const stricter = planOf(measured('v_loaded', 'critical', { lower: 13 }), measured('v_new', 'major', { lower: 1 }));
    await step(`${plan}/2`, 1, 'quality', stricter);
    await step(`${plan}/2/submission`, 2, 'quality');
    await site.as('quality').post(`${plan}/2/approval`).set('if-match', '"3"').expect(409);
    await step(`${plan}/2/approval`, 3, other);

    for (let unit = 1; unit <= 3; unit += 1)
      await keep(site, lot, typedReading(unit, 'v_loaded', '12', { instrumentId: id })).expect(200);
    await keep(site, lot, typedReading(1, 'v_new', '12', { instrumentId: id })).expect(422);
    await submit(site, lot).expect(200);
    const { body: bench } = await site.as('quality').get(`/api/lots/${lot.id}/bench`).expect(200);
    expect((bench as Bench).sampling).toMatchObject({ revision: 1 });
    expect((bench as Bench).characteristics.map(({ key }) => key)).toEqual(['v_loaded']);
    expect((await lotNow(site, before as { id: number })).sampling).toMatchObject({ provisional: true, revision: 2 });
  });
});

describe('a unit', () => {
  it('beyond the sample takes no reading and cannot be set aside', async () => {
    const lot = await drawnLot(site, planned(), 3);
    const id = addInstrument(site.db, 'multimeter', 'MM-01');
    await keep(site, lot, typedReading(4, 'v_loaded', '12', { instrumentId: id })).expect(422);
    const aside = site.as('inspector').put(`/api/lots/${lot.id}/units/4/set-aside`).send({ reason: 'Humming' });
    await aside.expect(404);
    const file = { fileName: 'rack.csv', text: 'unit,v_loaded\n4,12', instrumentIds: [id] };
    await site.as('inspector').post(`/api/lots/${lot.id}/rack-file`).send(file).expect(422);
  });
});
