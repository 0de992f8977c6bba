import { describe, expect, it } from 'vitest';
import { judgeSample, type JudgedCharacteristic } from '#shared/verdict/judge-sample';
import { judgeGroups } from '#shared/verdict/judge-groups';
import { judgeLot } from '#shared/verdict/judge-lot';
import { judgeUnit } from '#shared/verdict/judge-unit';
import { judgingRules } from '#shared/verdict/judging-rules';
import { type UnitReadings } from '#shared/verdict/sample-verdict';
import { unitInGroup } from '#shared/verdict/unit-in-group';
import { unjudgedReason } from '#shared/verdict/verdict-reason';
import { rectangular } from '#shared/uncertainty/component';
import { GOOD, GROUPS, PLAN, foundIn, groupsOf, judge, sample, unit, measured } from './judged-sample';

describe('a unit', () => {
  it('conforms when every characteristic does', () => {
    const [verdict] = judge([unit(1, GOOD)]).units;
    expect(verdict).toMatchObject({ verdict: 'conforming', failed: [], worstClass: null, missing: [] });
  });

  it('is not judged while a reading is missing', () => {
    const [verdict] = judge([unit(1, { insulation: 0, ripple: 0, label: true })]).units;
    expect(verdict).toMatchObject({ verdict: 'not judged', failed: [], missing: ['loaded'] });
    expect(verdict?.characteristics.get('loaded')).toMatchObject({ value: null, verdict: 'not judged' });
  });

  it('is nonconforming as soon as one characteristic fails, even if others are missing', () => {
    const [verdict] = judge([unit(1, { ripple: 10 })]).units;
    expect(verdict).toMatchObject({
      verdict: 'nonconforming',
      failed: ['ripple'],
      worstClass: 'major',
      missing: ['insulation', 'loaded', 'label'],
    });
  });

  it('fails by its attribute', () => {
    const [verdict] = judge([unit(1, { ...GOOD, label: false })]).units;
    expect(verdict).toMatchObject({ verdict: 'nonconforming', failed: ['label'], worstClass: 'minor' });
  });

  it('conforms at its limit', () => {
    expect(judge([unit(1, { ...GOOD, ripple: 1 })]).units[0]?.verdict).toBe('conforming');
  });

  it('set aside is undecided, unless it fails', () => {
    const verdicts = judge([unit(1, GOOD, 'hums'), unit(2, { ...GOOD, ripple: 10 }, 'hums')]).units;
    expect(verdicts.map(({ verdict }) => verdict)).toEqual(['undecided', 'nonconforming']);
  });

  it('refuses a value of the wrong kind, no number, and a number that is none of a unit', () => {
    expect(() => judge([unit(1, { label: 1 })])).toThrow(/label/);
    expect(() => judge([unit(1, { ripple: true })])).toThrow(/ripple/);
    expect(() => judge([unit(1, { ripple: NaN })])).toThrow(RangeError);
    expect(() => judge([unit(0, GOOD)])).toThrow(/unit/);
    expect(() => judge([unit(1, GOOD), unit(1, GOOD)])).toThrow(/once/);
  });
});

describe('a unit that fails in two classes', () => {
  const verdict = judge(sample(20, { 7: { ripple: 10, label: false } }));

  it('names both failures and the worst class', () => {
    expect(verdict.units[6]).toMatchObject({ failed: ['ripple', 'label'], worstClass: 'major' });
  });

  it('counts at its worst class only', () => {
    expect(foundIn(verdict)).toEqual({ critical: 0, major: 1, minor: 0 });
  });

  it('counts once, however many characteristics of the class fail', () => {
    expect(foundIn(judge(sample(20, { 7: { ripple: 10, loaded: 10 } })))).toEqual({ critical: 0, major: 1, minor: 0 });
  });

  it('counts once in each group of its worst class in which it fails', () => {
    const groups = groupsOf(PLAN, 150, { loaded: 'S-1' });
    const units = sample(20, { 1: { ripple: 10, loaded: 10, label: false }, 2: { loaded: 10 } });
    const found = judgeSample({ characteristics: PLAN, groups, units }).groups.map((each) => [
      each.group.key,
      each.found,
    ]);
    expect(found).toEqual([
      ['critical-II-0.65', 0],
      ['major-II-4.0', 1],
      ['major-S-1-4.0', 2],
      ['minor-II-6.5', 0],
    ]);
  });
});

