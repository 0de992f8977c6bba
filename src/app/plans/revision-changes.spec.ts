import { type Characteristic, type RevisionBody } from '#shared/contract/plans';
import { newCharacteristic } from './editor/new-characteristic';
import { revisionChanges } from './revision-changes';

function measured(key: string, change: Partial<Extract<Characteristic, { kind: 'measured' }>> = {}): Characteristic {
  const plain = { ...newCharacteristic('measured'), key, name: `Voltage ${key}`, upperLimit: 18.2 };
  return { ...plain, ...change } as Characteristic;
}

function plan(characteristics: Characteristic[], change: Partial<RevisionBody> = {}): RevisionBody {
  return {
    level: 'II',
    classAqls: [{ class: 'major', aql: '1.0' }],
    characteristics,
    decisionRule: 'simple',
    coverageFactor: 2,
    warmUpMinutes: null,
    changeNote: '',
    ...change,
  };
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

  it('names the decision rule, the coverage factor and the warm-up', () => {
    const after = plan([measured('a')], { decisionRule: 'guarded', coverageFactor: 1.65, warmUpMinutes: 15 });
    expect(revisionChanges(plan([measured('a')]), after)).toEqual([
      { position: null, what: 'Decision rule', before: 'Simple acceptance', after: 'Guarded acceptance' },
      { position: null, what: 'Coverage factor k', before: '2', after: '1.65' },
      { position: null, what: 'Warm-up', before: 'none', after: '15\u00a0min' },
    ]);
  });

  it('names what is measured, which peak counts and the ratings of a formula', () => {
    const ripple = { measurand: 'ripple', entryMode: 'scope' } as const;
    const before = plan([measured('a', { ...ripple, alternatePeaks: 'worst' })]);
    const after = plan([measured('a', { ...ripple, alternatePeaks: 'mean' })]);
    expect(revisionChanges(before, after)).toMatchObject([
      { what: 'Voltage a, alternate peaks', before: 'the higher one counts', after: 'their mean counts' },
    ]);
    expect(revisionChanges(plan([measured('a')]), before).map((line) => line.what)).toContain(
      'Voltage a, what is measured',
    );
    const rated = (volts: number) =>
      ({
        ...newCharacteristic('computed'),
        key: 'line',
        name: 'Line regulation',
        formula: { key: 'line-regulation', inputs: {}, constants: { rated: volts } },
      }) as Characteristic;
    expect(revisionChanges(plan([rated(12)]), plan([rated(24)]))).toMatchObject([
      { what: 'Line regulation, ratings', before: 'Rated voltage 12\u00a0V', after: 'Rated voltage 24\u00a0V' },
    ]);
  });
});
