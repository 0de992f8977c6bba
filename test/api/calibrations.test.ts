import { auditEntries } from '#db/schema/audit';
import { messages } from '#db/schema/mail';
import { site as siteTable } from '#db/schema/site';
import { remindDue } from '#server/calibrations/remind-due';
import {
  type Calibration,
  type InstrumentCheck,
  type LotDoubt,
  type readInstrumentHistory,
  type Review,
} from '#shared/contract/calibrations';
import { type Instrument } from '#shared/contract/instruments';
import { type Lot } from '#shared/contract/lots';
import { type ProblemDetails } from '#shared/contract/problem';
import { desc } from 'drizzle-orm';
import { readdirSync } from 'node:fs';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import type * as z from 'zod';
import { keep, lotNow, planOf, submit, typedReading } from '../support/bench-acts';
import { addPlannedPart, drawnLot, measured } from '../support/bench-fixtures';
import { buildInstrument } from '../support/builders';
import { PASSWORD } from '../support/test-people';
import { testSite, type TestSite } from '../support/test-site';

type History = z.output<(typeof readInstrumentHistory)['reply']>;

let site: TestSite;
beforeEach(async () => {
  site = await testSite();
});
afterEach(() => site.close());

const problem = (answer: { body: unknown }) => answer.body as ProblemDetails;
const instrumentNow = async (id: number) =>
  (await site.as('quality').get(`/api/instruments/${id}`).expect(200)).body as Instrument;
const history = async (id: number) =>
  (await site.as('auditor').get(`/api/instruments/${id}/history`).expect(200)).body as History;
const lastEntry = () => site.db.select().from(auditEntries).orderBy(desc(auditEntries.id)).limit(1).get();

function calibration(more: object = {}) {
  return {
    calibratedOn: '2026-03-10',
    dueOn: '2027-03-10',
    laboratory: 'Weir Lane Calibration',
    certificateNumber: 'WL-1180',
    asFound: 'in-tolerance',
    adjusted: false,
    points: [{ point: '10 V DC', unit: 'V', reference: 10, found: 10.002, limit: 0.005 }],
    note: '',
    ...more,
  };
}

function calibrate(id: number, body: object, version = 1) {
  return site.as('quality').post(`/api/instruments/${id}/calibrations`).set('if-match', `"${version}"`).send(body);
}

describe('a calibration', () => {
  it('sets the day of the next one and stands in the history', async () => {
    const { id } = buildInstrument(site.db, { assetNumber: 'DM-11', calibrationDue: '2026-03-01' });
    const reply = (await calibrate(id, calibration()).expect(201)).body as { instrument: Instrument; reviewId: null };
    expect(reply.reviewId).toBeNull();
    expect(reply.instrument).toMatchObject({ calibrationDue: '2027-03-10', usable: true, version: 2 });
    expect((await history(id)).calibrations).toMatchObject([
      { certificateNumber: 'WL-1180', recordedBy: site.people.quality.name, file: null, reviewId: null },
    ]);
    expect(lastEntry()).toMatchObject({ action: 'calibrated', subject: 'instrument' });
  });

  it('that is entered late leaves the day of the next one to the newest', async () => {
    const { id } = buildInstrument(site.db);
    await calibrate(id, calibration()).expect(201);
    await calibrate(id, calibration({ calibratedOn: '2025-03-05', dueOn: '2026-03-05' }), 2).expect(201);
    expect(await instrumentNow(id)).toMatchObject({ calibrationDue: '2027-03-10' });
    expect((await history(id)).calibrations.map(({ calibratedOn }) => calibratedOn)).toEqual([
      '2026-03-10',
      '2025-03-05',
    ]);
  });

  it.each([
    ['a day to come', { calibratedOn: '2026-03-13' }, 422, ['calibratedOn']],
    ['a next one before it', { dueOn: '2026-03-10' }, 400, ['dueOn']],
    ['no laboratory', { laboratory: ' ' }, 400, ['laboratory']],
    [
      'a point beyond its limit, though in tolerance',
      { points: [{ point: '10 V', unit: 'V', reference: 10, found: 10.01, limit: 0.005 }] },
      422,
      ['points', 0, 'found'],
    ],
    [
      'a limit of nothing',
      { points: [{ point: '10 V', unit: 'V', reference: 10, found: 10, limit: 0 }] },
      400,
      ['points', 0, 'limit'],
    ],
  ])('is refused with %s', async (_name, more, status, path) => {
    const { id } = buildInstrument(site.db);
    const answer = await calibrate(id, calibration(more)).expect(status);
    expect(problem(answer).errors?.[0]?.path).toEqual(path);
    expect((await history(id)).calibrations).toEqual([]);
  });

  it('is not recorded on an instrument that was changed meanwhile', async () => {
    const { id } = buildInstrument(site.db);
    await calibrate(id, calibration()).expect(201);
    await calibrate(id, calibration(), 1).expect(412);
  });
});

