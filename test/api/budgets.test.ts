import { calibrations } from '#db/schema/calibrations';
import { parts } from '#db/schema/parts';
import { type Budget } from '#shared/contract/budgets';
import { type Lot } from '#shared/contract/lots';
import { randomUUID } from 'node:crypto';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { addPlannedPart, attribute, drawnLot, measured } from '../support/bench-fixtures';
import { planOf, typedReading } from '../support/bench-acts';
import { computed } from '../support/plan-bodies';
import { type Agent, testSite, type TestSite } from '../support/test-site';

let site: TestSite;
let inspector: Agent;
let lot: Lot;
let meter: number;

/** ±(0.5 % of reading + 2 counts of 10 mV). */
const RANGE = {
  ...{ form: 'digital', name: '20 V', unit: 'V', current: 'dc', fullScale: 20, resolution: 0.01 },
  ...{ ofReading: 0.005, ofRange: 0, counts: 2 },
};

beforeEach(async () => {
  site = await testSite();
  const body = {
    ...{ assetNumber: 'MM-07', kind: 'multimeter', description: 'Bench multimeter', serialNumber: '', place: '' },
    ...{ status: 'in-service', calibrationDue: '2027-01-31', dailyReference: null, ranges: [RANGE] },
  };
  meter = ((await site.as('quality').post('/api/instruments').send(body).expect(201)).body as { id: number }).id;
  inspector = site.as('inspector');
});
afterEach(() => site.close());

async function draw(decisionRule: 'simple' | 'guarded' | 'non-binary' = 'simple') {
  const volts = { instrumentKind: 'multimeter' } as const;
  const plan = {
    ...planOf(
      measured('no_load', 'major', { upper: 18 }, volts),
      measured('loaded', 'major', { lower: 11.4, upper: 12.6 }, { ...volts, target: 12 }),
      computed(
        'regulation',
        { key: 'load-regulation', inputs: { no_load: 'no_load', loaded: 'loaded' } },
        { upperLimit: 0.5 },
      ),
      attribute('label', 'minor'),
    ),
    decisionRule,
  };
  lot = await drawnLot(site, addPlannedPart(site.db, site.people.quality.id, plan), 100);
}

async function keep(key: string, text: string, more: object = {}): Promise<string> {
  const id = randomUUID();
  await inspector
    .put(`/api/lots/${lot.id}/readings/${id}`)
    .send(typedReading(1, key, text, { instrumentId: meter, ...more }))
    .expect(200);
  return id;
}

async function budgetOf(key: string, query = ''): Promise<Budget> {
  return (await inspector.get(`/api/lots/${lot.id}/units/1/budgets/${key}${query}`).expect(200)).body as Budget;
}

describe('the budget of a reading', () => {
  it('lists each component and combines them as done by hand', async () => {
    await draw();
    await keep('loaded', '12.00');
    const { value, result, readings, unknown } = await budgetOf('loaded');
    // a = 0.5 % · 12 V + 2 · 10 mV = 80 mV, u = a/√3; resolution δ/√12; U = 2 u_c (JCGM 100, 4.3.7 and 6.2.1).
    const [accuracy, resolution] = [0.08 / Math.sqrt(3), 0.01 / Math.sqrt(12)];
    expect(result?.lines).toMatchObject([
      {
        line: 1,
        source: 'Accuracy of 20 V',
        distribution: 'rectangular',
        halfWidth: 0.08,
        divisor: '√3',
        sensitivity: 1,
      },
      { line: 2, source: 'Resolution of the display', halfWidth: 0.005, degreesOfFreedom: null },
    ]);
    expect(result?.lines.map(({ standardUncertainty }) => standardUncertainty)).toEqual([
      expect.closeTo(accuracy, 12),
      expect.closeTo(resolution, 12),
    ]);
    expect(result?.expandedUncertainty).toBeCloseTo(2 * Math.hypot(accuracy, resolution), 12);
    expect(result?.lines.reduce((sum, { share }) => sum + (share ?? 0), 0)).toBeCloseTo(1, 12);
    expect(result?.degreesOfFreedom).toBeNull();
    expect(result?.fineness).toMatchObject({ kind: 'ratio', coarse: false });
    expect([value, unknown]).toEqual([12, '']);
    expect(readings).toMatchObject([
      {
        input: null,
        value: 12,
        takenBy: site.people.inspector.name,
        instrument: { assetNumber: 'MM-07', range: RANGE },
      },
    ]);
    expect(readings[0]?.expandedUncertainty).toBeCloseTo(result?.expandedUncertainty ?? 0, 12);
  });

  it('says how the rule judges near a limit, and how probable it is that the value conforms', async () => {
    await draw('non-binary');
    await keep('loaded', '12.60');
    const { result } = await budgetOf('loaded');
    expect(result).toMatchObject({ verdict: 'conditional', side: 'inside' });
    expect(result?.guardBand).toBe(result?.expandedUncertainty);
    expect(result?.accepted.upper).toBeCloseTo(12.6 - (result?.expandedUncertainty ?? 0), 12);
    // At a limit far from the other one half of the values conform (JCGM 106, 7.3).
    expect(result?.conformityProbability).toBeCloseTo(0.5, 6);
  });

  it('names the calibration that held when the reading was taken, not a later one', async () => {
    await draw();
    const base = {
      instrumentId: meter,
      laboratory: 'Aldernau Metrology',
      asFound: 'in-tolerance',
      adjusted: false,
    } as const;
    const rest = {
      ...base,
      points: [],
      note: '',
      recordedAt: '2026-03-01T08:00:00.000Z',
      recordedById: site.people.quality.id,
    };
    for (const [certificateNumber, calibratedOn, dueOn] of [
      ['C-1', '2025-02-01', '2026-02-01'],
      ['C-2', '2026-02-01', '2027-02-01'],
      ['C-3', '2026-09-01', '2027-09-01'],
    ] as const)
      site.db
        .insert(calibrations)
        .values({ ...rest, certificateNumber, calibratedOn, dueOn })
        .run();
    await keep('loaded', '12.00');
    const { readings } = await budgetOf('loaded');
    expect(readings[0]?.instrument?.calibration).toMatchObject({ certificateNumber: 'C-2', asFound: 'in-tolerance' });
  });

  it('can be that of an earlier attempt', async () => {
    await draw();
    const first = await keep('loaded', '12.00');
    await keep('loaded', '12.10', { repeat: { reason: 'contact', note: '' } });
    expect((await budgetOf('loaded')).value).toBe(12.1);
    expect((await budgetOf('loaded', `?reading=${first}`)).value).toBe(12);
  });

  it('is not made up where the instrument has no accuracy specification', async () => {
    await draw();
    const list = (await inspector.get('/api/instruments')).body as { items: { version: number }[] };
    const body = {
      ...{ assetNumber: 'MM-07', kind: 'multimeter', description: 'Bench multimeter', serialNumber: '', place: '' },
      ...{ status: 'in-service', dailyReference: null, ranges: [] },
    };
    await site
      .as('quality')
      .put(`/api/instruments/${meter}`)
      .set('if-match', `"${list.items[0]?.version}"`)
      .send(body)
      .expect(200);
    await keep('loaded', '12.00');
    const { result, unknown } = await budgetOf('loaded');
    expect(result).toBeNull();
    expect(unknown).toMatch(/no range with an accuracy/);
  });
});

