import { auditEntries } from '#db/schema/audit';
import { parts } from '#db/schema/parts';
import { storedFiles } from '#db/schema/stored-files';
import { type Bench } from '#shared/contract/bench';
import { type Lot } from '#shared/contract/lots';
import { type ProblemDetails } from '#shared/contract/problem';
import { type Waveform, type WaveformHead } from '#shared/contract/waveforms';
import { desc, eq } from 'drizzle-orm';
import { createHash, randomUUID } from 'node:crypto';
import { readdirSync } from 'node:fs';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { keep, lotNow, planOf, submit, typedReading } from '../support/bench-acts';
import { addPlannedPart, drawnLot, measured } from '../support/bench-fixtures';
import { madeFile } from '../support/made-wave';
import { rippleFile } from '../support/ripple-file';
import { addTestRack } from '../support/test-rack';
import { testSite, type TestSite } from '../support/test-site';

let site: TestSite;
let partId: number;
let lot: Lot;
beforeEach(async () => {
  site = await testSite();
  const plan = planOf(
    measured('v_loaded', 'major', { lower: 10, upper: 20 }, { measurand: 'loaded-voltage' }),
    measured('ripple_pp', 'major', { upper: 2 }, { unit: 'V p-p', measurand: 'ripple', entryMode: 'scope' }),
    measured('warmth', 'minor', { upper: 80 }, { unit: '°C', measurand: 'temperature' }),
  );
  const references = addPlannedPart(site.db, site.people.quality.id, plan);
  partId = references.partId;
  lot = await drawnLot(site, references, 2);
});
afterEach(() => site.close());

interface Sending {
  id?: string;
  unit?: number;
  query?: object;
  who?: 'inspector' | 'auditor';
}

function send(content: Buffer | string, { id = randomUUID(), unit = 1, query = {}, who = 'inspector' }: Sending = {}) {
  return site
    .as(who)
    .put(`/api/lots/${lot.id}/waveforms/${id}`)
    .query({ fileName: 'ripple.csv', unit, ...query })
    .set('content-type', 'text/csv')
    .send(content);
}

async function kept(content: Buffer | string, sending: Sending = {}): Promise<Waveform> {
  return (await send(content, sending).expect(200)).body as Waveform;
}

const filesLeft = () =>
  readdirSync(site.context.environment.dataFolder).filter((name) => /^[0-9a-f-]{36}/.test(name)).length;
const namedFiles = () => site.db.select().from(storedFiles).all().length;
const list = async () =>
  ((await site.as('quality').get(`/api/lots/${lot.id}/waveforms`).expect(200)).body as { items: WaveformHead[] }).items;
const problem = (answer: { body: unknown }) => answer.body as ProblemDetails;
const lastEntry = () => site.db.select().from(auditEntries).orderBy(desc(auditEntries.id)).limit(1).get();

