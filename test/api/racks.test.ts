import { auditEntries } from '#db/schema/audit';
import { instrumentRanges } from '#db/schema/instruments';
import { lots } from '#db/schema/lots';
import { parts } from '#db/schema/parts';
import { racks, rackTokens } from '#db/schema/racks';
import { readings } from '#db/schema/readings';
import { REQUESTS_A_MINUTE } from '#server/racks/rack-limit';
import { type Bench } from '#shared/contract/bench';
import { type Lot } from '#shared/contract/lots';
import { type ProblemDetails } from '#shared/contract/problem';
import { type Rack, type RackLot, type RackReading } from '#shared/contract/racks';
import { desc, eq } from 'drizzle-orm';
import { createHash } from 'node:crypto';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { keep, lotNow, planOf, submit, typedReading } from '../support/bench-acts';
import { addInstrument, addPlannedPart, attribute, drawnLot, measured } from '../support/bench-fixtures';
import { addTestRack, addTestToken, rackReading, type TestRack, withToken } from '../support/test-rack';
import { testSite, type TestSite } from '../support/test-site';

let site: TestSite;
beforeEach(async () => {
  site = await testSite();
});
afterEach(() => site.close());

const PLAN = planOf(
  measured('v_loaded', 'major', { lower: 11.4, upper: 12.6 }, { instrumentKind: 'multimeter' }),
  measured('ripple_pp', 'major', { upper: 1 }, { unit: 'mV p-p', measurand: 'ripple' }),
  attribute('marking', 'minor'),
);
/** What the part's model would say; the readings of these tests lie in its bands unless they are meant not to. */
const EXPECTED = {
  ripple: { low: 0.4, high: 0.9 },
  loaded: { low: 11, high: 13 },
  noLoad: { low: 15, high: 18 },
  nominal: { rippleVolts: 0.6, loadedVolts: 12, noLoadVolts: 16 },
};

/** Requests that are under way at once. */
const ABREAST = 30;

interface Bound {
  lot: Lot;
  rack: TestRack;
  partId: number;
}

/** A lot of three at the bench, a meter, and a rack that may measure it. */
async function boundLot(plan = PLAN, quantity = 3): Promise<Bound> {
  const references = addPlannedPart(site.db, site.people.quality.id, plan);
  const { partId } = references;
  site.db.update(parts).set({ expected: EXPECTED }).where(eq(parts.id, partId)).run();
  addInstrument(site.db, 'multimeter', 'MM-01');
  const rack = addTestRack(site, { name: 'North', partIds: [partId] });
  return { lot: await drawnLot(site, references, quantity), rack, partId };
}

const loaded = (id: string, unit: number, value: number, more: Partial<RackReading> = {}) =>
  rackReading(id, unit, 'v_loaded', value, { instrument: 'MM-01', ...more });
/** Pass or fail in place of a value. */
const passed = (reading: RackReading, pass: boolean): RackReading => ({ ...reading, value: undefined, pass });
const marking = (id: string, unit: number, pass: boolean) => passed(rackReading(id, unit, 'marking', 0), pass);

const send = ({ lot, rack }: Bound, ...sent: RackReading[]) =>
  rack.agent.post(`/api/rack/lots/${lot.number}/readings`).send({ readings: sent });
const look = ({ lot, rack }: Bound) => rack.agent.get(`/api/rack/lots/${lot.number}`);
const bench = async ({ lot }: Bound) =>
  (await site.as('inspector').get(`/api/lots/${lot.id}/bench`).expect(200)).body as Bench;
const keptRows = () => site.db.select().from(readings).all();

