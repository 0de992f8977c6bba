import { readings } from '#db/schema/readings';
import { type Bench, type Kept, type ReadingBody } from '#shared/contract/bench';
import { type Lot } from '#shared/contract/lots';
import { type ProblemDetails } from '#shared/contract/problem';
import { randomUUID } from 'node:crypto';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { addInstrument, addPlannedPart, attribute, drawnLot, measured } from '../support/bench-fixtures';
import { addTestPerson } from '../support/test-people';
import { testSite, type Agent, type TestSite } from '../support/test-site';

let site: TestSite;
let lot: Lot;
let inspector: Agent;
let meter: number;
let scope: number;

// 1 200 units at level II are code J, n 80 in every class here.
beforeEach(async () => {
  site = await testSite();
  const references = addPlannedPart(site.db, site.people.quality.id, {
    level: 'II',
    classAqls: [
      { class: 'critical', aql: '0.15' },
      { class: 'major', aql: '4.0' },
      { class: 'minor', aql: '6.5' },
    ],
    characteristics: [
      attribute('polarity', 'critical'),
      measured('v_loaded', 'major', { lower: 11.4, upper: 12.9 }, { instrumentKind: 'multimeter' }),
      measured(
        'ripple_pp',
        'major',
        { upper: 2.4 },
        { unit: 'V p-p', entryMode: 'scope', instrumentKind: 'oscilloscope' },
      ),
      attribute('marking', 'minor'),
    ],
  });
  meter = addInstrument(site.db, 'multimeter', 'DM-11');
  scope = addInstrument(site.db, 'oscilloscope', 'OS-03');
  lot = await drawnLot(site, references, 1200);
  inspector = site.as('inspector');
});
afterEach(() => {
  site.close();
});

function body(
  unit: number,
  characteristicKey: string,
  entry: ReadingBody['entry'],
  more: Partial<ReadingBody> = {},
): ReadingBody {
  const instrumentId = { v_loaded: meter, ripple_pp: scope }[characteristicKey] ?? null;
  return {
    unit,
    characteristicKey,
    entry,
    instrumentId,
    rangeId: null,
    question: null,
    note: '',
    repeat: null,
    takenAt: '2026-03-12T08:00:00.000Z',
    ...more,
  };
}
const typed = (text: string): ReadingBody['entry'] => ({ kind: 'direct', text, decimalComma: false });
const passed: ReadingBody['entry'] = { kind: 'attribute', pass: true, reason: '' };
const failed: ReadingBody['entry'] = { kind: 'attribute', pass: false, reason: 'Smeared' };

function put(reading: ReadingBody, id: string = randomUUID(), agent = inspector) {
  return agent.put(`/api/lots/${lot.id}/readings/${id}`).send(reading);
}
async function keep(reading: ReadingBody, id?: string): Promise<Kept> {
  return (await put(reading, id).expect(200)).body as Kept;
}
async function bench(): Promise<Bench> {
  return (await inspector.get(`/api/lots/${lot.id}/bench`).expect(200)).body as Bench;
}
async function refusal(reading: ReadingBody, status = 422): Promise<ProblemDetails> {
  return (await put(reading).expect(status)).body as ProblemDetails;
}

