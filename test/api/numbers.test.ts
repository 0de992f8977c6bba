import { nextNumber } from '#server/numbers/next-number';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { testSite, type TestSite } from '../support/test-site';

let site: TestSite;
beforeEach(async () => {
  site = await testSite();
});
afterEach(() => site.close());

describe('the numbers of papers', () => {
  it('run through the year for each kind of paper', () => {
    const take = () => [
      nextNumber(site.db, 'L', 2026),
      nextNumber(site.db, 'CC', 2026),
      nextNumber(site.db, 'NC', 2026),
    ];
    expect(take()).toEqual(['L-26-0001', 'CC-26-0001', 'NC-26-001']);
    expect(take()).toEqual(['L-26-0002', 'CC-26-0002', 'NC-26-002']);
    expect(nextNumber(site.db, 'L', 2027)).toBe('L-27-0001');
  });

  it('leave no gap when what would have used one is taken back', () => {
    expect(() =>
      site.db.transaction((tx) => {
        nextNumber(tx, 'CC', 2026);
        throw new Error('taken back');
      }),
    ).toThrow('taken back');
    expect(nextNumber(site.db, 'CC', 2026)).toBe('CC-26-0001');
  });

  it('go on past their digits', () => {
    site.db.$client.exec(`insert into number_series values ('NC', 2026, 999)`);
    expect(nextNumber(site.db, 'NC', 2026)).toBe('NC-26-1000');
  });
});