describe('a token of a rack', () => {
  const body = {
    name: 'North',
    place: 'Test room',
    active: true,
    partIds: [],
    mapping: { Vout: 'v_loaded', Op: null },
  };
  const addRack = async () => (await site.as('admin').post('/api/racks').send(body).expect(201)).body as Rack;

  it('is told once, and kept as its hash alone', async () => {
    const rack = await addRack();
    const issued = await site.as('admin').post(`/api/racks/${rack.id}/tokens`).expect(201);
    const { token } = issued.body as { token: string };
    expect(token).toMatch(/^qrk_[\w-]{43}$/);
    const [row] = site.db.select().from(rackTokens).all();
    expect(row?.hash).toBe(createHash('sha256').update(token).digest('hex'));
    const { body: shown } = await site.as('auditor').get(`/api/racks/${rack.id}`).expect(200);
    expect((shown as Rack).tokens).toMatchObject([{ beginning: token.slice(0, 8), lastUsedAt: null, revoked: null }]);
    const everything = JSON.stringify([shown, row, site.db.select().from(auditEntries).all()]);
    expect(everything).not.toContain(token);
    await withToken(site, token).get('/api/rack/lots/L-26-0001').expect(404);
  });

  it('is not accepted when it is revoked, and nobody learns whether it ever was one', async () => {
    const rack = await addRack();
    const issued = await site.as('admin').post(`/api/racks/${rack.id}/tokens`).expect(201);
    const { token, rack: now } = issued.body as { token: string; rack: Rack };
    const path = `/api/racks/${rack.id}/tokens/${now.tokens[0]?.id}/revocation`;
    await site.as('admin').post(path).expect(200);
    await site.as('admin').post(path).expect(409);
    const revoked = await withToken(site, token).get('/api/rack/lots/L-26-0001').expect(401);
    const wrong = await withToken(site, 'qrk_nobody').get('/api/rack/lots/L-26-0001').expect(401);
    expect(revoked.body).toEqual(wrong.body);
    expect(revoked.headers['www-authenticate']).toBe('Bearer');
    const { body: shown } = await site.as('quality').get(`/api/racks/${rack.id}`).expect(200);
    expect((shown as Rack).tokens[0]?.revoked).toMatchObject({ by: site.people.admin.name });
  });

  it('makes a request the rack’s alone, whoever’s cookie comes with it', async () => {
    const rack = addTestRack(site);
    const both = site.as('admin').set('authorization', `Bearer ${rack.token}`);
    expect((await both.get('/api/racks').expect(403)).body).toMatchObject({ code: 'forbidden' });
    const wrong = site.as('admin').set('authorization', 'Bearer qrk_nobody');
    await wrong.get('/api/racks').expect(401);
  });

  it('works for the parts of its rack while the rack is in use', async () => {
    const bound = await boundLot();
    const other = addTestRack(site, { name: 'South' });
    const { body: unbound } = await look({ ...bound, rack: other }).expect(403);
    expect(unbound).toMatchObject({ code: 'part-not-bound' });
    expect((unbound as ProblemDetails).title).toContain('WA-12-500');
    site.db.update(racks).set({ active: false }).where(eq(racks.id, bound.rack.id)).run();
    expect((await look(bound).expect(403)).body).toMatchObject({ code: 'rack-out-of-use' });
  });

  it('has its use noted, once a minute at most', async () => {
    const bound = await boundLot();
    const lastUsed = () => site.db.select().from(rackTokens).get()?.lastUsedAt;
    await look(bound).expect(200);
    const first = site.clock.now().toISOString();
    expect(lastUsed()).toBe(first);
    site.clock.advance({ seconds: 59 });
    await look(bound).expect(200);
    expect(lastUsed()).toBe(first);
    site.clock.advance({ seconds: 1 });
    await look(bound).expect(200);
    expect(lastUsed()).toBe(site.clock.now().toISOString());
  });

  it('is held back when it is used too often, and no other one with it', async () => {
    const rack = addTestRack(site);
    const ask = () => rack.agent.get('/api/rack/lots/L').expect(404);
    for (let asked = 0; asked < REQUESTS_A_MINUTE; asked += ABREAST)
      await Promise.all(Array.from({ length: ABREAST }, ask));
    const { body: refused } = await rack.agent.get('/api/rack/lots/L').expect(429);
    expect(refused).toMatchObject({ code: 'too-many-requests' });
    await addTestToken(site, rack.id).agent.get('/api/rack/lots/L').expect(404);
  }, 30_000);
});