describe('the certificate of a calibration', () => {
  const PDF = Buffer.from('%PDF-1.7\n1 0 obj\nendobj\n');
  async function recorded(): Promise<{ id: number; calibrationId: number }> {
    const { id } = buildInstrument(site.db);
    const { calibrationId } = (await calibrate(id, calibration()).expect(201)).body as { calibrationId: number };
    return { id, calibrationId };
  }
  const attach = (id: number, calibrationId: number, content: Buffer, fileName = 'WL-1180.pdf') =>
    site
      .as('quality')
      .put(`/api/instruments/${id}/calibrations/${calibrationId}/file`)
      .query({ fileName })
      .set('content-type', 'application/octet-stream')
      .send(content);
  const files = () => readdirSync(site.context.environment.dataFolder).filter((name) => /^[0-9a-f-]{36}/.test(name));

  it('is attached once, and read back as it was', async () => {
    const { id, calibrationId } = await recorded();
    const attached = (await attach(id, calibrationId, PDF).expect(200)).body as Calibration;
    expect(attached.file).toMatchObject({ fileName: 'WL-1180.pdf', mediaType: 'application/pdf', bytes: PDF.length });
    const back = await site.as('auditor').get(`/api/instruments/${id}/calibrations/${calibrationId}/file`).expect(200);
    expect(Buffer.from(back.body as Buffer).equals(PDF)).toBe(true);
    expect(problem(await attach(id, calibrationId, PDF).expect(409)).code).toBe('file-there-already');
    expect(files()).toHaveLength(1);
  });

  it('is a PDF or a picture, whatever it is called', async () => {
    const { id, calibrationId } = await recorded();
    const answer = await attach(id, calibrationId, Buffer.from('<script>alert(1)</script>')).expect(422);
    expect(problem(answer).errors).toEqual([{ path: ['file'], message: 'This is no PDF, PNG or JPEG file.' }]);
    expect(files()).toEqual([]);
    await site.as('quality').get(`/api/instruments/${id}/calibrations/${calibrationId}/file`).expect(404);
  });

  it('belongs to its own instrument', async () => {
    const { calibrationId } = await recorded();
    const { id: other } = buildInstrument(site.db, { assetNumber: 'MM-99' });
    await attach(other, calibrationId, PDF).expect(404);
    expect(files()).toEqual([]);
  });
});

describe('the check of a day', () => {
  const reference = { checkName: 'Reference source, 10 V', checkUnit: 'V', checkValue: 10, checkTolerance: 0.005 };
  const check = (id: number, observed: number) =>
    site.as('inspector').post(`/api/instruments/${id}/checks`).send({ observed });

  async function lotWithMeter(): Promise<{ lot: Lot; id: number }> {
    const references = addPlannedPart(
      site.db,
      site.people.quality.id,
      planOf(measured('v_loaded', 'major', { lower: 11, upper: 13 }, { instrumentKind: 'multimeter' })),
    );
    const { id } = buildInstrument(site.db, { assetNumber: 'DM-11', kind: 'multimeter', ...reference });
    return { lot: await drawnLot(site, references, 2), id };
  }
  const reading = (lot: Lot, instrumentId: number, unit = 1) =>
    keep(site, lot, typedReading(unit, 'v_loaded', '12.0', { instrumentId, rangeId: null, question: null }));

  it('is asked for before the first reading, where the site asks for it', async () => {
    const { lot, id } = await lotWithMeter();
    site.db.update(siteTable).set({ dailyChecks: true }).run();
    expect(await instrumentNow(id)).toMatchObject({ dailyCheck: 'due', usable: false });
    const refused = problem(await reading(lot, id).expect(422));
    expect(refused.errors?.[0]).toEqual({
      path: ['instrumentId'],
      message: 'Check DM-11 against Reference source, 10 V before its first reading of the day.',
    });
    expect((await check(id, 10.02).expect(201)).body as InstrumentCheck).toMatchObject({ passed: false });
    expect(problem(await reading(lot, id).expect(422)).title).toContain('did not pass');
    expect((await check(id, 10.005).expect(201)).body as InstrumentCheck).toMatchObject({
      passed: true,
      day: '2026-03-12',
    });
    await reading(lot, id).expect(200);
    site.clock.advance({ hours: 24 });
    await reading(lot, id, 2).expect(422);
    expect((await history(id)).checks.map(({ passed }) => passed)).toEqual([true, false]);
  });

  it('is not asked for by a site that does not want it, and not of an instrument without a reference', async () => {
    const { lot, id } = await lotWithMeter();
    await reading(lot, id).expect(200);
    const { id: bare } = buildInstrument(site.db, { assetNumber: 'MM-98' });
    expect(problem(await check(bare, 1).expect(409)).code).toBe('no-reference');
  });
});

