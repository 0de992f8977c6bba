import { entryChanges } from './entry-changes';

describe('entryChanges', () => {
  it('names each value that differs, in words, and leaves out those that do not', () => {
    const before = { name: 'Kestrin Power', contactName: 'A', active: true };
    expect(entryChanges(before, { ...before, contactName: 'B', active: false })).toEqual([
      { name: 'contact name', before: 'A', after: 'B' },
      { name: 'active', before: 'yes', after: 'no' },
    ]);
  });

  it('walks into lists and what lies in them', () => {
    const before = { characteristics: [{ upperLimit: 2.3 }, { upperLimit: 5 }] };
    const after = { characteristics: [{ upperLimit: 2.4 }, { upperLimit: 5 }] };
    expect(entryChanges(before, after)).toEqual([
      { name: 'characteristics 1, upper limit', before: '2.3', after: '2.4' },
    ]);
  });

  it('shows the first state of a thing as all new', () => {
    expect(entryChanges(null, { roles: ['quality', 'auditor'] })).toEqual([
      { name: 'roles', before: null, after: 'quality, auditor' },
    ]);
  });
});
