import { certificates } from '#db/schema/certificates';
import { messages } from '#db/schema/mail';
import { type Certificate } from '#shared/contract/certificates';
import { type Lot } from '#shared/contract/lots';
import { type Nonconformance } from '#shared/contract/nonconformances';
import { type ProblemDetails } from '#shared/contract/problem';
import { createHash, randomUUID } from 'node:crypto';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { addPlannedPart, booking, drawnLot } from '../support/bench-fixtures';
import { referenceLot } from '../support/reference-lot';
import { PASSWORD } from '../support/test-people';
import { testSite, type TestSite } from '../support/test-site';

let site: TestSite;
beforeEach(async () => {
  site = await testSite();
});
afterEach(() => {
  site.close();
});

const edit = (lot: Lot) => `"${lot.version}"`;
const readLot = async (id: number) => (await site.as('quality').get(`/api/lots/${id}`).expect(200)).body as Lot;

async function submitted(name: 'lot-good' | 'lot-low-capacitance' | 'lot-bad-tap'): Promise<Lot> {
  const reference = referenceLot(name);
  const references = addPlannedPart(site.db, site.people.quality.id, reference.plan);
  const lot = await drawnLot(site, references, reference.lotSize);
  const file = { fileName: 'rack.csv', text: reference.csv, instrumentIds: [] };
  await site.as('inspector').post(`/api/lots/${lot.id}/rack-file`).send(file).expect(201);
  await site.as('inspector').post(`/api/lots/${lot.id}/submission`).set('if-match', edit(lot)).expect(200);
  return readLot(lot.id);
}

function sign(lot: Lot, verdict: 'accepted' | 'rejected', more: { password?: string; version?: number } = {}) {
  return site
    .as('quality')
    .post(`/api/lots/${lot.id}/decision`)
    .set('if-match', `"${more.version ?? lot.version}"`)
    .send({ verdict, password: more.password ?? PASSWORD, note: '' });
}

describe('an accepted lot', () => {
  it('is released with a numbered certificate, kept as a PDF with its SHA-256', async () => {
    const lot = await submitted('lot-good');
    const { body: released } = await sign(lot, 'accepted').expect(200);
    expect(released).toMatchObject({ status: 'released', verdict: 'accepted', certificate: { number: 'CC-26-0001' } });
    const { certificate } = released as Lot;
    const { body: shown } = await site.as('auditor').get(`/api/certificates/${certificate?.id}`).expect(200);
    expect(shown).toMatchObject({ status: 'valid', unitsReleased: 1000 });
    const file = await site.as('auditor').get(`/api/certificates/${certificate?.id}/file`).buffer().expect(200);
    const bytes = file.body as Buffer;
    expect(file.type).toBe('application/pdf');
    expect(bytes.subarray(0, 5).toString()).toBe('%PDF-');
    expect(createHash('sha256').update(bytes).digest('hex')).toBe((shown as Certificate).sha256);
  });

  it('states in its data what the sample showed', async () => {
    await sign(await submitted('lot-good'), 'accepted').expect(200);
    const data = site.db.select().from(certificates).get()?.data;
    expect(data).toMatchObject({
      sampleSize: 80,
      unitsRemoved: 0,
      unitsReleased: 1000,
      plan: { number: 'P-001', revision: 1, level: 'II', severity: 'normal' },
      inspector: { name: 'Ines Benchley', stampNumber: '14' },
      quality: { name: 'Quill Averard', stampNumber: '7' },
    });
    expect(data?.results.map(({ name, n, found }) => [name, n, found])).toContainEqual(['ripple pp', 80, 0]);
  });

  it('can be neither altered nor removed, not even in the database', async () => {
    await sign(await submitted('lot-good'), 'accepted').expect(200);
    const client = site.db.$client;
    for (const table of ['certificates', 'certificate_files', 'certificate_statuses', 'audit_entries'])
      expect(() => client.exec(`delete from ${table}`)).toThrow(/append-only|never/);
    expect(() => client.exec(`update certificates set number = 'CC-26-9999'`)).toThrow(/never altered/);
    expect(() => client.exec(`update audit_entries set actor = 'Nobody'`)).toThrow(/append-only/);
    expect(() => client.exec('delete from readings')).toThrow(/never removed/);
    expect(() => client.exec('update readings set value = 1')).toThrow(/may be withdrawn/);
  });

  it('tells nobody by mail', async () => {
    await sign(await submitted('lot-good'), 'accepted').expect(200);
    expect(site.db.select().from(messages).all()).toEqual([]);
  });
});

