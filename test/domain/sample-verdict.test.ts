import { describe, expect, it } from 'vitest';
import { lotSampling, type SamplingGroup } from '#shared/sampling/lot-sampling';
import { type NonconformityClass } from '#shared/sampling/scheme';
import { judgeGroups } from '#shared/verdict/judge-groups';
import { judgeLot } from '#shared/verdict/judge-lot';
import { judgeSample, type JudgedCharacteristic, type UnitReadings } from '#shared/verdict/judge-sample';
import { judgeUnit } from '#shared/verdict/judge-unit';
import { judgingRules } from '#shared/verdict/judging-rules';

/** Every value of these plans conforms at 0 and fails at 10. */
const measured = (key: string, of: NonconformityClass): JudgedCharacteristic => ({
  key,
  kind: 'measured',
  class: of,
  lowerLimit: null,
  upperLimit: 1,
  formula: null,
});

const label: JudgedCharacteristic = { ...measured('label', 'minor'), kind: 'attribute', upperLimit: null };
const PLAN = [measured('insulation', 'critical'), measured('ripple', 'major'), measured('loaded', 'major'), label];

/** n 20 for all: critical 0/1, major AQL 4.0 2/3, minor AQL 6.5 3/4 (lot 150, level II, code F). */
const GROUPS = groupsOf(PLAN, 150);

function groupsOf(
  plan: readonly JudgedCharacteristic[],
  lotSize: number,
  levels: Record<string, 'S-1'> = {},
  severity: SamplingGroup['severity'] = 'normal',
): SamplingGroup[] {
  return lotSampling({
    lotSize,
    severity,
    level: 'II',
    classAqls: [
      { class: 'critical', aql: '0.65' },
      { class: 'major', aql: '4.0' },
      { class: 'minor', aql: '6.5' },
    ],
    characteristics: plan.map(({ key, class: of }) => ({ key, class: of, level: levels[key] ?? null, aql: null })),
  }).groups;
}

const GOOD = { insulation: 0, ripple: 0, loaded: 0, label: true };

function unit(
  number: number,
  values: Record<string, number | boolean> = {},
  setAside: string | null = null,
): UnitReadings {
  return { unit: number, values: new Map(Object.entries(values)), setAside };
}

/** Units 1 to n, good but for what is given by number. */
function sample(n: number, differing: Record<number, Record<string, number | boolean>> = {}): UnitReadings[] {
  return Array.from({ length: n }, (_, index) => unit(index + 1, { ...GOOD, ...differing[index + 1] }));
}

const judge = (units: UnitReadings[], submitting = false) =>
  judgeSample({ characteristics: PLAN, groups: GROUPS, units, submitting });

const foundIn = (verdict: ReturnType<typeof judge>) =>
  Object.fromEntries(verdict.groups.map((each) => [each.group.class, each.found]));

describe('the plan of these cases', () => {
  it('has the numbers they rest on', () => {
    expect(GROUPS.map((group) => [group.class, group.sampleSize, group.acceptance, group.rejection])).toEqual([
      ['critical', 20, 0, 1],
      ['major', 20, 2, 3],
      ['minor', 20, 3, 4],
    ]);
  });
});