describe('a computed characteristic', () => {
  const regulation: JudgedCharacteristic = {
    key: 'regulation',
    kind: 'computed',
    class: 'major',
    lowerLimit: null,
    upperLimit: 0.3,
    formula: { key: 'load-regulation', inputs: { no_load: 'open', loaded: 'full' } },
  };
  const plan = [
    { ...measured('open', 'major'), upperLimit: 20 },
    { ...measured('full', 'minor'), upperLimit: 20 },
    regulation,
  ];
  const judgeOne = (values: Record<string, number>, groups = groupsOf(plan, 150), number = 1) =>
    judgeSample({ characteristics: plan, groups, units: [unit(number, values)] }).units[0];

  it('is computed from the readings of its unit, and conforms at its limit', () => {
    expect(judgeOne({ open: 15.6, full: 12 })?.characteristics.get('regulation')?.value).toBeCloseTo(0.3, 12);
    expect(judgeOne({ open: 15.6, full: 12 })?.verdict).toBe('conforming');
    expect(judgeOne({ open: 15.7, full: 12 })).toMatchObject({ verdict: 'nonconforming', failed: ['regulation'] });
  });

  it('is not judged while a reading it takes is missing', () => {
    expect(judgeOne({ open: 15 })).toMatchObject({ verdict: 'not judged', missing: ['full', 'regulation'] });
  });

  it('does not conform where the readings give it no value', () => {
    const dead = judgeOne({ open: 0, full: 0 });
    expect(dead?.characteristics.get('regulation')).toMatchObject({ value: null, verdict: 'nonconforming' });
    expect(dead?.failed).toEqual(['regulation']);
  });

  it('asks for the readings it takes as far as its own group reaches', () => {
    const groups = groupsOf(plan, 150, { open: 'S-1' });
    expect(judgeOne({ full: 12 }, groups, 10)).toMatchObject({
      verdict: 'not judged',
      missing: ['open', 'regulation'],
    });
  });

  it('needs a formula with all its inputs bound', () => {
    const broken = (formula: JudgedCharacteristic['formula']) => () =>
      judgeSample({
        characteristics: [{ ...regulation, formula }],
        groups: groupsOf([regulation], 150),
        units: [unit(1)],
      });
    expect(broken(null)).toThrow(/regulation/);
    expect(broken({ key: 'load-regulation', inputs: { no_load: 'open' } })).toThrow(/loaded/);
  });
});

describe('a unit under a rule with guard bands', () => {
  const plan = [measured('ripple', 'major'), measured('loaded', 'major')];
  const budget = new Map(['ripple', 'loaded'].map((key) => [key, [rectangular('accuracy', 0.1 * Math.sqrt(3))]]));
  const rulesOf = (rule: 'guarded' | 'non-binary') =>
    judgingRules(plan, groupsOf(plan, 150), { rule, coverageFactor: 2 });
  const readingsOf = (ripple: number): UnitReadings => ({
    unit: 1,
    values: new Map([
      ['ripple', ripple],
      ['loaded', 0],
    ]),
    setAside: null,
    components: budget,
  });
  const judgeBy = (rule: 'guarded' | 'non-binary', readings: Partial<UnitReadings> & { ripple: number }) => {
    const { ripple, ...more } = readings;
    return judgeUnit(rulesOf(rule), { ...readingsOf(ripple), ...more });
  };

  it('fails inside the guard band of guarded acceptance, and conforms at its edge', () => {
    expect(judgeBy('guarded', { ripple: 0.85 })).toMatchObject({ verdict: 'nonconforming', failed: ['ripple'] });
    expect(judgeBy('guarded', { ripple: 0.8 }).verdict).toBe('conforming');
  });

  it('is undecided while a reading is conditional, inside or outside of the limit', () => {
    const inside = judgeBy('non-binary', { ripple: 0.95 });
    expect(inside.verdict).toBe('undecided');
    expect(inside.characteristics.get('ripple')).toMatchObject({ verdict: 'conditional', side: 'inside' });
    expect(inside.characteristics.get('ripple')?.expandedUncertainty).toBeCloseTo(0.2, 9);
    expect(judgeBy('non-binary', { ripple: 1.1 }).characteristics.get('ripple')?.side).toBe('outside');
    expect(judgeBy('non-binary', { ripple: 1.3 }).verdict).toBe('nonconforming');
  });

  it('is as quality rules where a reading is conditional', () => {
    expect(judgeBy('non-binary', { ripple: 0.95, ruling: 'conforming' }).verdict).toBe('conforming');
    expect(judgeBy('non-binary', { ripple: 0.95, ruling: 'nonconforming' })).toMatchObject({
      verdict: 'nonconforming',
      failed: ['ripple'],
      worstClass: 'major',
    });
  });

  it('fails whatever quality ruled where a reading fails', () => {
    expect(judgeBy('non-binary', { ripple: 1.3, ruling: 'conforming' }).verdict).toBe('nonconforming');
  });

  it('is not judged where the uncertainty of a reading is not known', () => {
    const unknown = judgeBy('guarded', { ripple: 0, components: new Map() });
    expect(unknown).toMatchObject({ verdict: 'not judged', missing: ['ripple', 'loaded'] });
    const ripple = unknown.characteristics.get('ripple');
    expect(ripple).toMatchObject({ value: 0, verdict: 'not judged', expandedUncertainty: null });
    expect(ripple && unjudgedReason(ripple)).toBe('uncertainty unknown');
  });

  it('that fails beside a conditional reading fails', () => {
    const values = new Map([
      ['ripple', 0.95],
      ['loaded', 5],
    ]);
    expect(judgeBy('non-binary', { ripple: 0, values })).toMatchObject({
      verdict: 'nonconforming',
      failed: ['loaded'],
    });
  });

  it('set aside and ruled nonconforming fails in its conditional reading, as it would on submission', () => {
    const submitted = judgeUnit(rulesOf('non-binary'), { ...readingsOf(0.95), setAside: 'hums' }, { submitting: true });
    const ruled = judgeBy('non-binary', { ripple: 0.95, setAside: 'hums', ruling: 'nonconforming' });
    expect(submitted.failed).toEqual(['ripple']);
    expect(ruled.failed).toEqual(submitted.failed);
  });

  it('keeps no ruling against readings that conform since', () => {
    expect(judgeBy('non-binary', { ripple: 0.5, ruling: 'nonconforming' }).verdict).toBe('conforming');
  });

  it('with a conditional reading still needs its other readings: nothing is complete before', () => {
    const partial = judgeUnit(rulesOf('non-binary'), { ...readingsOf(0.95), values: new Map([['ripple', 0.95]]) });
    expect(partial).toMatchObject({ verdict: 'undecided', missing: ['loaded'] });
    const [group] = rulesOf('non-binary').groups.filter(({ class: own }) => own === 'major');
    expect(group && unitInGroup(group, partial).state).toBe('open');
  });

  it('is undecided for the groups that judge its conditional reading, and judged for the others', () => {
    const twoClasses = [measured('ripple', 'major'), measured('loaded', 'minor')];
    const rules = judgingRules(twoClasses, groupsOf(twoClasses, 150), { rule: 'non-binary', coverageFactor: 2 });
    const groups = judgeGroups(rules, [judgeUnit(rules, readingsOf(0.95))]);
    expect(groups.map(({ group, undecided, judged }) => [group.class, undecided, judged])).toEqual([
      ['major', 1, 0],
      ['minor', 0, 1],
    ]);
    expect(judgeLot(rules, [], groups).reason).not.toMatch(/Rejected|Accepted/);
  });
});

