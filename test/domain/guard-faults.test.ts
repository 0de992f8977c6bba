import { guardFaults } from '#shared/plan/guard-faults';
import { describe, expect, it } from 'vitest';
import { revisionBody } from '../support/plan-bodies';

describe('a plan with guard bands', () => {
  const plan = revisionBody();
  const [first] = plan.characteristics.filter(({ kind }) => kind === 'measured');
  if (first?.kind !== 'measured') throw new Error('The plan measures something.');
  const faultsOf = (
    limits: { lowerLimit: number | null; upperLimit: number | null },
    U: number | null,
    decisionRule: 'simple' | 'guarded' | 'non-binary' = 'guarded',
  ) => {
    const characteristics = [{ ...first, target: null, unit: 'V' as const, ...limits }];
    return guardFaults({ characteristics, decisionRule }, new Map(U === null ? [] : [[first.key, U]]));
  };

  it('is at fault where the guard bands of both limits meet', () => {
    const faults = faultsOf({ lowerLimit: 11.4, upperLimit: 12.6 }, 0.7);
    expect(faults.map(({ path }) => path)).toEqual([['characteristics', 0, 'upperLimit']]);
    expect(faults[0]?.message).toMatch(/^Guard bands of 700\smV leave nothing to accept within the limits/);
    expect(faultsOf({ lowerLimit: 11.4, upperLimit: 12.6 }, 0.7, 'non-binary')).toHaveLength(1);
  });

  it('is not where something is left between them', () => {
    expect(faultsOf({ lowerLimit: 11.4, upperLimit: 12.6 }, 0.5)).toEqual([]);
  });

  it('is at fault where U is more than a single upper limit allows from 0', () => {
    expect(faultsOf({ lowerLimit: null, upperLimit: 0.05 }, 0.06)).toHaveLength(1);
    expect(faultsOf({ lowerLimit: null, upperLimit: 0.05 }, 0.04)).toEqual([]);
    expect(faultsOf({ lowerLimit: null, upperLimit: -11.4 }, 0.5)).toEqual([]);
    expect(faultsOf({ lowerLimit: 20, upperLimit: null }, 30)).toEqual([]);
  });

  it('is not under simple acceptance, nor where U is not known', () => {
    expect(faultsOf({ lowerLimit: 11.4, upperLimit: 12.6 }, 0.7, 'simple')).toEqual([]);
    expect(faultsOf({ lowerLimit: 11.4, upperLimit: 12.6 }, null)).toEqual([]);
  });
});
