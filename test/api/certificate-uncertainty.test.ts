import { certificates } from '#db/schema/certificates';
import { type Assessment } from '#shared/contract/decision';
import { type Lot } from '#shared/contract/lots';
import { afterEach, beforeEach, expect, it } from 'vitest';
import { keep, lotNow, planOf, submit, typedReading } from '../support/bench-acts';
import { addPlannedPart, drawnLot, measured } from '../support/bench-fixtures';
import { computed } from '../support/plan-bodies';
import { PASSWORD } from '../support/test-people';
import { testSite, type TestSite } from '../support/test-site';

let site: TestSite;
let lot: Lot;
let meter: number;

beforeEach(async () => {
  site = await testSite();
  const accuracy = { resolution: 0.01, ofReading: 0.005, ofRange: 0, counts: 0 };
  const range = { form: 'digital', name: '20 V', unit: 'V', current: 'dc', fullScale: 20, ...accuracy };
  const body = {
    ...{ assetNumber: 'MM-07', kind: 'multimeter', description: 'Bench multimeter', serialNumber: '', place: '' },
    ...{ status: 'in-service', calibrationDue: '2027-01-31', dailyReference: null, ranges: [range] },
  };
  meter = ((await site.as('quality').post('/api/instruments').send(body).expect(201)).body as { id: number }).id;
  const volts = { instrumentKind: 'multimeter' } as const;
  const inputs = { no_load: 'no_load', loaded: 'loaded' };
  const plan = {
    ...planOf(
      measured('no_load', 'major', { upper: 18 }, volts),
      measured('loaded', 'major', { lower: 11.4, upper: 12.6 }, volts),
      computed('regulation', { key: 'load-regulation', inputs }, { upperLimit: 0.5 }),
    ),
    ...({ decisionRule: 'guarded', coverageFactor: 2, warmUpMinutes: 10 } as const),
  };
  lot = await drawnLot(site, addPlannedPart(site.db, site.people.quality.id, plan), 3);
});
afterEach(() => site.close());

/** U = 2 √((0.005 x)²/3 + 0.01²/12), by JCGM 100, 4.3.7 and 6.2.1. */
const byHand = (volts: number) => 2 * Math.sqrt((0.005 * volts) ** 2 / 3 + 0.01 ** 2 / 12);

it('a certificate and the evidence of its lot state rule, k, the largest U of each characteristic, and the conditions', async () => {
  const conditions = { ambientCelsius: 23, mainsVolts: 230, mainsHertz: 50, load: 'electronic load', bandwidth: '' };
  const noted = { ...conditions, warmUpStartedAt: '2026-03-12T07:40:00.000Z', note: '' };
  await site.as('inspector').put(`/api/lots/${lot.id}/conditions`).send(noted).expect(200);
  for (const [unit, loaded] of [12, 12.2, 12.4].entries()) {
    const given = { instrumentId: meter };
    await keep(site, lot, typedReading(unit + 1, 'no_load', '16.5', given)).expect(200);
    await keep(site, lot, typedReading(unit + 1, 'loaded', loaded.toFixed(2), given)).expect(200);
  }
  await submit(site, await lotNow(site, lot)).expect(200);
  const shown = (await site.as('quality').get(`/api/lots/${lot.id}/assessment`).expect(200)).body as Assessment;
  expect(shown).toMatchObject({ decisionRule: 'guarded', coverageFactor: 2 });
  expect(shown.characteristics.map(({ expandedUncertainty }) => expandedUncertainty)).toEqual([
    expect.closeTo(byHand(16.5), 12),
    expect.closeTo(byHand(12.4), 12),
    expect.any(Number),
  ]);
  const decision = { verdict: 'accepted', password: PASSWORD, note: '' };
  const { version } = await lotNow(site, lot);
  await site
    .as('quality')
    .post(`/api/lots/${lot.id}/decision`)
    .set('if-match', `"${version}"`)
    .send(decision)
    .expect(200);
  const data = site.db.select().from(certificates).get()?.data;
  expect(data).toMatchObject({
    decisionRule: 'guarded',
    coverageFactor: 2,
    unitsRuled: 0,
    conditions: { ...noted, warmUpMinutes: 10 },
  });
  expect(data?.results[1]?.expandedUncertainty).toBeCloseTo(byHand(12.4), 12);
  // The gain error of the shared range all but cancels in the regulation; two resolutions are left.
  expect(data?.results[2]?.expandedUncertainty).toBeLessThan(byHand(16.5) / 12);
});