describe('a computed characteristic under a rule with guard bands', () => {
  const balance: JudgedCharacteristic = {
    key: 'balance',
    kind: 'computed',
    class: 'major',
    lowerLimit: null,
    upperLimit: 0.05,
    formula: { key: 'transformer-balance', inputs: { half1: 'one', half2: 'other' } },
  };
  const halves = ['one', 'other'].map((key) => ({ ...measured(key, 'minor'), upperLimit: 100 }));
  const plan = [...halves, balance];
  const judgeHalves = (one: number, other: number, origin: string | null, gain = false) => {
    const values = new Map([
      ['one', one],
      ['other', other],
    ]);
    const components = new Map(
      [...values].map(
        ([key, value]) => [key, [rectangular('accuracy', 0.2, origin, gain ? 0.01 * value : 0)]] as const,
      ),
    );
    const rules = judgingRules(plan, groupsOf(plan, 150), { rule: 'guarded', coverageFactor: 2 });
    return judgeUnit(rules, { unit: 1, values, setAside: null, components }).characteristics.get('balance');
  };

  it('has the uncertainty that its readings hand on', () => {
    // d(V1 - V2) / mean at 20 V: each half enters by 1/20, and 2 · √2 · 0.2 / √3 / 20 = 1.63 %.
    expect(judgeHalves(20.2, 20, null)?.expandedUncertainty).toBeCloseTo(0.0163, 3);
    expect(judgeHalves(20.2, 20, null)?.verdict).toBe('conforming');
    expect(judgeHalves(20.8, 20, null)?.verdict).toBe('nonconforming');
  });

  it('has less of it where both halves were read on one range, whose error is the same for both', () => {
    expect(judgeHalves(20.8, 20, 'range 1')?.expandedUncertainty).toBeLessThan(0.001);
    expect(judgeHalves(20.8, 20, 'range 1')?.verdict).toBe('conforming');
  });

  it('is judged at the end of its formula too: a half that gives nothing', () => {
    expect(judgeHalves(20, 0, null)?.verdict).toBe('nonconforming');
    expect(judgeHalves(0, 0, null)).toMatchObject({ value: null, verdict: 'nonconforming' });
  });
});

describe('a ruling on a unit set aside', () => {
  const rules = judgingRules(PLAN, GROUPS);

  it('lets it conform, once nothing is missing on it', () => {
    const whole = { ...unit(1, GOOD, 'hums'), ruling: 'conforming' as const };
    const partial = { ...unit(1, { ripple: 0 }, 'hums'), ruling: 'conforming' as const };
    expect(judgeUnit(rules, whole).verdict).toBe('conforming');
    expect(judgeUnit(rules, partial).verdict).toBe('not judged');
  });

  it('lets it fail, in what was open on it', () => {
    const ruled = { ...unit(1, { ripple: 0, loaded: 0 }, 'hums'), ruling: 'nonconforming' as const };
    expect(judgeUnit(rules, ruled)).toMatchObject({
      verdict: 'nonconforming',
      failed: ['insulation', 'label'],
      missing: [],
    });
  });
});