describe('a rack in the records', () => {
  const body = (more: object = {}) => ({
    name: 'North',
    place: '',
    active: true,
    partIds: [],
    mapping: {},
    ...more,
  });

  it('is changed by the version that is current, and keeps its name to itself', async () => {
    const { partId } = await boundLot();
    const added = await site
      .as('admin')
      .post('/api/racks')
      .send(body({ name: 'South' }))
      .expect(201);
    const { id } = added.body as Rack;
    const change = (given: object, version: number) =>
      site.as('admin').put(`/api/racks/${id}`).set('if-match', `"${version}"`).send(given);
    const bound = await change(body({ name: 'South', partIds: [partId] }), 1).expect(200);
    expect((bound.body as Rack).parts).toMatchObject([{ number: 'WA-12-500' }]);
    await change(body({ name: 'South' }), 1).expect(412);
    const taken = await change(body({ name: 'North' }), 2).expect(422);
    expect((taken.body as ProblemDetails).errors).toMatchObject([{ path: ['name'] }]);
    const unknown = await change(body({ name: 'South', partIds: [partId, 999] }), 2).expect(422);
    expect((unknown.body as ProblemDetails).errors).toMatchObject([{ path: ['partIds'] }]);
    expect((await site.as('quality').get(`/api/racks/${id}`)).body).toMatchObject({ parts: [{ number: 'WA-12-500' }] });
  });

  it('gets no token while it is out of use', async () => {
    const { body: added } = await site
      .as('admin')
      .post('/api/racks')
      .send(body({ active: false }))
      .expect(201);
    await site
      .as('admin')
      .post(`/api/racks/${(added as Rack).id}/tokens`)
      .expect(409);
  });
});

describe('a rack asks for a lot', () => {
  it('and is told its characteristics in SI base units, and what is still wanted', async () => {
    const bound = await boundLot();
    const { body: told } = await look(bound).expect(200);
    const { characteristics, wanted, ...rest } = told as RackLot;
    expect(rest).toEqual({
      lot: { number: bound.lot.number, status: 'drawn', quantity: 3 },
      part: { number: 'WA-12-500', name: 'Wall adapter 12 V, 500 mA' },
      plan: { number: 'P-001', revision: 1 },
      sampleSize: 3,
    });
    expect(characteristics).toMatchObject([
      { key: 'v_loaded', kind: 'measured', unit: 'V', lowerLimit: 11.4, instrumentKind: 'multimeter' },
      { key: 'ripple_pp', kind: 'measured', unit: 'V p-p', upperLimit: 1, instrumentKind: null },
      { key: 'marking', kind: 'attribute', unit: '', lowerLimit: null, upperLimit: null },
    ]);
    expect(wanted.map(({ unit, characteristicKeys }) => [unit, characteristicKeys.length])).toEqual([
      [1, 3],
      [2, 3],
      [3, 3],
    ]);
    await send(bound, loaded('a', 2, 12), marking('b', 2, true), rackReading('c', 2, 'ripple_pp', 0.6)).expect(200);
    expect(((await look(bound).expect(200)).body as RackLot).wanted.map(({ unit }) => unit)).toEqual([1, 3]);
  });

  it('that is not at the bench and is told so', async () => {
    const bound = await boundLot();
    for (const status of ['arrived', 'submitted', 'cancelled'] as const) {
      site.db.update(lots).set({ status }).where(eq(lots.id, bound.lot.id)).run();
      expect((await look(bound).expect(409)).body).toMatchObject({ code: 'lot-not-at-bench' });
      expect((await send(bound, loaded('a', 1, 12)).expect(409)).body).toMatchObject({ code: 'lot-not-at-bench' });
    }
  });
});

