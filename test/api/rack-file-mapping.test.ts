import { auditEntries } from '#db/schema/audit';
import { instrumentRanges } from '#db/schema/instruments';
import { parts } from '#db/schema/parts';
import { readings } from '#db/schema/readings';
import { type Bench, type RackPreview } from '#shared/contract/bench';
import { type Lot } from '#shared/contract/lots';
import { type ProblemDetails } from '#shared/contract/problem';
import { type Rack } from '#shared/contract/racks';
import { eq } from 'drizzle-orm';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { planOf } from '../support/bench-acts';
import { addInstrument, addPlannedPart, attribute, drawnLot, measured } from '../support/bench-fixtures';
import { addTestRack } from '../support/test-rack';
import { testSite, type TestSite } from '../support/test-site';

let site: TestSite;
beforeEach(async () => {
  site = await testSite();
});
afterEach(() => site.close());

const PLAN = planOf(
  measured('v_loaded', 'major', { lower: 11.4, upper: 12.6 }),
  measured('ripple_pp', 'major', { upper: 1 }, { unit: 'mV p-p', measurand: 'ripple' }),
  attribute('marking', 'minor'),
);
const MAPPING = { 'DUT no': 'unit', 'Vout [V]': 'v_loaded', 'Vpp [mV]': 'ripple_pp', Label: 'marking', Operator: null };
const TEXT = [
  'DUT no;Vout [V];Vpp [mV];Label;Operator',
  '1;12,01;600;pass;ines',
  '2;12,02;610;pass;ines',
  '3;11,98;590;fail;ines',
].join('\n');

interface Bound {
  lot: Lot;
  rackId: number;
}

async function boundLot(plan: Parameters<typeof addPlannedPart>[2] = PLAN): Promise<Bound> {
  const references = addPlannedPart(site.db, site.people.quality.id, plan);
  const { partId } = references;
  const { id: rackId } = addTestRack(site, { name: 'North', partIds: [partId] });
  return { lot: await drawnLot(site, references, 3), rackId };
}

const body = (more: object = {}) => ({
  fileName: 'north.csv',
  text: TEXT,
  instrumentIds: [],
  mapping: MAPPING,
  ...more,
});
const bring = ({ lot }: Bound, given: object) => site.as('inspector').post(`/api/lots/${lot.id}/rack-file`).send(given);
const preview = async ({ lot }: Bound, given: object) =>
  (await site.as('inspector').post(`/api/lots/${lot.id}/rack-file/preview`).send(given).expect(200))
    .body as RackPreview;
const rackNow = async ({ rackId }: Bound) =>
  (await site.as('admin').get(`/api/racks/${rackId}`).expect(200)).body as Rack;

describe('the columns of a rack file', () => {
  it('are what they were said to be: a characteristic, the unit, or nothing', async () => {
    const bound = await boundLot();
    const { faults, columns, readings: found } = await preview(bound, body());
    expect(faults).toEqual([]);
    expect(columns).toEqual([
      { header: 'DUT no', characteristicKey: null, samples: ['1', '2', '3'] },
      { header: 'Vout [V]', characteristicKey: 'v_loaded', samples: ['12,01', '12,02', '11,98'] },
      { header: 'Vpp [mV]', characteristicKey: 'ripple_pp', samples: ['600', '610', '590'] },
      { header: 'Label', characteristicKey: 'marking', samples: ['pass', 'pass', 'fail'] },
      { header: 'Operator', characteristicKey: null, samples: ['ines', 'ines', 'ines'] },
    ]);
    expect(found).toBe(9);
  });

  it('of which nothing was said stand for themselves', async () => {
    const bound = await boundLot();
    const text = 'unit,v_loaded,Note\n1,12.1,x';
    const { faults, readings: found } = await preview(bound, body({ text, mapping: { Note: null } }));
    expect(faults).toEqual([]);
    expect(found).toBe(1);
    const unnamed = await preview(bound, body({ text, mapping: {} }));
    expect(unnamed.faults).toEqual([{ line: 1, column: 'Note', message: 'The plan has no characteristic Note.' }]);
  });

  it('are named in faults by the file’s own headings', async () => {
    const bound = await boundLot();
    const text = 'DUT no,Vout [V],Label\n1,twelve,pass\n9,12.1,pass\n2,12.1,perhaps';
    const { faults } = await preview(bound, body({ text }));
    expect(faults.map(({ line, column }) => [line, column])).toEqual([
      [2, 'Vout [V]'],
      [3, 'DUT no'],
      [4, 'Label'],
    ]);
  });

  it('cannot be two for one characteristic, and one of them is the unit', async () => {
    const bound = await boundLot();
    const twice = await preview(bound, body({ mapping: { ...MAPPING, Operator: 'v_loaded' } }));
    expect(twice.faults).toMatchObject([{ line: 1, column: 'Operator' }]);
    const without = await preview(bound, body({ mapping: { ...MAPPING, 'DUT no': null } }));
    expect(without.faults).toMatchObject([{ line: 1, column: 'unit' }]);
  });
});