describe('a rejected lot', () => {
  it('goes on hold with a nonconformance that names the failing readings', async () => {
    const lot = await submitted('lot-low-capacitance');
    const { body: held } = await sign(lot, 'rejected').expect(200);
    expect(held).toMatchObject({ status: 'on-hold', verdict: 'rejected', certificate: null });
    const { nonconformance } = held as Lot;
    const { body: shown } = await site.as('engineering').get(`/api/nonconformances/${nonconformance?.id}`).expect(200);
    const { failures, containment } = shown as Nonconformance;
    expect(failures.map(({ name, readings }) => [name, readings.map(({ unit }) => unit)])).toEqual([
      ['ripple pp', [6, 7, 8, 25, 36, 76]],
    ]);
    expect(containment).toBe('All 1\u202f000 units are on hold at Dock 2.');
  });

  it('puts the notice into the outbox with the lot, what failed and the readings concerned', async () => {
    await sign(await submitted('lot-low-capacitance'), 'rejected').expect(200);
    const [message, ...others] = site.db.select().from(messages).all();
    expect(others).toEqual([]);
    expect(message?.recipients).toEqual(['engineering@hollowmere.example']);
    for (const word of ['L-26-0001', 'NC-26-', 'ripple pp', '1.80']) expect(message?.text).toContain(word);
    // The ripple of unit 6 in the reference file.
    expect(message?.text).toMatch(/\b6\b.*\d\.\d{2}/s);
  });

  it('is not released, whatever the signer believes', async () => {
    const { body: refused } = await sign(await submitted('lot-low-capacitance'), 'accepted').expect(409);
    expect((refused as ProblemDetails).code).toBe('verdict-changed');
  });
});

describe('signing', () => {
  it('asks for the right password, beside its field', async () => {
    const lot = await submitted('lot-good');
    const { body: refused } = await sign(lot, 'accepted', { password: 'guess' }).expect(422);
    expect((refused as ProblemDetails).errors).toEqual([{ path: ['password'], message: 'This is not your password.' }]);
    expect((await readLot(lot.id)).status).toBe('submitted');
  });

  it('is closed for a while after too many wrong passwords', async () => {
    const lot = await submitted('lot-good');
    for (let attempt = 1; attempt <= site.context.environment.signInAttempts; attempt += 1)
      await sign(lot, 'accepted', { password: 'guess' }).expect(422);
    const { body: refused } = await sign(lot, 'accepted').expect(429);
    expect((refused as ProblemDetails).code).toBe('too-many-attempts');
    site.clock.advance({ minutes: 16 });
    await sign(lot, 'accepted').expect(200);
  });

  it('is refused for a lot that changed since it was opened', async () => {
    const lot = await submitted('lot-good');
    await sign(lot, 'accepted', { version: lot.version - 1 }).expect(412);
  });

  it('happens once: of two at the same moment one is told that it came too late', async () => {
    const lot = await submitted('lot-good');
    const answers = await Promise.all([sign(lot, 'accepted'), sign(lot, 'accepted')]);
    expect(answers.map(({ status }) => status).sort()).toEqual([200, 412]);
    expect(site.db.select().from(certificates).all()).toHaveLength(1);
  });

  it('needs somebody else than the person who took all readings, unless a rack took them', async () => {
    const { plan } = referenceLot('lot-good');
    const onlyLoaded = { ...plan, characteristics: plan.characteristics.filter(({ key }) => key === 'v_loaded') };
    const references = addPlannedPart(site.db, site.people.quality.id, onlyLoaded);
    const lot = await drawnLot(site, references, 3);
    const quality = site.as('quality');
    for (let unit = 1; unit <= 3; unit += 1)
      await quality
        .put(`/api/lots/${lot.id}/readings/${randomUUID()}`)
        .send({
          unit,
          characteristicKey: 'v_loaded',
          entry: { kind: 'direct', text: '12.1', decimalComma: false },
          instrumentId: null,
          note: '',
          repeat: null,
          takenAt: '2026-03-12T08:00:00.000Z',
        })
        .expect(200);
    await quality.post(`/api/lots/${lot.id}/submission`).set('if-match', edit(lot)).expect(200);
    const { body: refused } = await sign(await readLot(lot.id), 'accepted').expect(403);
    expect((refused as ProblemDetails).code).toBe('own-readings');
  });
});