describe('an instrument found out of tolerance', () => {
  const OUT = calibration({
    asFound: 'out-of-tolerance',
    adjusted: true,
    points: [{ point: '10 V DC', unit: 'V', reference: 10, found: 10.3, limit: 0.05 }],
  });
  let lot: Lot;
  let meter: number;

  beforeEach(async () => {
    const references = addPlannedPart(
      site.db,
      site.people.quality.id,
      planOf(measured('v_loaded', 'major', { lower: 11, upper: 13 }, { instrumentKind: 'multimeter' })),
    );
    meter = buildInstrument(site.db, { assetNumber: 'DM-11', kind: 'multimeter', calibrationDue: '2026-12-01' }).id;
    await calibrate(meter, calibration({ calibratedOn: '2026-02-02', dueOn: '2026-12-01' })).expect(201);
    lot = await drawnLot(site, references, 2);
    const more = { instrumentId: meter, rangeId: null, question: null };
    await keep(site, lot, typedReading(1, 'v_loaded', '12.0', more)).expect(200);
    await keep(site, lot, typedReading(2, 'v_loaded', '12.7', more)).expect(200);
    await submit(site, await lotNow(site, lot)).expect(200);
    site.clock.advance({ hours: 24 * 6 });
  });

  async function found(body: object = { ...OUT, calibratedOn: '2026-03-16' }) {
    return (await calibrate(meter, body, 2).expect(201)).body as { instrument: Instrument; reviewId: number };
  }
  const review = async (id: number) => (await site.as('auditor').get(`/api/reviews/${id}`).expect(200)).body as Review;
  const assess = (id: number, version: number, body: object) =>
    site.as('quality').put(`/api/reviews/${id}/lots/${lot.id}`).set('if-match', `"${version}"`).send(body);
  const close = (id: number, version: number) =>
    site
      .as('quality')
      .post(`/api/reviews/${id}/closure`)
      .set('if-match', `"${version}"`)
      .send({ conclusion: 'No verdict changes.' });

  it('is withdrawn, and what rests on it since the last good calibration is listed', async () => {
    const { instrument, reviewId } = await found();
    expect(instrument).toMatchObject({ status: 'withdrawn', usable: false, openReview: { number: 'IR-26-001' } });
    const opened = await review(reviewId);
    expect(opened).toMatchObject({
      doubtFrom: '2026-02-03',
      doubtTo: '2026-03-16',
      lots: 1,
      assessed: 0,
      closedAt: null,
    });
    // 12.7 V is 0.3 V from its limit, and 3 % of it are 0.38 V; 12.0 V is 1 V away.
    expect(opened.affected).toMatchObject([{ lot: { number: lot.number }, readings: 2, nearLimit: 1, effect: null }]);
    const { items } = (await site.as('auditor').get(`/api/reviews/${reviewId}/lots/${lot.id}/readings`).expect(200))
      .body as { items: { unit: number; value: number; nearLimit: boolean }[] };
    expect(items.map(({ unit, value, nearLimit }) => [unit, value, nearLimit])).toEqual([
      [1, 12, false],
      [2, 12.7, true],
    ]);
  });

  it('puts in doubt only what was read since its last good calibration', async () => {
    site.clock.advance({ hours: 24 * 4 });
    await calibrate(meter, calibration({ calibratedOn: '2026-03-20', dueOn: '2027-03-20' }), 2).expect(201);
    site.clock.advance({ hours: 24 * 4 });
    const later = (await calibrate(meter, { ...OUT, calibratedOn: '2026-03-26', dueOn: '2027-03-26' }, 3)).body as {
      reviewId: number;
    };
    expect(await review(later.reviewId)).toMatchObject({ doubtFrom: '2026-03-21', lots: 0, affected: [] });
  });

  it('keeps its lots from being released until the review has cleared them', async () => {
    const { reviewId } = await found();
    const decide = async () =>
      site
        .as('quality')
        .post(`/api/lots/${lot.id}/decision`)
        .set('if-match', `"${(await lotNow(site, lot)).version}"`)
        .send({ verdict: 'accepted', password: PASSWORD, note: '' });
    const refused = await decide();
    expect(refused.status).toBe(409);
    expect(problem(refused)).toMatchObject({ code: 'readings-in-doubt' });
    expect(problem(refused).title).toContain('IR-26-001');
    const doubts = async () =>
      (await site.as('inspector').get(`/api/lots/${lot.id}/doubts`).expect(200)).body as { items: LotDoubt[] };
    expect((await doubts()).items).toMatchObject([{ reviewId, number: 'IR-26-001', effect: null }]);
    await assess(reviewId, 1, { effect: 'measure-again', note: 'Measured again on DM-12.' }).expect(200);
    expect((await decide()).status).toBe(409);
    expect((await doubts()).items).toMatchObject([{ effect: 'measure-again', note: 'Measured again on DM-12.' }]);
    await assess(reviewId, 2, { effect: 'none', note: '' }).expect(200);
    expect((await doubts()).items).toEqual([]);
    expect((await decide()).status).toBe(200);
    expect((await review(reviewId)).affected[0]?.certificates).toMatchObject([{ number: 'CC-26-0001' }]);
  });

  it('comes back into service when its review is closed, which needs every lot assessed', async () => {
    const { reviewId } = await found();
    const back = async () => {
      const now = await instrumentNow(meter);
      const { assetNumber, kind, description, serialNumber, place, dailyReference } = now;
      const body = {
        assetNumber,
        kind,
        description,
        serialNumber,
        place,
        dailyReference,
        status: 'in-service',
        ranges: [],
      };
      return site.as('quality').put(`/api/instruments/${meter}`).set('if-match', `"${now.version}"`).send(body);
    };
    expect(problem(await close(reviewId, 1).expect(409)).title).toContain('One lot is not assessed yet');
    expect(problem(await back()).code).toBe('review-open');
    expect(problem(await assess(reviewId, 1, { effect: 'recall', note: '' }).expect(400)).errors?.[0]?.path).toEqual([
      'note',
    ]);
    await assess(reviewId, 1, { effect: 'none', note: 'Far from every limit.' }).expect(200);
    await assess(reviewId, 1, { effect: 'none', note: 'Twice.' }).expect(412);
    const closed = (await close(reviewId, 2).expect(200)).body as Review;
    expect(closed).toMatchObject({ closedBy: site.people.quality.name, conclusion: 'No verdict changes.' });
    expect(problem(await assess(reviewId, 3, { effect: 'none', note: '' }).expect(409)).code).toBe('review-closed');
    expect((await back()).status).toBe(200);
    expect((await instrumentNow(meter)).usable).toBe(true);
  });

  it('puts all since in doubt where it was not adjusted, and everything before where no good calibration is known', async () => {
    const { id } = buildInstrument(site.db, { assetNumber: 'MM-97' });
    const { reviewId } = (await calibrate(id, { ...OUT, calibratedOn: '2026-03-10', adjusted: false }).expect(201))
      .body as { reviewId: number };
    expect(await review(reviewId)).toMatchObject({ doubtFrom: null, doubtTo: '2026-03-18' });
  });
});