describe('readings of a rack', () => {
  it('stand at the bench as taken by the rack and by nobody', async () => {
    const bound = await boundLot();
    const told = vi.spyOn(site.context.stream, 'announceLot');
    const { body } = await send(bound, loaded('a', 1, 12.05), marking('b', 1, false)).expect(200);
    expect(body).toMatchObject({ kept: 2, known: 0, questions: 0, verdict: 'continue', stop: false });
    expect(told).toHaveBeenCalledExactlyOnceWith(bound.lot.id);
    const { readings: shown, lot } = await bench(bound);
    expect(lot.status).toBe('measuring');
    expect(shown).toMatchObject([
      { unit: 1, characteristicKey: 'v_loaded', value: 12.05, rack: 'North', takenBy: null, entry: null, attempt: 1 },
      { unit: 1, characteristicKey: 'marking', pass: false, rack: 'North', takenBy: null },
    ]);
    // RFC 9562: version 8, variant 10.
    for (const { id } of shown)
      expect(id).toMatch(/^[0-9a-f]{8}-[0-9a-f]{4}-8[0-9a-f]{3}-[89ab][0-9a-f]{3}-[0-9a-f]{12}$/);
  });

  it('are in the audit trail as a batch that the rack sent', async () => {
    const bound = await boundLot();
    await send(bound, loaded('a', 1, 12), loaded('b', 2, 12)).expect(200);
    const { body } = await site.as('auditor').get('/api/audit?subject=reading-batch').expect(200);
    expect(body).toMatchObject({
      items: [
        {
          person: 'Rack North',
          action: 'kept',
          subjectName: bound.lot.number,
          after: { readings: 2, units: 2, questions: 0, token: bound.rack.tokenId },
        },
      ],
    });
    const [newest] = (await lotNow(site, bound.lot)).history;
    expect(newest).toMatchObject({ person: 'Rack North', what: 'Measuring started' });
    expect((await site.as('auditor').get('/api/audit/verification')).body).toMatchObject({ intact: true });
  });

  it('change nothing when they are sent again, also after the lot has left the bench', async () => {
    const bound = await boundLot(planOf(attribute('marking', 'minor')));
    const all = [marking('a', 1, true), marking('b', 2, true), marking('c', 3, true)];
    await send(bound, ...all.slice(0, 2)).expect(200);
    expect((await send(bound, ...all).expect(200)).body).toMatchObject({ kept: 1, known: 2, verdict: 'accepted' });
    await submit(site, await lotNow(site, bound.lot)).expect(200);
    const before = [keptRows(), site.db.select().from(auditEntries).all()];
    const told = vi.spyOn(site.context.stream, 'announceLot');
    expect((await send(bound, ...all).expect(200)).body).toMatchObject({ kept: 0, known: 3, verdict: 'accepted' });
    expect([keptRows(), site.db.select().from(auditEntries).all()]).toEqual(before);
    expect(told).not.toHaveBeenCalled();
    expect((await send(bound, ...all, marking('d', 1, true)).expect(409)).body).toMatchObject({
      code: 'lot-not-at-bench',
    });
  });

  it('of one request may come twice in it', async () => {
    const bound = await boundLot();
    const { body } = await send(bound, loaded('a', 1, 12), loaded('a', 1, 12)).expect(200);
    expect(body).toMatchObject({ kept: 1, known: 1 });
  });

  it.each([
    ['another value', loaded('a', 1, 12.1)],
    ['another unit', loaded('a', 2, 12)],
    ['another characteristic', rackReading('a', 1, 'ripple_pp', 12)],
    ['another instrument', loaded('a', 1, 12, { instrument: 'MM-02' })],
    ['another time', loaded('a', 1, 12, { takenAt: '2026-03-12T07:59:59.000Z' })],
    ['another range', loaded('a', 1, 12, { rangeName: '20 V' })],
  ])('refuse %s under the same own id, all of them', async (_what, other) => {
    const bound = await boundLot();
    site.db.update(lots).set({ drawnAt: '2026-03-01T08:00:00.000Z' }).where(eq(lots.id, bound.lot.id)).run();
    addInstrument(site.db, 'multimeter', 'MM-02');
    await send(bound, loaded('a', 1, 12)).expect(200);
    const { body } = await send(bound, loaded('fresh', 3, 12), other).expect(409);
    expect(body).toMatchObject({ code: 'reading-id-used', errors: [{ path: ['readings', 1, 'id'] }] });
    expect(keptRows()).toHaveLength(1);
  });

  it('of two racks under one own id are two readings', async () => {
    const bound = await boundLot();
    const south = addTestRack(site, { name: 'South', partIds: [bound.partId] });
    await send(bound, loaded('a', 1, 12)).expect(200);
    await send({ ...bound, rack: south }, loaded('a', 2, 12.2)).expect(200);
    expect(keptRows()).toHaveLength(2);
  });

  it('are all refused with the path and reason of each fault', async () => {
    const bound = await boundLot();
    addInstrument(site.db, 'multimeter', 'MM-09', { calibrationDue: '2026-01-31' });
    addInstrument(site.db, 'oscilloscope', 'OS-01');
    await keep(site, bound.lot, typedReading(3, 'ripple_pp', '600')).expect(200);
    const { body } = await send(
      bound,
      loaded('a', 1, 12),
      loaded('b', 4, 12),
      rackReading('c', 1, 'v_out', 12),
      passed(loaded('d', 1, 0), true),
      rackReading('e', 1, 'marking', 1),
      loaded('f', 2, 12, { instrument: null }),
      loaded('g', 2, 12, { instrument: 'MM-77' }),
      loaded('h', 2, 12, { instrument: 'MM-09' }),
      loaded('i', 2, 12, { instrument: 'OS-01' }),
      loaded('j', 2, 12, { rangeName: '7 V' }),
      loaded('k', 1, 12),
      rackReading('l', 3, 'ripple_pp', 0.6),
    ).expect(422);
    const { code, errors = [] } = body as ProblemDetails;
    expect(code).toBe('readings-refused');
    expect(errors.map(({ path }) => path.slice(1))).toEqual([
      [1, 'unit'],
      [2, 'characteristicKey'],
      [3, 'value'],
      [4, 'pass'],
      [5, 'instrument'],
      [6, 'instrument'],
      [7, 'instrument'],
      [8, 'instrument'],
      [9, 'rangeName'],
      [10, 'characteristicKey'],
      [11, 'characteristicKey'],
    ]);
    expect(errors.map(({ message }) => message).join(' ')).toContain('MM-09 is past its calibration date');
    expect(keptRows()).toHaveLength(1);
  });

  it('without the shape are refused before anything is looked up', async () => {
    const bound = await boundLot();
    const wrong = [
      { ...loaded('a', 1, 12), pass: true },
      { ...loaded('', 1, 12) },
      { ...loaded('a', 1, 2e12) },
      { ...loaded('a', 1, 12), takenAt: 'now' },
    ];
    const { body } = await send(bound, ...wrong).expect(400);
    const paths = (body as ProblemDetails).errors?.map(({ path }) => path.join('.'));
    expect(paths).toEqual(['readings.0.value', 'readings.1.id', 'readings.2.value', 'readings.3.takenAt']);
    await send(bound).expect(400);
  });

  it('come two thousand at once, and no more', { timeout: 30_000 }, async () => {
    const keys = ['v_no_load', 'v_half', 'v_loaded', 'v_hot'];
    const plan = planOf(...keys.map((key) => measured(key, 'major', { lower: 11.4, upper: 12.6 })));
    const bound = await boundLot(plan, 200_000);
    const all = Array.from({ length: 2000 }, (_, index) =>
      rackReading(`r${index}`, Math.floor(index / 4) + 1, keys[index % 4] ?? '', 12),
    );
    await send(bound, ...all, rackReading('more', 501, 'v_loaded', 12)).expect(400);
    expect((await send(bound, ...all).expect(200)).body).toMatchObject({ kept: 2000, verdict: 'continue' });
    const { wanted } = (await look(bound).expect(200)).body as RackLot;
    expect(wanted[0]).toMatchObject({ unit: 501 });
  });

  it('count in the verdict that the next person’s reading is told', async () => {
    const bound = await boundLot();
    await keep(site, bound.lot, typedReading(1, 'ripple_pp', '600')).expect(200);
    const { body } = await send(bound, loaded('a', 2, 14), marking('b', 2, true)).expect(200);
    expect(body).toMatchObject({ stop: true, verdict: 'rejected' });
    const { body: kept } = await keep(site, bound.lot, typedReading(3, 'ripple_pp', '600')).expect(200);
    expect(kept).toMatchObject({ stop: true, lotReason: (body as { reason: string }).reason });
  });

  it('are on the range they name, or the smallest that holds them, with their uncertainty', async () => {
    const bound = await boundLot();
    const range = (name: string, fullScale: number) => ({
      ...({ form: 'digital', unit: 'V', current: 'dc', ofReading: 0.001, ofRange: 0.0001, counts: 0 } as const),
      ...{ name, fullScale, resolution: 0.001 },
    });
    const specifications = [range('20 V', 20), range('200 V', 200)];
    const [small, large] = specifications.map((specification, position) =>
      site.db.insert(instrumentRanges).values({ instrumentId: 1, position, specification }).returning().get(),
    );
    await send(bound, loaded('a', 1, 12), loaded('b', 2, 12, { rangeName: '200 V' })).expect(200);
    const { readings: shown } = await bench(bound);
    expect(shown.map(({ rangeId }) => rangeId)).toEqual([small?.id, large?.id]);
    // a = 0.001 x 12 + 0.0001 x 20 = 14 mV, u = a/sqrt 3, with resolution 1 mV / sqrt 12; U = 2 u (GUM 4.3.7, F.2.2.1).
    expect(shown[0]?.expandedUncertainty).toBeCloseTo(2 * Math.hypot(0.014 / Math.sqrt(3), 0.001 / Math.sqrt(12)), 9);
    const { body } = await send(bound, loaded('c', 3, 230)).expect(422);
    expect(body).toMatchObject({ errors: [{ path: ['readings', 0, 'value'] }] });
  });

  it('far from what the part can give wait for a person, and the lot with them', async () => {
    const bound = await boundLot(planOf(measured('ripple_pp', 'major', { upper: 9 }, { measurand: 'ripple' })));
    const ripple = (id: string, unit: number, value: number) => rackReading(id, unit, 'ripple_pp', value);
    const { body } = await send(bound, ripple('a', 1, 0.6), ripple('b', 2, 6), ripple('c', 3, 0.7)).expect(200);
    expect(body).toMatchObject({ kept: 3, questions: 1, verdict: 'accepted' });
    const { readings: shown } = await bench(bound);
    const [, asked] = shown;
    expect(asked?.question).toMatchObject({ given: { answer: 'open' }, answeredBy: null });
    expect(asked?.question?.sentence).not.toBe('');
    const refused = await submit(site, await lotNow(site, bound.lot)).expect(409);
    expect(refused.body).toMatchObject({ code: 'questions-open' });
    await site
      .as('inspector')
      .post(`/api/lots/${bound.lot.id}/readings/${asked?.id}/answer`)
      .send({ reason: 'known-fault', note: '' })
      .expect(200);
    await submit(site, await lotNow(site, bound.lot)).expect(200);
  });

  it('may be sent anew after a person took one back, under another own id', async () => {
    const bound = await boundLot();
    await send(bound, loaded('a', 1, 12)).expect(200);
    const [{ id } = { id: '' }] = (await bench(bound)).readings;
    await site.as('quality').post(`/api/lots/${bound.lot.id}/readings/${id}/withdrawal`).expect(200);
    expect((await send(bound, loaded('a', 1, 12)).expect(200)).body).toMatchObject({ kept: 0, known: 1 });
    expect((await send(bound, loaded('a2', 1, 12.1)).expect(200)).body).toMatchObject({ kept: 1 });
    const newest = site.db.select().from(readings).orderBy(desc(readings.attempt)).get();
    expect(newest).toMatchObject({ value: 12.1, attempt: 2 });
  });
});