describe('a waveform file', () => {
  it('is kept with what it gives, and goes on record', async () => {
    const file = rippleFile('o4_ct_unbal_50hz');
    const waveform = await kept(file);
    expect(waveform).toMatchObject({
      unit: 1,
      fileName: 'ripple.csv',
      bytes: file.length,
      sha256: createHash('sha256').update(file).digest('hex'),
      samples: 4001,
      uploadedBy: site.people.inspector.name,
      rack: null,
      withdrawn: null,
      readingIds: [],
      version: 1,
      lot: { number: lot.number, atBench: true },
      part: { topology: 'centre-tap' },
    });
    expect(waveform.findings.map(({ kind }) => kind)).toEqual(['unequal-halves']);
    expect(waveform.record.analysis.peaksPerCycle).toBe(2);
    expect(waveform.record.spacing.interval).toBeCloseTo(25e-6, 12);
    expect(lastEntry()).toMatchObject({ action: 'kept', subject: 'waveform', actor: site.people.inspector.name });
    expect(await list()).toMatchObject([{ id: waveform.id, unit: 1, samples: 4001, values: waveform.values }]);
  });

  it('is judged against what the part ought to give', async () => {
    const expected = { ripple: { low: 0.5, high: 0.9 }, loaded: { low: 10, high: 20 }, noLoad: { low: 10, high: 20 } };
    const nominal = { rippleVolts: 0.7, loadedVolts: 15, noLoadVolts: 17 };
    site.db
      .update(parts)
      .set({ expected: { ...expected, nominal } })
      .where(eq(parts.id, partId))
      .run();
    const sound = { droop: 0.6, peak: 16 };
    expect((await kept(madeFile(sound))).findings.map(({ kind }) => kind)).toEqual(['nothing-unusual']);
    const weak = await kept(madeFile({ ...sound, droop: 1.2 }));
    expect(weak.findings.map(({ kind }) => kind)).toEqual(['capacitance-low-or-load-high']);
  });

  it('is read at the mains that was noted of the lot', async () => {
    const conditions = {
      ambientCelsius: 23,
      mainsVolts: 120,
      mainsHertz: 60,
      load: '',
      bandwidth: '',
      warmUpStartedAt: null,
      note: '',
    };
    await site.as('inspector').put(`/api/lots/${lot.id}/conditions`).send(conditions).expect(200);
    const { record } = await kept(rippleFile('o2_ct_60hz'));
    expect(record.analysis).toMatchObject({ lineHertz: 60, lineCycles: 5, rippleHertz: 120, peaksPerCycle: 2 });
  });

  it('comes back as it was sent, and as samples', async () => {
    const file = rippleFile('o4_ct_unbal_50hz');
    const { id } = await kept(file);
    const back = await site.as('auditor').get(`/api/waveforms/${id}/file`).buffer(true).expect(200);
    expect(back.headers['content-disposition']).toContain('attachment; filename=ripple.csv');
    expect(back.text).toBe(file.toString());
    const binary = await site
      .as('auditor')
      .get(`/api/waveforms/${id}/samples`)
      .buffer(true)
      .responseType('blob')
      .expect(200);
    const bytes = binary.body as Buffer;
    expect(bytes).toHaveLength(4001 * 4);
    expect(bytes.readFloatLE(0)).toBeCloseTo(14.66233, 5);
  });

  it('sent twice changes nothing, and another one under its id is refused', async () => {
    const id = randomUUID();
    const first = await kept(rippleFile('o4_ct_unbal_50hz'), { id });
    expect(await kept(rippleFile('o4_ct_unbal_50hz'), { id })).toEqual(first);
    expect(problem(await send(rippleFile('o2_ct_60hz'), { id }).expect(409)).code).toBe('waveform-id-used');
    expect(problem(await send(rippleFile('o4_ct_unbal_50hz'), { id, unit: 2 }).expect(409)).code).toBe(
      'waveform-id-used',
    );
    expect(await list()).toHaveLength(1);
    expect(filesLeft()).toBe(2);
    expect(namedFiles()).toBe(2);
  });

  it('has the channel that is asked for', async () => {
    const rows = madeFile({})
      .split('\n')
      .map((row, at) => (at === 0 ? 'time_s,A,B' : `${row},${at % 2}`));
    const { record } = await kept(rows.join('\n'), { query: { channel: 'B' } });
    expect(record).toMatchObject({ columns: ['A', 'B'], channel: 'B' });
    expect(record.analysis.max).toBe(1);
  });
});

describe('a file that is no waveform', () => {
  it.each([
    ['a text', 'Dear all,\nnothing here.\n', 'The file has no rows of numbers.'],
    ['one column', '1\n2\n3\n', 'The file has one column of numbers.'],
    ['NaN', '0,1\n1,NaN\n2,3\n', 'Row 2: “NaN” stands where the voltage should be.'],
    ['time going backwards', '0,1\n2,1\n1,1\n', 'Row 3: time goes backwards'],
    ['nothing', '', 'The file is empty.'],
  ])('is refused with its reason, and nothing of it is kept: %s', async (_name, content, words) => {
    const { code, errors } = problem(await send(content).expect(422));
    expect(code).toBe('waveform-refused');
    expect(errors).toEqual([{ path: ['file'], message: expect.stringContaining(words) as string }]);
    expect(await list()).toEqual([]);
    expect(filesLeft()).toBe(0);
  });

  it('is refused when it is larger than 150 MB', async () => {
    const piece = Buffer.alloc(200_000_000, '0,1\n');
    const answer = await send(piece).expect(413);
    expect(problem(answer)).toMatchObject({ code: 'too-large', title: 'The file is larger than 150 MB.' });
    expect(filesLeft()).toBe(0);
  }, 60_000);

  it('is refused for a unit or a characteristic that there is not', async () => {
    const file = rippleFile('o4_ct_unbal_50hz');
    expect(problem(await send(file, { unit: 99 }).expect(422)).errors?.[0]?.path).toEqual(['unit']);
    const other = await send(file, { query: { characteristicKey: 'none' } }).expect(422);
    expect(problem(other).errors?.[0]?.path).toEqual(['characteristicKey']);
    expect(problem(await send(file, { query: { channel: 'CH9' } }).expect(422)).errors?.[0]?.message).toContain(
      '“volts”',
    );
  });

  it('is refused when the lot is not at the bench', async () => {
    await site.as('quality').get(`/api/lots/${lot.id}/waveforms`).expect(200);
    for (const unit of [1, 2])
      for (const [key, text] of [
        ['v_loaded', '15'],
        ['ripple_pp', '1'],
        ['warmth', '30'],
      ] as const)
        await keep(site, lot, typedReading(unit, key, text, { rangeId: null, question: null })).expect(200);
    await submit(site, await lotNow(site, lot)).expect(200);
    expect(problem(await send(rippleFile('o4_ct_unbal_50hz')).expect(409)).code).toBe('lot-not-at-bench');
    expect(filesLeft()).toBe(0);
  });
});