describe('reminders of calibrations', () => {
  const sent = () => site.db.select().from(messages).all();

  it('go to quality once for each step: a month before, a week before, and when it has passed', () => {
    buildInstrument(site.db, { assetNumber: 'DM-11', calibrationDue: '2026-04-11' });
    buildInstrument(site.db, { assetNumber: 'DM-12', calibrationDue: '2026-06-01' });
    buildInstrument(site.db, { assetNumber: 'DM-13', calibrationDue: '2026-03-01', status: 'withdrawn' });
    const days: number[] = [];
    for (let day = 0; day < 40; day += 1) {
      if (remindDue(site.context) > 0) days.push(day);
      expect(remindDue(site.context)).toBe(0);
      site.clock.advance({ hours: 24 });
    }
    expect(days).toEqual([0, 23, 31]);
    expect(sent()).toHaveLength(3);
    const [first, , last] = sent();
    expect(first).toMatchObject({
      event: 'calibration-due',
      subject: 'One instrument due for calibration',
      recipients: [site.people.quality.email],
    });
    expect(first?.text).toContain('Due: 2026-04-11, in 30\u00a0days');
    expect(last?.subject).toBe('One instrument past the calibration date');
    expect(last?.html).toContain('DM-11');
    expect(last?.html).not.toContain('DM-12');
  });

  it('come again for the next due date', async () => {
    const { id } = buildInstrument(site.db, { assetNumber: 'DM-11', calibrationDue: '2026-03-13' });
    expect(remindDue(site.context)).toBe(1);
    await calibrate(id, calibration({ calibratedOn: '2026-03-12', dueOn: '2026-04-01' })).expect(201);
    expect(remindDue(site.context)).toBe(1);
    expect(sent().map(({ text }) => /Due: (\S+),/.exec(text)?.[1])).toEqual(['2026-03-13', '2026-04-01']);
  });
});