describe('keeping a reading', () => {
  it('computes the value from what was typed and judges it', async () => {
    const kept = await keep(body(1, 'v_loaded', typed('12.15')));
    expect(kept.reading.value).toBe(12.15);
    expect(kept.verdict).toBe('conforming');
    expect(kept.unitVerdict).toBe('not judged');
    expect(await keep(body(2, 'v_loaded', typed('13.05')))).toMatchObject({
      verdict: 'nonconforming',
      unitVerdict: 'nonconforming',
    });
  });

  it('takes a scope reading as divisions times volts per division times probe, and shows it as it was typed', async () => {
    const entry = {
      kind: 'scope',
      scope: {
        form: 'halves',
        upperDivisions: 2,
        lowerDivisions: 1.7,
        voltsPerDivision: 0.05,
        probeFactor: 10,
        coupling: 'ac',
      },
    } as const;
    const kept = await keep(body(1, 'ripple_pp', entry));
    expect(kept.reading.value).toBeCloseTo(1.85, 12);
    expect((await bench()).readings[0]?.entry).toEqual(entry);
  });

  it('does not take ripple from a DC-coupled channel', async () => {
    const entry = {
      kind: 'scope',
      scope: { form: 'whole', divisions: 3.7, voltsPerDivision: 0.5, probeFactor: 1, coupling: 'dc' },
    } as const;
    expect((await refusal(body(1, 'ripple_pp', entry))).errors?.[0]?.path).toEqual(['entry', 'scope']);
  });

  it('acknowledges the same reading sent twice and keeps it once', async () => {
    const id = randomUUID();
    const reading = body(1, 'v_loaded', typed('12.15'));
    expect((await keep(reading, id)).reading).toEqual((await keep(reading, id)).reading);
    expect(site.db.select().from(readings).all()).toHaveLength(1);
  });

  it('refuses another cell under an id that is taken', async () => {
    const id = randomUUID();
    await keep(body(1, 'v_loaded', typed('12.15')), id);
    const { body: refused } = await put(body(2, 'v_loaded', typed('12.15')), id).expect(409);
    expect((refused as ProblemDetails).code).toBe('reading-id-used');
  });

  it('never overwrites a reading of somebody else, and says whose it is', async () => {
    await keep(body(1, 'v_loaded', typed('12.15')));
    const other = await addTestPerson(site.db, {
      name: 'Second Bench',
      email: 'second@hollowmere.example',
      roles: ['inspector'],
    });
    const { body: refused } = await put(body(1, 'v_loaded', typed('12.20')), randomUUID(), site.as(other)).expect(409);
    expect((refused as ProblemDetails).title).toBe(
      'Unit 1 has this reading already, by Ines Benchley. Repeat it with a reason.',
    );
  });

  it('repeats with a reason, twice at most; the last one counts and all stay on record', async () => {
    await keep(body(1, 'v_loaded', typed('13.4')));
    const repeat = { reason: 'contact', note: '' } as const;
    expect((await keep(body(1, 'v_loaded', typed('12.2'), { repeat }))).unitVerdict).toBe('not judged');
    expect((await keep(body(1, 'v_loaded', typed('12.3'), { repeat }))).reading.attempt).toBe(3);
    expect((await refusal(body(1, 'v_loaded', typed('12.4'), { repeat }), 409)).code).toBe('no-more-repeats');
    expect((await bench()).readings.map(({ value }) => value)).toEqual([13.4, 12.2, 12.3]);
  });

  it.each([
    ['a word', body(1, 'v_loaded', typed('twelve')), ['entry', 'text']],
    ['the wrong unit', body(1, 'v_loaded', typed('12 mA')), ['entry', 'text']],
    ['pass for a voltage', body(1, 'v_loaded', passed), ['entry', 'kind']],
    ['a voltage for a marking', body(1, 'marking', typed('12')), ['entry', 'kind']],
    [
      'a failure without reason',
      body(1, 'marking', { kind: 'attribute', pass: false, reason: '' }),
      ['entry', 'reason'],
    ],
    ['a unit outside the sample', body(126, 'marking', passed), ['unit']],
    ['a characteristic of no plan', body(1, 'hum', passed), ['characteristicKey']],
    ['no instrument', body(1, 'v_loaded', typed('12'), { instrumentId: null }), ['instrumentId']],
    ['a repeat of nothing', body(1, 'marking', passed, { repeat: { reason: 'contact', note: '' } }), ['repeat']],
  ])('refuses %s beside its field', async (_what, reading, path) => {
    // The builders above run before the instruments exist; here they get the ones of this site.
    const instrumentId =
      path[0] === 'instrumentId' ? null : body(1, reading.characteristicKey, reading.entry).instrumentId;
    expect((await refusal({ ...reading, instrumentId })).errors?.[0]?.path).toEqual(path);
  });

  it('refuses an instrument of another kind, one past its calibration date, and one withdrawn', async () => {
    const overdue = addInstrument(site.db, 'multimeter', 'DM-12', { calibrationDue: '2026-03-11' });
    const withdrawn = addInstrument(site.db, 'multimeter', 'DM-13', { status: 'withdrawn' });
    const titles = [];
    for (const instrumentId of [scope, overdue, withdrawn])
      titles.push((await refusal(body(1, 'v_loaded', typed('12'), { instrumentId }))).title);
    expect(titles).toEqual([
      'OS-03 is no multimeter.',
      'DM-12 is past its calibration date 2026-03-11.',
      'DM-13 is withdrawn.',
    ]);
  });

  it('takes an instrument on the very day its calibration is due', async () => {
    const lastDay = addInstrument(site.db, 'multimeter', 'DM-14', { calibrationDue: '2026-03-12' });
    await keep(body(1, 'v_loaded', typed('12'), { instrumentId: lastDay }));
  });
});

