import { auditEntries } from '#db/schema/audit';
import { record } from '#server/audit/record';
import { type AuditEntry } from '#shared/contract/audit';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { addPlannedPart, drawnLot } from '../support/bench-fixtures';
import { referenceLot } from '../support/reference-lot';
import { testSite, type TestSite } from '../support/test-site';

let site: TestSite;
beforeEach(async () => {
  site = await testSite();
});
afterEach(() => site.close());

function write(entries: number, who: 'quality' | 'receiving' = 'quality'): void {
  for (let number = 1; number <= entries; number += 1)
    record(site.db, {
      at: site.clock.now(),
      person: site.people[who],
      action: 'added',
      subject: 'part',
      subjectId: number,
      after: { number, zeta: 1, alpha: 2 },
    });
}

async function list(who: 'auditor' | 'receiving' | 'admin', query = '') {
  const answer = await site.as(who).get(`/api/audit${query}`).expect(200);
  return answer.body as { items: AuditEntry[]; next: string | null };
}
async function verification() {
  return (await site.as('auditor').get('/api/audit/verification').expect(200)).body as unknown;
}

describe('the audit trail', () => {
  it('calls a lot by its number, and finds it by it', async () => {
    const { plan } = referenceLot('lot-good');
    const references = addPlannedPart(site.db, site.people.quality.id, plan);
    const lot = await drawnLot(site, references, 400);
    const { items } = await list('auditor', `?subjectId=${lot.number}`);
    expect(items.map(({ action, subjectName }) => [action, subjectName])).toEqual([
      ['drawn', lot.number],
      ['booked', lot.number],
    ]);
    expect((await list('auditor', '?subject=part&subjectId=WA-12-500')).items).toEqual([]);
  });

  it('is read page by page, newest first', async () => {
    write(5);
    const first = await list('auditor', '?limit=2');
    expect(first.items.map(({ subjectId }) => subjectId)).toEqual(['5', '4']);
    const second = await list('auditor', `?limit=2&after=${first.next}`);
    expect(second.items.map(({ subjectId }) => subjectId)).toEqual(['3', '2']);
    const third = await list('auditor', `?limit=2&after=${second.next}`);
    expect(third).toMatchObject({ items: [{ subjectId: '1', person: site.people.quality.name }], next: null });
  });

  it('is found by what it is about', async () => {
    write(3);
    const found = await list('auditor', '?subject=part&subjectId=2');
    expect(found.items).toMatchObject([{ subjectId: '2', after: { number: 2, alpha: 2, zeta: 1 }, before: null }]);
  });

  it('shows receiving its own entries only', async () => {
    write(2);
    write(1, 'receiving');
    expect((await list('receiving')).items).toMatchObject([{ person: site.people.receiving.name }]);
    expect((await list('admin')).items).toHaveLength(3);
  });

  it('is never altered and never shortened', () => {
    write(2);
    expect(() => site.db.update(auditEntries).set({ actor: 'Somebody' }).run()).toThrow();
    expect(() => site.db.delete(auditEntries).run()).toThrow();
  });
});

describe('the chain of the audit trail', () => {
  it('is whole when nobody touched it, however long it is', async () => {
    expect(await verification()).toMatchObject({ entries: 0, intact: true, firstBroken: null, head: '0'.repeat(64) });
    write(2500);
    expect(await verification()).toMatchObject({ entries: 2500, intact: true, firstBroken: null });
  });

  it.each([
    ['an entry was altered', `update audit_entries set actor = 'Somebody' where id = 3`, 3],
    ['a moment was altered', `update audit_entries set at = '2020-01-01T00:00:00.000Z' where id = 1`, 1],
    ['an entry was removed', `delete from audit_entries where id = 3`, 4],
    ['the last entry was removed', `delete from audit_entries where id = 5`, 5],
    ['all entries were removed', `delete from audit_entries`, 1],
  ])('is broken where %s behind its back', async (_what, statement, firstBroken) => {
    write(5);
    site.db.$client.exec('drop trigger audit_entries_no_update; drop trigger audit_entries_no_delete;');
    site.db.$client.exec(statement);
    expect(await verification()).toMatchObject({ intact: false, firstBroken });
  });

  it('is whole after a change that was taken back', async () => {
    write(2);
    expect(() =>
      site.db.transaction((tx) => {
        record(tx, { at: site.clock.now(), person: null, action: 'added', subject: 'part', subjectId: 9 });
        throw new Error('taken back');
      }),
    ).toThrow('taken back');
    expect(await verification()).toMatchObject({ entries: 2, intact: true });
  });
});
