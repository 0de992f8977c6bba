import { type Plan, type RevisionBody } from '#shared/contract/plans';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { buildPart } from '../support/builders';
import { measured, revisionBody } from '../support/plan-bodies';
import { addTestPerson } from '../support/test-people';
import { type Agent, testSite, type TestSite } from '../support/test-site';

let site: TestSite;
let quality: Agent;
beforeEach(async () => {
  site = await testSite();
  quality = site.as('quality');
});
afterEach(() => site.close());

/** A meter of ±0.5 % with a display of 10 mV: U of 12 V is 0.0695 V. */
async function addMeter(ofReading = 0.005) {
  const accuracy = { resolution: 0.01, ofReading, ofRange: 0, counts: 0 };
  const range = { form: 'digital', name: '20 V', unit: 'V', current: 'dc', fullScale: 20, ...accuracy };
  const body = {
    ...{ assetNumber: 'MM-01', kind: 'multimeter', description: 'Bench multimeter', serialNumber: '', place: '' },
    ...{ status: 'in-service', calibrationDue: '2027-01-31', dailyReference: null, ranges: [range] },
  };
  await quality.post('/api/instruments').send(body).expect(201);
}

async function draft(limits: { lowerLimit: number; upperLimit: number }, given: Partial<RevisionBody>): Promise<Plan> {
  const characteristics = [measured('loaded', { ...limits, target: 12 })];
  const content = revisionBody({ characteristics, decisionRule: 'guarded', ...given });
  const { id } = buildPart(site.db);
  return (await quality.post('/api/plans').send({ partId: id, content }).expect(201)).body as Plan;
}

function submit(plan: Plan) {
  const [newest] = plan.revisions;
  return quality.post(`/api/plans/${plan.id}/revisions/1/submission`).set('if-match', `"${newest?.version}"`);
}

describe('a plan whose guard bands leave nothing with the instruments of the site', () => {
  const tight = { lowerLimit: 11.95, upperLimit: 12.05 };

  it('can be drafted, but is not sent for approval; the field and U are named', async () => {
    await addMeter();
    const { body } = (await submit(await draft(tight, {})).expect(422)) as { body: { errors: object[] } };
    expect(body.errors).toEqual([
      {
        path: ['characteristics', 0, 'upperLimit'],
        message: expect.stringMatching(
          /^Guard bands of 69\.52\smV leave nothing to accept within the limits\./,
        ) as string,
      },
    ]);
  });

  it('is sent when k, the limits or the rule leave something', async () => {
    await addMeter();
    await submit(await draft(tight, { coverageFactor: 1 })).expect(200);
  });

  it('is sent where no instrument states its accuracy', async () => {
    await submit(await draft(tight, {})).expect(200);
  });

  it('is sent under simple acceptance', async () => {
    await addMeter();
    await submit(await draft(tight, { decisionRule: 'simple' })).expect(200);
  });

  it('is not put into force with an instrument that became too coarse meanwhile', async () => {
    const submitted = (await submit(await draft(tight, {})).expect(200)).body as Plan;
    await addMeter();
    const second = { name: 'Qadir Second', email: 'second@hollowmere.example', roles: ['quality'] } as const;
    const colleague = site.as(await addTestPerson(site.db, second));
    const version = submitted.revisions[0]?.version;
    const approval = `/api/plans/${submitted.id}/revisions/1/approval`;
    const answer = await colleague.post(approval).set('if-match', `"${version}"`).expect(422);
    expect(answer.body).toMatchObject({ errors: [{ path: ['characteristics', 0, 'upperLimit'] }] });
  });
});