describe('a rack’s file', () => {
  it('is remembered with what its columns mean, once, and on record', async () => {
    const bound = await boundLot();
    const { rackId } = bound;
    await bring(bound, body({ rackId, mapping: { ...MAPPING, 'Never there': 'v_loaded' } })).expect(201);
    expect((await rackNow(bound)).mapping).toEqual(MAPPING);
    const { body: shown } = await site.as('inspector').get(`/api/lots/${bound.lot.id}/bench`).expect(200);
    expect((shown as Bench).racks).toEqual([{ id: rackId, name: 'North', mapping: MAPPING }]);
    expect((shown as Bench).readings[0]).toMatchObject({ rack: 'North', takenBy: null });
    const named = () => site.db.select().from(auditEntries).where(eq(auditEntries.action, 'columns named')).all();
    expect(named()).toMatchObject([{ subject: 'rack', subjectId: String(rackId), actor: site.people.inspector.name }]);
    const next = { ...bound, lot: await drawnLot(site, { supplierId: 1, partId: 1 }, 3) };
    await bring(next, body({ rackId })).expect(201);
    expect(named()).toHaveLength(1);
  });

  it('leaves no trace with the rack when it is refused, or only looked at', async () => {
    const bound = await boundLot();
    await preview(bound, body({ rackId: bound.rackId }));
    await bring(bound, body({ rackId: bound.rackId, text: `${TEXT}\n9;1;1;pass;x` })).expect(422);
    expect((await rackNow(bound)).mapping).toEqual({});
    expect(site.db.select().from(readings).all()).toEqual([]);
  });

  it('is that of a rack which is set up for the part', async () => {
    const bound = await boundLot();
    const { id: rackId } = addTestRack(site, { name: 'South' });
    const { body: refused } = await bring(bound, body({ rackId })).expect(422);
    expect((refused as ProblemDetails).errors).toMatchObject([{ path: ['rackId'] }]);
  });

  it('counts as an edit of the rack, so that nobody’s form overwrites what it taught', async () => {
    const bound = await boundLot();
    const { version, name, place, active, parts: partsBound } = await rackNow(bound);
    await bring(bound, body({ rackId: bound.rackId })).expect(201);
    const form = { name, place, active, mapping: {}, partIds: partsBound.map(({ id }) => id) };
    await site.as('admin').put(`/api/racks/${bound.rackId}`).set('if-match', `"${version}"`).send(form).expect(412);
  });
});

describe('readings of a rack file', () => {
  it('far from what the part can give are named in the preview and kept as open questions', async () => {
    const bound = await boundLot();
    const expected = {
      ripple: { low: 0.4, high: 0.9 },
      loaded: { low: 11, high: 13 },
      noLoad: { low: 15, high: 18 },
      nominal: { rippleVolts: 0.6, loadedVolts: 12, noLoadVolts: 16 },
    };
    site.db.update(parts).set({ expected }).run();
    const text = TEXT.replace(';610;', ';61;');
    const { faults, questions } = await preview(bound, body({ text }));
    expect(faults).toEqual([]);
    expect(questions).toMatchObject([{ unit: 2, characteristicKey: 'ripple_pp', value: 0.061 }]);
    await bring(bound, body({ text })).expect(201);
    const asked = site.db.select().from(readings).where(eq(readings.value, 0.061)).get();
    expect(asked?.question).toMatchObject({ given: { answer: 'open' }, answeredBy: null });
  });

  it('are judged with their uncertainty where the plan has guard bands', async () => {
    const bound = await boundLot({
      ...planOf(measured('v_loaded', 'major', { lower: 11.4, upper: 12.6 }, { instrumentKind: 'multimeter' })),
      decisionRule: 'guarded',
    });
    const meter = addInstrument(site.db, 'multimeter', 'MM-01');
    const file = body({ text: 'unit,v_loaded\n1,12.0\n2,12.0\n3,12.595', mapping: {}, instrumentIds: [meter] });
    const unknown = await preview(bound, file);
    expect(unknown.faults).toHaveLength(3);
    expect(unknown.faults[0]?.message).toContain('guard bands');
    const range = { name: '20 V', unit: 'V', current: 'dc', fullScale: 20, resolution: 0.001 } as const;
    // a = 0.1 % of reading = 12.6 mV, U = 2 a / sqrt 3 = 14.5 mV: 12.595 V lies inside the guard band below 12.6 V.
    const accuracy = { form: 'digital', ofReading: 0.001, ofRange: 0, counts: 0 } as const;
    site.db
      .insert(instrumentRanges)
      .values({ instrumentId: meter, position: 0, specification: { ...accuracy, ...range } })
      .run();
    const guarded = await preview(bound, file);
    expect(guarded.faults).toEqual([]);
    expect(guarded.nonconformingUnits).toEqual([{ unit: 3, failed: ['v_loaded'] }]);
    await bring(bound, file).expect(201);
    const [first] = site.db.select().from(readings).all();
    expect(first?.expandedUncertainty).toBeCloseTo(2 * Math.hypot(0.012 / Math.sqrt(3), 0.001 / Math.sqrt(12)), 9);
  });
});