describe('a reading from a waveform', () => {
  const take = (key: string, waveformId: string, unit = 1) =>
    keep(site, lot, {
      ...typedReading(unit, key, ''),
      entry: { kind: 'waveform', waveformId },
      rangeId: null,
      question: null,
    });

  it('has the waveform’s value and is linked to it', async () => {
    const { id, record } = await kept(rippleFile('o4_ct_unbal_50hz'));
    await take('ripple_pp', id).expect(200);
    await take('v_loaded', id).expect(200);
    const bench = (await site.as('inspector').get(`/api/lots/${lot.id}/bench`).expect(200)).body as Bench;
    const { readings } = bench;
    expect(readings).toMatchObject([
      { characteristicKey: 'ripple_pp', value: record.analysis.peakToPeak, waveformId: id },
      { characteristicKey: 'v_loaded', value: record.analysis.mean, waveformId: id },
    ]);
    expect((await list())[0]?.readingIds).toHaveLength(2);
  });

  it('is refused of another unit, of what it does not show, and of one that is withdrawn', async () => {
    const { id } = await kept(rippleFile('o4_ct_unbal_50hz'));
    expect(problem(await take('ripple_pp', id, 2).expect(422)).errors?.[0]?.message).toContain('not of this unit');
    expect(problem(await take('warmth', id).expect(422)).errors?.[0]?.message).toContain('does not give warmth');
    await site
      .as('inspector')
      .post(`/api/waveforms/${id}/withdrawal`)
      .set('if-match', '"1"')
      .send({ reason: 'Wrong unit.' })
      .expect(200);
    await take('ripple_pp', id).expect(422);
    expect((await list())[0]?.withdrawn).toMatchObject({ by: site.people.inspector.name, reason: 'Wrong unit.' });
  });

  it('keeps its waveform from being withdrawn, and its peaks from being moved', async () => {
    const { id } = await kept(rippleFile('o4_ct_unbal_50hz'));
    await take('ripple_pp', id).expect(200);
    const withdrawal = site.as('inspector').post(`/api/waveforms/${id}/withdrawal`).set('if-match', '"1"');
    expect(problem(await withdrawal.send({ reason: 'Wrong unit.' }).expect(409)).code).toBe('waveform-in-use');
    const peaks = site.as('inspector').put(`/api/waveforms/${id}/peaks`).set('if-match', '"1"');
    expect(problem(await peaks.send({ indices: [1, 2] }).expect(409)).code).toBe('waveform-in-use');
  });
});

describe('peaks that a person moved', () => {
  const move = (id: string, indices: number[], version = 1) =>
    site.as('inspector').put(`/api/waveforms/${id}/peaks`).set('if-match', `"${version}"`).send({ indices });

  it('change what is found, with who and when, and go on record', async () => {
    const waveform = await kept(rippleFile('o4_ct_unbal_50hz'));
    const odd = waveform.record.analysis.peaks.filter(({ family }) => family === 'odd').map(({ index }) => index);
    const moved = (await move(waveform.id, odd).expect(200)).body as Waveform;
    expect(moved.findings.map(({ kind }) => kind)).toEqual(['one-half-open']);
    expect(moved.record.moved).toMatchObject({ by: site.people.inspector.name });
    expect(moved.record.analysis.peakToPeak).toBe(waveform.record.analysis.peakToPeak);
    expect(moved.version).toBe(2);
    expect(lastEntry()).toMatchObject({ action: 'peaks moved', subject: 'waveform' });
    expect(problem(await move(waveform.id, odd, 1).expect(412)).code).toBe('changed-meanwhile');
  });

  it('lie in the waveform, each at its own place', async () => {
    const { id } = await kept(rippleFile('o4_ct_unbal_50hz'));
    expect(problem(await move(id, [1, 4001]).expect(422)).errors?.[0]?.message).toBe('The waveform has 4001 samples.');
    expect(problem(await move(id, [7, 7]).expect(422)).errors?.[0]?.message).toBe('Two peaks stand at the same place.');
  });
});

describe('a rack', () => {
  it('sends a waveform under an id of its own, once', async () => {
    const rack = addTestRack(site, { name: 'North', partIds: [partId] });
    const put = () =>
      rack.agent
        .put(`/api/rack/lots/${lot.number}/waveforms/w-17`)
        .query({ fileName: 'w-17.csv', unit: 2 })
        .set('content-type', 'text/csv')
        .send(rippleFile('o4_ct_unbal_50hz'));
    const first = (await put().expect(200)).body as { id: string; kept: boolean };
    expect(first).toMatchObject({ kept: true, samples: 4001 });
    expect((await put().expect(200)).body).toEqual({ ...first, kept: false });
    expect(await list()).toMatchObject([{ id: first.id, unit: 2, rack: 'North', uploadedBy: null }]);
    expect(lastEntry()).toMatchObject({ actor: 'Rack North', subject: 'waveform' });
    const other = addTestRack(site, { name: 'South' });
    await other.agent
      .put(`/api/rack/lots/${lot.number}/waveforms/w-1`)
      .query({ fileName: 'a', unit: 1 })
      .send('x')
      .expect(403);
  });
});
