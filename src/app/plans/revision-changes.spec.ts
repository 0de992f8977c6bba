import { type Characteristic, type RevisionBody } from '#shared/contract/plans';
import { newCharacteristic } from './editor/new-characteristic';
import { revisionChanges } from './revision-changes';

function measured(key: string, change: Partial<Extract<Characteristic, { kind: 'measured' }>> = {}): Characteristic {
  const plain = { ...newCharacteristic('measured'), key, name: `Voltage ${key}`, upperLimit: 18.2 };
  return { ...plain, ...change } as Characteristic;
}

function plan(characteristics: Characteristic[], change: Partial<RevisionBody> = {}): RevisionBody {
  return { level: 'II', classAqls: [{ class: 'major', aql: '1.0' }], characteristics, changeNote: '', ...change };
}

describe('revisionChanges', () => {
  it('finds nothing between a revision and its copy', () => {
    expect(revisionChanges(plan([measured('a')]), plan([measured('a')]))).toEqual([]);
  });

  it('names a changed limit and method with both values and the place at the bench', () => {
    const before = plan([measured('a'), measured('b')]);
    const after = plan([measured('a'), measured('b', { upperLimit: 18.4, method: 'Meter' })]);
    expect(revisionChanges(before, after)).toEqual([
      { position: 2, what: 'Voltage b, limits', before: 'max 18.20\u00a0V', after: 'max 18.40\u00a0V' },
      { position: 2, what: 'Voltage b, method', before: '', after: 'Meter' },
    ]);
  });

  it('says what was added and what is gone', () => {
    const lines = revisionChanges(plan([measured('a')]), plan([measured('b')]));
    expect(lines.map(({ what, before, after }) => [what, before === null, after === null])).toEqual([
      ['Voltage b', true, false],
      ['Voltage a', false, true],
    ]);
  });

  it('gives a new order one line, however far things moved', () => {
    const lines = revisionChanges(plan([measured('a'), measured('b')]), plan([measured('b'), measured('a')]));
    expect(lines.map((line) => line.what)).toEqual(['Order at the bench']);
  });

  it('names level and AQLs', () => {
    const after = plan([measured('a')], { level: 'III', classAqls: [{ class: 'minor', aql: '2.5' }] });
    expect(revisionChanges(plan([measured('a')]), after).map((line) => line.what)).toEqual([
      'Inspection level',
      'AQL major',
      'AQL minor',
    ]);
  });
});
