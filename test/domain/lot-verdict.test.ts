import { describe, expect, it } from 'vitest';
import { judgeGroups } from '#shared/verdict/judge-groups';
import { judgeLot } from '#shared/verdict/judge-lot';
import { judgeSample } from '#shared/verdict/judge-sample';
import { judgeUnit } from '#shared/verdict/judge-unit';
import { judgingRules } from '#shared/verdict/judging-rules';
import { GOOD, GROUPS, PLAN, foundIn, groupsOf, judge, measured, sample, unit } from './judged-sample';

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
