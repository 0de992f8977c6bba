import { type Instrument } from '#shared/contract/instruments';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { buildInstrument } from '../support/builders';
import { type Agent, testSite, type TestSite } from '../support/test-site';

const BODY = {
  assetNumber: 'OS-03',
  kind: 'oscilloscope',
  description: 'Two channels, 100 MHz',
  serialNumber: 'A 17',
  place: 'Bench 2',
  calibrationDue: '2026-03-12',
  status: 'in-service',
};

let site: TestSite;
let quality: Agent;
beforeEach(async () => {
  site = await testSite();
  quality = site.as('quality');
});
afterEach(() => site.close());

async function read(id: number): Promise<Instrument> {
  return (await quality.get(`/api/instruments/${id}`).expect(200)).body as Instrument;
}

describe('instruments', () => {
  it('may be used on the day their calibration is due, and not on the next', async () => {
    const { id } = (await quality.post('/api/instruments').send(BODY).expect(201)).body as Instrument;
    expect(await read(id)).toMatchObject({ ...BODY, usable: true, daysLeft: 0 });
    site.clock.advance({ hours: 15, minutes: 59 });
    quality = site.as('quality');
    expect(await read(id)).toMatchObject({ usable: true, daysLeft: 0 });
    site.clock.advance({ minutes: 1 });
    expect(await read(id)).toMatchObject({ usable: false, daysLeft: -1 });
  });

  it('that are withdrawn may not be used', async () => {
    const { id } = buildInstrument(site.db, { status: 'withdrawn' });
    expect(await read(id)).toMatchObject({ usable: false, daysLeft: 202 });
  });

  it('are listed by the calibration that is due next', async () => {
    buildInstrument(site.db, { assetNumber: 'MM-01', calibrationDue: '2026-09-30' });
    buildInstrument(site.db, { assetNumber: 'MM-02', calibrationDue: '2026-04-01' });
    buildInstrument(site.db, { assetNumber: 'MM-03', calibrationDue: '2026-02-01' });
    const { items } = (await quality.get('/api/instruments').expect(200)).body as { items: Instrument[] };
    expect(items.map(({ assetNumber }) => assetNumber)).toEqual(['MM-03', 'MM-02', 'MM-01']);
    expect((await quality.get('/api/record-counts')).body).toMatchObject({ instruments: 3, instrumentsDue: 2 });
  });

  it('have an asset number of their own, and are not overwritten unseen', async () => {
    buildInstrument(site.db, { assetNumber: 'MM-01' });
    const { id } = buildInstrument(site.db, { assetNumber: 'MM-02' });
    const put = (version: number, assetNumber: string) =>
      quality
        .put(`/api/instruments/${id}`)
        .set('if-match', `"${version}"`)
        .send({ ...BODY, assetNumber });
    const answer = await put(1, 'MM-01').expect(422);
    expect(answer.body).toMatchObject({ errors: [{ path: ['assetNumber'], message: 'This number is taken.' }] });
    await put(1, 'MM-02').expect(200);
    await put(1, 'MM-02').expect(412);
  });

  it('are due on a day that exists', async () => {
    const answer = await quality
      .post('/api/instruments')
      .send({ ...BODY, calibrationDue: '2026-02-30' })
      .expect(400);
    expect(answer.body).toMatchObject({ errors: [{ path: ['calibrationDue'] }] });
  });
});