describe('a unit', () => {
  it('conforms when every characteristic does', () => {
    const [verdict] = judge([unit(1, GOOD)]).units;
    expect(verdict).toMatchObject({ verdict: 'conforming', failed: [], worstClass: null, missing: [] });
  });

  it('is not judged while a reading is missing', () => {
    const [verdict] = judge([unit(1, { insulation: 0, ripple: 0, label: true })]).units;
    expect(verdict).toMatchObject({ verdict: 'not judged', failed: [], missing: ['loaded'] });
    expect(verdict?.characteristics.get('loaded')).toEqual({ value: null, verdict: 'not judged' });
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

describe('a critical failure', () => {
  it('rejects the lot at once', () => {
    const { lot } = judge(sample(3, { 2: { insulation: 10 } }));
    expect(lot).toMatchObject({ verdict: 'rejected', stop: true, complete: false });
    expect(lot.reason).toBe(
      'Rejected: 1 critical nonconforming unit in 3 of 20, rejection number 1 (AQL 0.65, normal, code F).',
    );
  });

  it('rejects on every unit measured, beyond the sample of its group too', () => {
    const groups = groupsOf(PLAN, 150, { insulation: 'S-1' });
    const critical = groups.find((group) => group.class === 'critical');
    const beyond = sample(150).map((each) =>
      each.unit === 150 ? unit(150, { insulation: 10 }) : unit(each.unit, GOOD),
    );
    expect(critical?.sampleSize).toBe(20);
    const { lot, groups: verdicts } = judgeSample({ characteristics: PLAN, groups, units: beyond });
    expect(verdicts[0]).toMatchObject({ found: 1, judged: 20, verdict: 'rejected' });
    expect(lot.verdict).toBe('rejected');
  });
});

describe('a group with a special level', () => {
  // Lot 150: level S-1 has code B, AQL 4.0 then 3 units, 0/1; level II has 20 units.
  const groups = groupsOf(PLAN, 150, { loaded: 'S-1' });
  const judgeSpecial = (units: UnitReadings[]) => judgeSample({ characteristics: PLAN, groups, units });
  const special = (units: UnitReadings[]) => judgeSpecial(units).groups.find((each) => each.group.level === 'S-1');
  const without = (number: number) => unit(number, { insulation: 0, ripple: 0, label: true });

  it('covers its first units in draw order only', () => {
    expect(special(sample(20))?.group).toMatchObject({ sampleSize: 3, acceptance: 0, rejection: 1 });
    expect(special([unit(1, GOOD), unit(2, GOOD), unit(3, GOOD)])).toMatchObject({ judged: 3, verdict: 'accepted' });
  });

  it('misses nothing on later units', () => {
    const verdict = judgeSpecial([
      unit(1, GOOD),
      unit(2, GOOD),
      unit(3, GOOD),
      ...sample(20)
        .slice(3)
        .map((each) => without(each.unit)),
    ]);
    expect(verdict.units.every((each) => each.missing.length === 0)).toBe(true);
    expect(verdict.lot).toMatchObject({ verdict: 'accepted', complete: true });
  });

  it('waits for its own units', () => {
    expect(judgeSpecial([without(3)]).units[0]).toMatchObject({ verdict: 'not judged', missing: ['loaded'] });
  });

  it('does not count a failure on a later unit, which is nonconforming all the same', () => {
    const verdict = judgeSpecial(sample(20, { 4: { loaded: 10 } }));
    expect(verdict.units[3]).toMatchObject({ verdict: 'nonconforming', failed: ['loaded'], worstClass: 'major' });
    expect(verdict.groups.map(({ found }) => found)).toEqual([0, 0, 0, 0]);
    expect(verdict.lot.verdict).toBe('accepted');
  });

  it('does not let such a failure hide a lesser one that counts', () => {
    const verdict = judgeSpecial(sample(20, { 4: { loaded: 10, label: false } }));
    expect(foundIn(verdict)['minor']).toBe(1);
  });
});

describe('the running verdict', () => {
  it('goes on while no rejection number is reached', () => {
    const { lot, groups } = judge(sample(8, { 2: { ripple: 10 } }));
    expect(lot).toEqual({
      verdict: 'continue',
      reason: 'No rejection number reached, 8 of 20 units judged.',
      stop: false,
      complete: false,
    });
    expect(groups.map(({ verdict, moreToReject }) => [verdict, moreToReject])).toEqual([
      ['open', 1],
      ['open', 2],
      ['open', 4],
    ]);
  });

  it('starts with nothing judged', () => {
    expect(judge([]).lot.reason).toBe('No rejection number reached, 0 of 20 units judged.');
  });

  it('stops at the unit that reaches the rejection number, before the last unit', () => {
    const failing = { 2: { ripple: 10 }, 5: { loaded: 10 }, 9: { ripple: 10 } };
    expect(judge(sample(8, failing)).lot.stop).toBe(false);
    expect(judge(sample(9, failing)).lot).toEqual({
      verdict: 'rejected',
      reason: 'Rejected: 3 major nonconforming units in 9 of 20, rejection number 3 (AQL 4.0, normal, code F).',
      stop: true,
      complete: false,
    });
  });

  it('stays rejected to the full sample, which it then names', () => {
    const { lot } = judge(sample(20, { 2: { ripple: 10 }, 5: { loaded: 10 }, 9: { ripple: 10 } }));
    expect(lot).toMatchObject({ verdict: 'rejected', complete: true });
    expect(lot.reason).toContain('3 major nonconforming units in 20, rejection number 3');
  });

  it('names every group that rejects', () => {
    const units = sample(20, { 1: { insulation: 10 }, 2: { ripple: 10 }, 5: { loaded: 10 }, 9: { ripple: 10 } });
    expect(judge(units).lot.reason).toMatch(/^Rejected: 1 critical .*; 3 major .*\.$/);
  });

  it('accepts at the acceptance number when every unit is judged', () => {
    const { lot, groups } = judge(sample(20, { 2: { ripple: 10 }, 5: { loaded: 10 } }));
    expect(lot).toMatchObject({ verdict: 'accepted', stop: false, complete: true });
    expect(groups[1]?.reason).toBe(
      'Accepted: 2 major nonconforming units in 20, acceptance number 2 (AQL 4.0, normal, code F).',
    );
  });

  it('never takes a missing reading for a pass', () => {
    const { lot } = judge([...sample(19), unit(20, { insulation: 0, ripple: 0, loaded: 0 })]);
    expect(lot).toMatchObject({ verdict: 'continue', complete: false });
    expect(lot.reason).toBe('No rejection number reached, 19 of 20 units judged.');
  });

  it('needs no more readings of a unit that fails at its worst', () => {
    const { lot } = judge([...sample(19), unit(20, { insulation: 0, ripple: 10 })]);
    expect(lot).toMatchObject({ verdict: 'accepted', complete: true });
  });

  it('is the same whatever the order the units come in', () => {
    const units = sample(20, { 2: { ripple: 10 }, 5: { label: false } });
    expect(judge([...units].reverse()).lot).toEqual(judge(units).lot);
  });

  it('is the same for one unit judged again as for the whole sample', () => {
    const rules = judgingRules(PLAN, GROUPS);
    const before = judge(sample(20)).units;
    const after = before.map((each) => (each.unit === 7 ? judgeUnit(rules, unit(7, { ...GOOD, ripple: 10 })) : each));
    const groups = judgeGroups(rules, after);
    expect(judgeLot(rules, after, groups)).toEqual(judge(sample(20, { 7: { ripple: 10 } })).lot);
  });
});

describe('a rejection number reached by units that may still move to a worse class', () => {
  const minorOnly = [1, 2, 3, 4].map((number) => unit(number, { label: false }));

  it('is not certain', () => {
    const { lot, groups } = judge(minorOnly);
    expect(groups[2]).toMatchObject({ found: 4, moreToReject: 0, verdict: 'open' });
    expect(lot).toMatchObject({ verdict: 'continue', stop: false });
    expect(lot.reason).toBe(
      '4 minor nonconforming units in 20, rejection number 4 reached but not certain: 4 units lack readings of a worse class.',
    );
  });

  it('is certain once nothing worse is open on them', () => {
    const measuredToo = [1, 2, 3, 4].map((number) => unit(number, { ...GOOD, label: false }));
    expect(judge(measuredToo).lot).toMatchObject({ verdict: 'rejected', stop: true });
  });

  it('is lost again where one of them turns out major', () => {
    const moved = [1, 2, 3, 4].map((number) => unit(number, { ...GOOD, label: false, ripple: number === 4 ? 10 : 0 }));
    const verdict = judge(moved);
    expect(foundIn(verdict)).toEqual({ critical: 0, major: 1, minor: 3 });
    expect(verdict.lot.verdict).toBe('continue');
  });
});

describe('units set aside', () => {
  const conforming = sample(19);

  it('keep the lot open, with nothing left to measure', () => {
    const { lot, groups } = judge([...conforming, unit(20, GOOD, 'hums')]);
    expect(lot).toMatchObject({ verdict: 'continue', stop: false, complete: true });
    expect(lot.reason).toBe('No rejection number reached, 19 of 20 units judged, 1 undecided.');
    expect(groups.map(({ judged, undecided }) => [judged, undecided])).toEqual([
      [19, 1],
      [19, 1],
      [19, 1],
    ]);
  });

  it('miss no readings', () => {
    expect(judge([unit(20, { ripple: 0 }, 'hums')]).units[0]).toMatchObject({ verdict: 'undecided', missing: [] });
  });

  it('count when submitted, at the worst class left open on them', () => {
    const submitted = judge([...conforming, unit(20, { insulation: 0, ripple: 0 }, 'hums')], true);
    expect(submitted.units[19]).toMatchObject({
      verdict: 'nonconforming',
      failed: ['loaded', 'label'],
      worstClass: 'major',
    });
    expect(foundIn(submitted)).toEqual({ critical: 0, major: 1, minor: 0 });
    expect(submitted.lot).toMatchObject({ verdict: 'accepted', complete: true });
  });

  it('count when submitted at the worst class but critical, where nothing is left open', () => {
    const submitted = judge([...conforming, unit(20, GOOD, 'hums')], true);
    expect(submitted.units[19]).toMatchObject({ failed: ['ripple', 'loaded', 'label'], worstClass: 'major' });
    expect(foundIn(submitted)).toEqual({ critical: 0, major: 1, minor: 0 });
  });

  it('count when submitted as critical where a critical reading is left open', () => {
    const submitted = judge([...conforming, unit(20, { ...GOOD, insulation: 10 }, 'hums')], true);
    expect(submitted.units[19]?.worstClass).toBe('critical');
    const open = judge([...conforming, unit(20, { ripple: 0, loaded: 0, label: true }, 'hums')], true);
    expect(open.units[19]).toMatchObject({ failed: ['insulation'], worstClass: 'critical' });
    expect(open.lot.verdict).toBe('rejected');
  });

  it('count when submitted as critical where the plan has no other characteristic', () => {
    const plan = [measured('insulation', 'critical')];
    const units = [unit(1, { insulation: 0 }, 'hums')];
    const submitted = judgeSample({ characteristics: plan, groups: groupsOf(plan, 150), units, submitting: true });
    expect(submitted.units[0]?.worstClass).toBe('critical');
  });

  it('count when submitted at a class worse than the one they fail in already, where that is open', () => {
    const failing = unit(20, { insulation: 0, label: false }, 'hums');
    expect(foundIn(judge([...conforming, failing]))).toEqual({ critical: 0, major: 0, minor: 1 });
    expect(judge([...conforming, failing]).groups.map(({ undecided }) => undecided)).toEqual([0, 1, 0]);
    expect(foundIn(judge([...conforming, failing], true))).toEqual({ critical: 0, major: 1, minor: 0 });
  });

  it('stay conforming where they are not set aside', () => {
    expect(judge(sample(20), true).lot).toMatchObject({ verdict: 'accepted', complete: true });
  });

  it('do not make a missing reading of another unit good', () => {
    expect(judge([...conforming, unit(20, { ripple: 0 })], true).lot).toMatchObject({
      verdict: 'continue',
      complete: false,
    });
  });
});

describe('whole-lot inspection', () => {
  const groups = groupsOf(PLAN, 12);
  const judgeAll = (differing = {}) => judgeSample({ characteristics: PLAN, groups, units: sample(12, differing) }).lot;

  it('covers every unit, and the same numbers decide', () => {
    expect(groups.map((group) => [group.class, group.sampleSize, group.wholeLot, group.acceptance])).toEqual([
      ['critical', 12, true, 0],
      ['major', 3, false, 0],
      ['minor', 2, false, 0],
    ]);
    expect(judgeAll()).toMatchObject({ verdict: 'accepted', complete: true });
    expect(judgeAll({ 12: { insulation: 10 } }).reason).toContain('1 critical nonconforming unit in 12');
  });

  it('is named in the reason', () => {
    expect(judgeAll({ 12: { insulation: 10 } }).reason).toContain('code B, plan F, whole lot)');
  });
});

describe('reduced inspection', () => {
  it('accepts a lot between the two numbers and says that the next one is normal', () => {
    const groups = groupsOf([measured('ripple', 'major')], 150, {}, 'reduced');
    expect(groups[0]).toMatchObject({ sampleSize: 8, acceptance: 1, rejection: 3 });
    const units = sample(8, { 1: { ripple: 10 }, 2: { ripple: 10 } });
    const only = units.map((each) => unit(each.unit, { ripple: each.values.get('ripple') ?? 0 }));
    const { lot } = judgeSample({ characteristics: [measured('ripple', 'major')], groups, units: only });
    expect(lot.verdict).toBe('accepted');
    expect(lot.reason).toBe(
      'Accepted: 2 major nonconforming units in 8, above acceptance number 1 and below rejection number 3, next lot normal (AQL 4.0, reduced, code F).',
    );
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
    expect(dead?.characteristics.get('regulation')).toEqual({ value: null, verdict: 'nonconforming' });
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

describe('a plan that cannot be judged', () => {
  it('names the characteristic outside every group', () => {
    const groups = groupsOf([measured('ripple', 'major')], 150);
    expect(() => judgeSample({ characteristics: PLAN, groups, units: [] })).toThrow(/insulation/);
  });

  it('has at least one group', () => {
    expect(() => judgeSample({ characteristics: [], groups: [], units: [] })).toThrow(/groups/);
  });
});
