import { describe, expect, it } from 'vitest';
import { judgeSample, type UnitReadings } from '#shared/verdict/judge-sample';
import { GOOD, GROUPS, PLAN, foundIn, groupsOf, judge, measured, sample, unit } from './judged-sample';

describe('the plan of these cases', () => {
  it('has the numbers they rest on', () => {
    expect(GROUPS.map((group) => [group.class, group.sampleSize, group.acceptance, group.rejection])).toEqual([
      ['critical', 20, 0, 1],
      ['major', 20, 2, 3],
      ['minor', 20, 3, 4],
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

  it('beyond its group’s sample counts as critical even where a lesser failure is covered', () => {
    const groups = GROUPS.map((group) => (group.class === 'critical' ? { ...group, sampleSize: 5 } : group));
    const units = sample(20, { 10: { insulation: 10, label: false } });
    expect(foundIn(judgeSample({ characteristics: PLAN, groups, units }))).toEqual({ critical: 1, major: 0, minor: 0 });
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

describe('a plan that cannot be judged', () => {
  it('names the characteristic outside every group', () => {
    const groups = groupsOf([measured('ripple', 'major')], 150);
    expect(() => judgeSample({ characteristics: PLAN, groups, units: [] })).toThrow(/insulation/);
  });

  it('has at least one group', () => {
    expect(() => judgeSample({ characteristics: [], groups: [], units: [] })).toThrow(/groups/);
  });
});
