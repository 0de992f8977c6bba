import { nonconformances } from '#db/schema/nonconformances';
import { type Lot } from '#shared/contract/lots';
import { type Part } from '#shared/contract/parts';
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

/** A rejected lot that somebody of receiving has booked in. */
function rejectedLot(number: string, bookedById: number, references: { partId: number; supplierId: number }): number {
  const { id } = buildLot(site.db, { number, bookedById, ...references });
  site.db
    .insert(nonconformances)
    .values({
      number: `NC-${number}`,
      lotId: id,
      status: 'open',
      summary: 'Rejected: 3 major nonconforming units.',
      failures: [],
      containment: '',
      openedAt: '2026-03-12T08:00:00.000Z',
      openedById: site.people.quality.id,
    })
    .run();
  return id;
}

describe('the nonconformance of a lot', () => {
  it('is named to receiving only where they booked the lot in', async () => {
    const second = { name: 'Dora Landing', email: 'second@hollowmere.example', roles: ['receiving'] } as const;
    const other = await addTestPerson(site.db, second);
    const references = { partId: buildPart(site.db).id, supplierId: buildSupplier(site.db).id };
    const own = rejectedLot('L-1', site.people.receiving.id, references);
    const others = rejectedLot('L-2', other.id, references);
    const seen = async (who: Role, id: number) =>
      ((await site.as(who).get(`/api/lots/${id}`).expect(200)).body as Lot).nonconformance?.number ?? null;
    expect(await seen('receiving', own)).toBe('NC-L-1');
    expect(await seen('receiving', others)).toBeNull();
    for (const who of ['inspector', 'quality', 'engineering', 'auditor'] as const)
      expect(await seen(who, others), who).toBe('NC-L-2');
  });
});

describe('a plan that is still a draft', () => {
  it('is not named on its part to whoever works to plans in force', async () => {
    const { id: partId } = buildPart(site.db);
    buildPlan(site.db, { partId, authorId: site.people.quality.id, status: 'draft' });
    const seen = async (who: Role) => {
      const { body: one } = await site.as(who).get(`/api/parts/${partId}`).expect(200);
      const { body: all } = await site.as(who).get('/api/parts').expect(200);
      return [(one as Part).plan?.number, (all as { items: Part[] }).items[0]?.plan?.number];
    };
    for (const who of ['receiving', 'inspector', 'admin'] as const)
      expect(await seen(who), who).toEqual([undefined, undefined]);
    for (const who of ['quality', 'engineering', 'auditor'] as const)
      expect(await seen(who), who).toEqual(['P-001', 'P-001']);
  });
});
