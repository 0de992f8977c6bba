import { describe, expect, it } from 'vitest';
import { lotSampling, type LotSamplingInput, type SampledCharacteristic } from '#shared/sampling/lot-sampling';
import { singleSamplingPlan } from '#shared/sampling/single-sampling-plan';

const characteristic = (
  key: string,
  of: SampledCharacteristic['class'],
  own: Partial<SampledCharacteristic> = {},
): SampledCharacteristic => ({ key, class: of, level: null, aql: null, ...own });

const input: LotSamplingInput = {
  lotSize: 1200,
  severity: 'normal',
  level: 'II',
  classAqls: [
    { class: 'critical', aql: '0.10' },
    { class: 'major', aql: '1.0' },
    { class: 'minor', aql: '2.5' },
  ],
  characteristics: [
    characteristic('label', 'minor'),
    characteristic('ripple', 'major'),
    characteristic('insulation', 'critical'),
    characteristic('opened', 'major', { level: 'S-2' }),
    characteristic('loaded', 'major'),
    characteristic('cable', 'major', { aql: '0.40' }),
  ],
};

describe('sampling groups', () => {
  it('hold the characteristics that share class, level and AQL, worst class first, special levels last', () => {
    const groups = lotSampling(input).groups.map((group) => [group.key, group.characteristicKeys]);
    expect(groups).toEqual([
      ['critical-II-0.10', ['insulation']],
      ['major-II-0.40', ['cable']],
      ['major-II-1.0', ['ripple', 'loaded']],
      ['major-S-2-1.0', ['opened']],
      ['minor-II-2.5', ['label']],
    ]);
  });

  it('have each the sample size and numbers of its own plan', () => {
    const { groups } = lotSampling(input);
    const numbers = groups.map((group) => [group.sampleSize, group.acceptance, group.rejection, group.codeLetter]);
    expect(numbers).toEqual([
      [125, 0, 1, 'J'],
      [125, 1, 2, 'J'],
      [80, 2, 3, 'J'],
      [13, 0, 1, 'C'],
      [80, 5, 6, 'J'],
    ]);
  });

  it('say by which letter a plan is read where an arrow leads away from the code letter', () => {
    const [critical, , major] = lotSampling(input).groups;
    expect([critical?.codeLetter, critical?.planLetter]).toEqual(['J', 'K']);
    expect([major?.codeLetter, major?.planLetter]).toEqual(['J', 'J']);
  });

  it('draw the largest sample of all groups', () => {
    expect(lotSampling(input).sampleSize).toBe(125);
  });

  it('accept no critical unit, whatever the tables give', () => {
    const lax = lotSampling({
      ...input,
      classAqls: [{ class: 'critical', aql: '6.5' }],
      characteristics: [characteristic('insulation', 'critical')],
    });
    expect(singleSamplingPlan({ lotSize: 1200, level: 'II', aql: '6.5', severity: 'normal' }).acceptance).toBe(10);
    expect(lax.groups.map((group) => [group.sampleSize, group.acceptance, group.rejection])).toEqual([[80, 0, 1]]);
  });

  it('follow the severity of the lot', () => {
    const numbers = (severity: LotSamplingInput['severity']) =>
      lotSampling({ ...input, severity }).groups.map((group) => [
        group.sampleSize,
        group.acceptance,
        group.rejection,
      ])[2];
    expect(numbers('tightened')).toEqual([80, 1, 2]);
    expect(numbers('reduced')).toEqual([32, 1, 3]);
  });

  it('take the whole of a small lot', () => {
    const small = lotSampling({ ...input, lotSize: 12 });
    expect(small.sampleSize).toBe(12);
    expect(small.groups.map((group) => [group.sampleSize, group.wholeLot])).toEqual([
      [12, true],
      [12, true],
      [12, true],
      [12, true],
      [5, false],
    ]);
  });

  it('inspect a lot of one', () => {
    expect(lotSampling({ ...input, lotSize: 1 }).sampleSize).toBe(1);
  });
});

describe('a plan that cannot be sampled', () => {
  it('names the class without AQL and its characteristic', () => {
    const classAqls = input.classAqls.filter((entry) => entry.class !== 'minor');
    expect(() => lotSampling({ ...input, classAqls })).toThrow(/minor.*label/);
  });

  it('may leave a class without AQL where its characteristics bring their own', () => {
    const characteristics = [characteristic('label', 'minor', { aql: '4.0' })];
    expect(lotSampling({ ...input, classAqls: [], characteristics }).groups[0]?.key).toBe('minor-II-4.0');
  });

  it('needs a characteristic and a lot', () => {
    expect(() => lotSampling({ ...input, characteristics: [] })).toThrow(/characteristics/);
    expect(() => lotSampling({ ...input, lotSize: 0 })).toThrow(/lotSize/);
  });
});