describe('a lot of which no unit conforms', () => {
  it('is not released although the acceptance number allows it', async () => {
    // One unit at AQL 10, code A: plan Ac 1, Re 2 on the whole lot of one.
    const { plan } = referenceLot('lot-good');
    const references = addPlannedPart(site.db, site.people.quality.id, {
      ...plan,
      classAqls: [{ class: 'major', aql: '10' }],
      characteristics: plan.characteristics.filter(({ key }) => key === 'v_loaded'),
    });
    const lot = await drawnLot(site, references, 1);
    expect(lot.sampling?.groups[0]).toMatchObject({ wholeLot: true, acceptance: 1, rejection: 2 });
    const file = { fileName: 'rack.csv', text: 'unit,v_loaded\n1,99\n', instrumentIds: [] };
    await site.as('inspector').post(`/api/lots/${lot.id}/rack-file`).send(file).expect(201);
    await site.as('inspector').post(`/api/lots/${lot.id}/submission`).set('if-match', edit(lot)).expect(200);
    const { body: refused } = await sign(await readLot(lot.id), 'accepted').expect(409);
    expect((refused as ProblemDetails).code).toBe('nothing-to-release');
  });
});

describe('a lot held by quality although acceptable', () => {
  it('waits on hold with the reason, then for its decision again', async () => {
    const lot = await submitted('lot-good');
    const hold = { password: PASSWORD, reason: 'Cartons were wet' };
    const { body: held } = await site
      .as('quality')
      .post(`/api/lots/${lot.id}/hold`)
      .set('if-match', edit(lot))
      .send(hold)
      .expect(200);
    expect(held).toMatchObject({ status: 'on-hold', verdict: null, holdReason: 'Cartons were wet' });
    await site
      .as('quality')
      .post(`/api/lots/${lot.id}/hold/end`)
      .set('if-match', edit(held as Lot))
      .send({ reason: 'Dried and checked' })
      .expect(200);
    await sign(await readLot(lot.id), 'accepted').expect(200);
  });
});

describe('the yields', () => {
  it('are summed from what was decided, by month, supplier and part', async () => {
    await sign(await submitted('lot-low-capacitance'), 'rejected').expect(200);
    const { body: yields } = await site.as('quality').get('/api/yields').expect(200);
    const counts = {
      lotsDecided: 1,
      lotsAccepted: 0,
      lotsRejected: 1,
      unitsInspected: 80,
      unitsConforming: 74,
      unitsReleased: 0,
    };
    expect(yields).toMatchObject({
      months: [{ key: '2026-03', ...counts }],
      suppliers: [{ title: 'Kestrin Power', ...counts }],
      parts: [{ title: 'WA-12-500', ...counts }],
      total: counts,
    });
    const { body: none } = await site.as('quality').get('/api/yields?from=2026-04-01').expect(200);
    expect(none).toMatchObject({ months: [], total: { lotsDecided: 0, unitsInspected: 0 } });
  });
});

describe('numbers of papers', () => {
  it('have no gap where a decision failed', async () => {
    const lot = await submitted('lot-good');
    await sign(lot, 'rejected').expect(409);
    const { body: released } = await sign(lot, 'accepted').expect(200);
    expect((released as Lot).certificate?.number).toBe('CC-26-0001');
  });
});

describe('booking in', () => {
  it('is corrected and cancelled before the draw only', async () => {
    const { plan } = referenceLot('lot-good');
    const references = addPlannedPart(site.db, site.people.quality.id, plan);
    const receiving = site.as('receiving');
    const { body: booked } = await receiving.post('/api/lots').send(booking(references, 400)).expect(201);
    const lot = booked as Lot;
    expect(lot.sampling).toMatchObject({ provisional: true, sampleSize: 50 });
    const { body: corrected } = await receiving
      .put(`/api/lots/${lot.id}`)
      .set('if-match', edit(lot))
      .send(booking(references, 396, { statedQuantity: 400 }))
      .expect(200);
    expect(corrected).toMatchObject({ countedQuantity: 396, statedQuantity: 400, version: 2 });
    const { body: drawn } = await site
      .as('inspector')
      .post(`/api/lots/${lot.id}/sample`)
      .set('if-match', '"2"')
      .expect(201);
    const late = receiving
      .post(`/api/lots/${lot.id}/cancellation`)
      .set('if-match', edit(drawn as Lot))
      .send({ reason: 'Wrong lot' });
    expect(((await late.expect(409)).body as ProblemDetails).code).toBe('lot-drawn-already');
  });

  it('names each fault with its field', async () => {
    const { plan } = referenceLot('lot-good');
    const references = addPlannedPart(site.db, site.people.quality.id, plan);
    const receiving = site.as('receiving');
    const { body: shape } = await receiving
      .post('/api/lots')
      .send(booking(references, 3, { cartons: 5 }))
      .expect(400);
    expect((shape as ProblemDetails).errors?.map(({ path }) => path)).toEqual([['cartons']]);
    const { body: rule } = await receiving
      .post('/api/lots')
      .send(booking({ partId: 99, supplierId: 98 }, 3))
      .expect(422);
    expect((rule as ProblemDetails).errors?.map(({ path }) => path)).toEqual([['partId'], ['supplierId']]);
  });
});
