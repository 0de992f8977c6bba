import { certificates } from '#db/schema/certificates';
import { type Assessment } from '#shared/contract/decision';
import { type ProblemDetails } from '#shared/contract/problem';
import { randomUUID } from 'node:crypto';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { keep, lotNow, planOf, submit, typedReading } from '../support/bench-acts';
import { addPlannedPart, drawnLot, measured } from '../support/bench-fixtures';
import { PASSWORD } from '../support/test-people';
import { testSite, type TestSite } from '../support/test-site';

let site: TestSite;
beforeEach(async () => {
  site = await testSite();
});
afterEach(() => site.close());

async function lotOf(units: number) {
  const plan = planOf(measured('v_loaded', 'major', { lower: 11.4 }));
  return drawnLot(site, addPlannedPart(site.db, site.people.quality.id, plan), units);
}

async function takenBack(lot: { id: number }, text: string): Promise<void> {
  const id = randomUUID();
  await keep(site, lot, typedReading(1, 'v_loaded', text), { id }).expect(200);
  await site.as('inspector').post(`/api/lots/${lot.id}/readings/${id}/withdrawal`).expect(200);
}

describe('a reading taken back and taken again', () => {
  it('is a repeat in the assessment and on the certificate: nobody measures a unit into compliance unseen', async () => {
    const lot = await lotOf(1);
    await takenBack(lot, '9.8');
    await keep(site, lot, typedReading(1, 'v_loaded', '12.1')).expect(200);
    const { body } = await site.as('quality').get(`/api/lots/${lot.id}/assessment`).expect(200);
    expect((body as Assessment).repeats).toBe(1);
    await submit(site, lot).expect(200);
    const { version } = await lotNow(site, lot);
    await site
      .as('quality')
      .post(`/api/lots/${lot.id}/decision`)
      .set('if-match', `"${version}"`)
      .send({ verdict: 'accepted', password: PASSWORD, note: '' })
      .expect(200);
    expect(site.db.select().from(certificates).get()?.data.repeats).toBe(1);
  });

  it('three times is not measured once more by a rack', async () => {
    const lot = await lotOf(3);
    for (let time = 0; time < 3; time += 1) await takenBack(lot, '9.8');
    const file = { fileName: 'rack.csv', text: 'unit,v_loaded\n1,12.1\n2,12.1', instrumentIds: [] };
    const { body } = await site.as('inspector').post(`/api/lots/${lot.id}/rack-file`).send(file).expect(422);
    expect((body as ProblemDetails).errors).toEqual([
      {
        path: ['text', 2, 'v_loaded'],
        message: 'Line 2: Unit 1 has had this reading three times; set the unit aside.',
      },
    ]);
  });
});

describe('a reading sent again under its id', () => {
  it('is refused when it says something else than the reading that was kept', async () => {
    const lot = await lotOf(3);
    const id = randomUUID();
    await keep(site, lot, typedReading(1, 'v_loaded', '12.1'), { id }).expect(200);
    const { body } = await keep(site, lot, typedReading(1, 'v_loaded', '9.8'), { id }).expect(409);
    expect((body as ProblemDetails).code).toBe('reading-id-used');
  });

  it('is acknowledged again after the lot was submitted, and changes nothing', async () => {
    const lot = await lotOf(1);
    const id = randomUUID();
    const reading = typedReading(1, 'v_loaded', '12.1');
    const first = await keep(site, lot, reading, { id }).expect(200);
    await submit(site, lot).expect(200);
    const before = await lotNow(site, lot);
    const again = await keep(site, lot, reading, { id }).expect(200);
    expect(again.body).toEqual(first.body);
    expect(await lotNow(site, lot)).toEqual(before);
  });

  it('is no reading of another lot, drawn or not', async () => {
    const lot = await lotOf(3);
    const id = randomUUID();
    const reading = typedReading(1, 'v_loaded', '12.1');
    await keep(site, lot, reading, { id }).expect(200);
    const { part, supplier } = lot;
    const other = await drawnLot(site, { partId: part.id, supplierId: supplier.id }, 3);
    const { body } = await keep(site, other, reading, { id }).expect(409);
    expect((body as ProblemDetails).code).toBe('reading-id-used');
    await site.as('inspector').post(`/api/lots/${other.id}/readings/${id}/withdrawal`).expect(404);
  });
});

describe('the time of a reading', () => {
  it('lies between the draw of its unit and its receipt, whatever the clock of the bench says', async () => {
    const lot = await lotOf(3);
    site.clock.advance({ minutes: 10 });
    const takenAt = async (unit: number, stated: string) =>
      (await keep(site, lot, typedReading(unit, 'v_loaded', '12.1', { takenAt: stated })).expect(200)).body as {
        reading: { takenAt: string };
      };
    expect((await takenAt(1, '9999-12-31T23:59:59Z')).reading.takenAt).toBe('2026-03-12T08:10:00.000Z');
    expect((await takenAt(2, '2020-01-01T00:00:00Z')).reading.takenAt).toBe('2026-03-12T08:00:00.000Z');
    expect((await takenAt(3, '2026-03-12T08:05:00Z')).reading.takenAt).toBe('2026-03-12T08:05:00.000Z');
  });
});

describe('a sample with a reading missing that the verdict still hangs on', () => {
  it('is not submitted', async () => {
    const own = { ownLevel: 'S-1', ownAql: '10' } as const;
    const plan = planOf(
      measured('v_no_load', 'critical', { lower: 1 }, own),
      measured('v_loaded', 'minor', {}),
      measured('ripple', 'major', { upper: 1 }),
      {
        ...measured('regulation', 'minor', { upper: 5 }),
        kind: 'computed',
        unit: '%',
        formula: { key: 'load-regulation', inputs: { no_load: 'v_no_load', loaded: 'v_loaded' }, constants: {} },
      } as Parameters<typeof planOf>[0],
    );
    const lot = await drawnLot(site, addPlannedPart(site.db, site.people.quality.id, plan), 100);
    const sampleSize = lot.sampling?.sampleSize ?? 0;
    // Unit 8 lies beyond the critical group, whose characteristic the regulation needs on every unit.
    for (let unit = 1; unit <= sampleSize; unit += 1) {
      if (unit !== 8) await keep(site, lot, typedReading(unit, 'v_no_load', '12')).expect(200);
      await keep(site, lot, typedReading(unit, 'v_loaded', '12')).expect(200);
      await keep(site, lot, typedReading(unit, 'ripple', unit === 8 ? '2' : '0.5')).expect(200);
    }
    const { body } = await submit(site, lot).expect(409);
    expect(body).toMatchObject({ code: 'readings-missing', title: '1 reading is still missing.' });
    await keep(site, lot, typedReading(8, 'v_no_load', '12')).expect(200);
    await submit(site, lot).expect(200);
  });
});