describe('the running verdict', () => {
  it('stops the lot as soon as a rejection number is reached, and says so', async () => {
    // Code J, major AQL 4.0: Ac 7, Re 8.
    for (let unit = 1; unit <= 7; unit += 1)
      for (const [key, entry] of [
        ['polarity', passed],
        ['v_loaded', typed('13.3')],
      ] as const)
        expect((await keep(body(unit, key, entry))).stop).toBe(false);
    await keep(body(8, 'polarity', passed));
    const last = await keep(body(8, 'v_loaded', typed('13.3')));
    expect(last.stop).toBe(true);
    expect(last.lotReason).toMatch(/^Rejected: 8 major nonconforming units in \d+ of 80, rejection number 8 /);
    expect((await bench()).lot.stopped).toBe(true);
  });

  it('goes on when the reading that stopped it is taken back', async () => {
    const id = randomUUID();
    expect((await keep(body(1, 'polarity', failed), id)).stop).toBe(true);
    await inspector.post(`/api/lots/${lot.id}/readings/${id}/withdrawal`).expect(200);
    const after = await bench();
    expect(after.lot.stopped).toBe(false);
    expect(after.readings.map(({ withdrawn }) => withdrawn)).toEqual([true]);
  });

  it('counts a unit that fails in two classes at its worst class only, and one critical failure rejects', async () => {
    await keep(body(1, 'polarity', passed));
    await keep(body(1, 'v_loaded', typed('13.3')));
    await keep(body(1, 'ripple_pp', typed('2.6')));
    await keep(body(1, 'marking', failed));
    await keep(body(2, 'marking', failed));
    const { body: before } = await site.as('quality').get(`/api/lots/${lot.id}/assessment`).expect(200);
    const found = (shown: unknown) =>
      (shown as { groups: { group: { class: string }; found: number }[] }).groups.map((one) => [
        one.group.class,
        one.found,
      ]);
    expect(found(before)).toEqual([
      ['critical', 0],
      ['major', 1],
      ['minor', 1],
    ]);
    expect((await keep(body(2, 'polarity', failed))).stop).toBe(true);
    const { body: after } = await site.as('quality').get(`/api/lots/${lot.id}/assessment`).expect(200);
    expect(found(after)).toEqual([
      ['critical', 1],
      ['major', 1],
      ['minor', 0],
    ]);
  });
});

describe('a unit set aside', () => {
  it('is undecided until it is taken back', async () => {
    await inspector.put(`/api/lots/${lot.id}/units/3/set-aside`).send({ reason: 'Cord is cut' }).expect(200);
    expect((await bench()).units[2]?.setAside).toBe('Cord is cut');
    await inspector.put(`/api/lots/${lot.id}/units/3/set-aside`).send({ reason: null }).expect(200);
    expect((await bench()).units[2]?.setAside).toBeNull();
  });
});

describe('who may take a reading back', () => {
  it('is the person who took it, or quality', async () => {
    const id = randomUUID();
    await keep(body(1, 'marking', passed), id);
    const other = await addTestPerson(site.db, {
      name: 'Second Bench',
      email: 'second@hollowmere.example',
      roles: ['inspector'],
    });
    const path = `/api/lots/${lot.id}/readings/${id}/withdrawal`;
    const { body: refused } = await site.as(other).post(path).expect(403);
    expect((refused as ProblemDetails).code).toBe('not-your-reading');
    await site.as('quality').post(path).expect(200);
  });
});

describe('submitting', () => {
  const submit = (version: number) => inspector.post(`/api/lots/${lot.id}/submission`).set('if-match', `"${version}"`);

  it('is refused while readings are missing, and says how many', async () => {
    const { body: refused } = await submit(lot.version).expect(409);
    // Four characteristics on 80 units.
    expect((refused as ProblemDetails).title).toBe('320 readings are still missing.');
  });

  it('is allowed as soon as a rejection number is reached', async () => {
    await keep(body(1, 'polarity', failed));
    await submit(lot.version).expect(200);
    expect((await bench()).lot.status).toBe('submitted');
    expect((await refusal(body(2, 'marking', passed), 409)).code).toBe('lot-not-at-bench');
  });

  it('goes back to the bench only by quality, with a reason', async () => {
    await keep(body(1, 'polarity', failed));
    await submit(lot.version).expect(200);
    const path = `/api/lots/${lot.id}/reopening`;
    const reopening = (agent: Agent) =>
      agent
        .post(path)
        .set('if-match', `"${lot.version + 1}"`)
        .send({ reason: 'Cord was upside down' });
    await reopening(inspector).expect(403);
    await reopening(site.as('quality')).expect(200);
    await keep(body(2, 'marking', passed));
  });
});
