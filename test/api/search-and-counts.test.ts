import { certificates } from '#db/schema/certificates';
import { nonconformances } from '#db/schema/nonconformances';
import { type CertificateData } from '#shared/papers/certificate-data';
import { type Hit } from '#shared/contract/counts';
import { type Role } from '#shared/contract/roles';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { buildLot, buildPart, buildPlan, buildSupplier } from '../support/builders';
import { addTestPerson } from '../support/test-people';
import { testSite, type TestSite } from '../support/test-site';

let site: TestSite;
beforeEach(async () => {
  site = await testSite();
});
afterEach(() => site.close());

/** One released lot with its certificate and one on hold with its nonconformance, of one part and supplier. */
function fill() {
  const { db, people } = site;
  const partId = buildPart(db).id;
  const supplierId = buildSupplier(db).id;
  const { revisionId } = buildPlan(db, { partId, authorId: people.quality.id });
  const of = { partId, supplierId, bookedById: people.receiving.id };
  const drawn = { revisionId, severity: 'normal', seed: 1, drawnAt: '2026-03-02T08:00:00.000Z' } as const;
  const decided = { ...drawn, decidedAt: '2026-03-03T08:00:00.000Z' } as const;
  buildLot(db, { ...of, number: 'L-26-0001', deliveryNumber: 'D-77_1' });
  buildLot(db, { ...of, ...drawn, number: 'L-26-0002', status: 'drawn' });
  buildLot(db, { ...of, ...drawn, number: 'L-26-0003', status: 'measuring' });
  buildLot(db, { ...of, ...drawn, number: 'L-26-0004', status: 'submitted' });
  const good = buildLot(db, { ...of, ...decided, number: 'L-26-0005', status: 'released', verdict: 'accepted' });
  const old = { ...decided, decidedAt: '2026-01-03T08:00:00.000Z' };
  buildLot(db, { ...of, ...old, number: 'L-26-0006', status: 'released', verdict: 'accepted' });
  const bad = buildLot(db, { ...of, ...decided, number: 'L-26-0007', status: 'on-hold', verdict: 'rejected' });
  const by = { issuedAt: '2026-03-03T08:00:00.000Z', issuedById: people.quality.id };
  const paper = { data: {} as CertificateData, dataDigest: '', unitsReleased: 400, ...by };
  db.insert(certificates)
    .values({ number: 'CC-26-0001', lotId: good.id, ...paper })
    .run();
  const opened = { openedAt: '2026-03-03T08:00:00.000Z', openedById: people.quality.id };
  const what = { status: 'open' as const, summary: '', failures: [], containment: '' };
  db.insert(nonconformances)
    .values({ number: 'NC-26-001', lotId: bad.id, ...what, ...opened })
    .run();
}

async function find(who: Role, text: string): Promise<string[]> {
  const answer = await site.as(who).get('/api/search').query({ text }).expect(200);
  return (answer.body as { items: Hit[] }).items.map(({ kind, title }) => `${kind} ${title}`);
}

describe('the search', () => {
  it('finds by number or name what the caller may read', async () => {
    fill();
    expect(await find('quality', '26-000')).toHaveLength(8);
    expect(await find('quality', 'cc-26')).toEqual(['certificate CC-26-0001']);
    expect(await find('quality', 'kestrin')).toEqual(['supplier Kestrin Power']);
    expect(await find('quality', 'hc-24')).toEqual(['part HC-2402']);
    expect(await find('receiving', 'C-26')).toEqual(['nonconformance NC-26-001']);
    expect(await find('admin', '26')).toEqual([]);
    expect(await find('admin', 'hc')).toEqual(['part HC-2402']);
  });

  it('shows receiving the nonconformances of the lots it booked in', async () => {
    fill();
    const other = { name: 'Rolf Other', email: 'other@hollowmere.example', roles: ['receiving'] } as const;
    const agent = site.as(await addTestPerson(site.db, other));
    expect((await agent.get('/api/search?text=NC-26')).body).toEqual({ items: [] });
    expect((await agent.get('/api/record-counts')).body).toMatchObject({ openNonconformances: 0 });
    expect((await site.as('receiving').get('/api/record-counts')).body).toMatchObject({ openNonconformances: 1 });
  });

  it('takes per cent and underscore as letters', async () => {
    fill();
    expect(await find('quality', '%')).toEqual([]);
    expect(await find('quality', '77_')).toEqual(['lot L-26-0001']);
    expect(await find('quality', '7_1')).toEqual(['lot L-26-0001']);
    expect(await find('quality', 'L_26')).toEqual([]);
    expect(await find('quality', '\\')).toEqual([]);
  });

  it('puts what begins with the text first, and shows twelve at most', async () => {
    for (let index = 10; index < 30; index += 1) buildPart(site.db, { number: `HC-${index}`, name: 'Adapter' });
    buildPart(site.db, { number: 'ZZ-1', name: 'Spare for HC-1' });
    buildSupplier(site.db, { code: 'HCX', name: 'Baltree Electronics' });
    const found = await find('quality', 'HC-1');
    expect(found).toHaveLength(11);
    expect(found.at(-1)).toBe('part ZZ-1');
    expect(await find('quality', 'HC')).toHaveLength(12);
  });
});

describe('the counts', () => {
  it('tell how many lots stand at each station, released ones for thirty days', async () => {
    fill();
    const answer = await site.as('receiving').get('/api/counts').expect(200);
    expect(answer.body).toEqual({
      ...{ arrivals: 1, bench: 2, decision: 1, released: 1, onHold: 1 },
      at: site.clock.now().toISOString(),
    });
  });

  it('of records leave out what the caller may not read', async () => {
    fill();
    const counted = async (who: Role) => (await site.as(who).get('/api/record-counts').expect(200)).body as unknown;
    expect(await counted('receiving')).toEqual({ plans: 1, parts: 1, suppliers: 1, openNonconformances: 1 });
    const admin = { parts: 1, suppliers: 1, instruments: 0, instrumentsDue: 0, racks: 0, people: 6 };
    expect(await counted('admin')).toEqual(admin);
    expect(await counted('auditor')).toMatchObject({ plans: 1, certificates: 1, people: 6 });
  });
});