describe('how fine a measurement is for one limit', () => {
  it('is told by the target, or else by what the part’s model gives', async () => {
    const unloaded = { instrumentKind: 'multimeter', measurand: 'no-load-voltage' } as const;
    const references = addPlannedPart(
      site.db,
      site.people.quality.id,
      planOf(measured('no_load', 'major', { upper: 18 }, unloaded)),
    );
    const band = { low: 14, high: 18 };
    const nominal = { rippleVolts: 1, loadedVolts: 12, noLoadVolts: 16 };
    site.db
      .update(parts)
      .set({ expected: { ripple: band, loaded: band, noLoad: band, nominal } })
      .run();
    lot = await drawnLot(site, references, 100);
    await keep('no_load', '16.20');
    const { result } = await budgetOf('no_load');
    expect(result?.fineness).toMatchObject({ kind: 'distance', distance: 2 });
  });
});

describe('the budget of what is computed', () => {
  it('shares the gain error of one range between its readings', async () => {
    await draw();
    await keep('no_load', '16.80');
    await keep('loaded', '12.00');
    const { value, result, readings } = await budgetOf('regulation');
    expect(value).toBeCloseTo(0.4, 12);
    expect(readings.map(({ input, value: read }) => [input, read])).toEqual([
      ['no_load', 16.8],
      ['loaded', 12],
    ]);
    // (V0 − V1)/V1: ∂/∂V0 = 1/V1, ∂/∂V1 = −V0/V1².
    expect(result?.lines.map(({ input, sensitivity }) => [input, sensitivity])).toEqual([
      ['no_load', expect.closeTo(1 / 12, 6)],
      ['no_load', expect.closeTo(1 / 12, 6)],
      ['loaded', expect.closeTo(-16.8 / 144, 6)],
      ['loaded', expect.closeTo(-16.8 / 144, 6)],
    ]);
    expect(result?.lines[0]?.note).toMatch(/same error as in line 3: it cancels/);
    // What is left of the shared error is that of the two zero errors alone, 20 mV/√3 each.
    const zero = (0.02 / Math.sqrt(3)) * Math.abs(1 / 12 - 16.8 / 144);
    const own = (0.01 / Math.sqrt(12)) * Math.hypot(1 / 12, 16.8 / 144);
    expect(result?.standardUncertainty).toBeCloseTo(Math.hypot(zero, own), 6);
  });

  it('waits for the readings that it is computed from', async () => {
    await draw();
    await keep('loaded', '12.00');
    const { value, result, unknown } = await budgetOf('regulation');
    expect([value, result]).toEqual([null, null]);
    expect(unknown).toBe('A reading that it is computed from is missing.');
  });
});

describe('a budget that there is not', () => {
  it('is answered so', async () => {
    await draw();
    const ask = (path: string) => inspector.get(`/api/lots/${lot.id}/units/${path}`);
    await ask('1/budgets/loaded').expect(404);
    await ask('999/budgets/loaded').expect(404);
    await ask('1/budgets/nothing').expect(404);
    const answer = await ask('1/budgets/label').expect(409);
    expect(answer.body).toMatchObject({ code: 'no-uncertainty' });
    await site.as('receiving').get(`/api/lots/${lot.id}/units/1/budgets/loaded`).expect(403);
  });
});
