import { budgetLines } from '#shared/uncertainty/budget-lines';
import { combine } from '#shared/uncertainty/combine';
import { normal, rectangular, unweighted } from '#shared/uncertainty/component';
import { conformityProbability } from '#shared/uncertainty/conformity-probability';
import {
  coverageSentence,
  expandedUncertainty,
  isDominatedByRectangular,
  RECTANGULAR_COVERAGE_FACTOR,
} from '#shared/uncertainty/expanded-uncertainty';
import { globalRisk } from '#shared/uncertainty/global-risk';
import { acceptanceLimits, guardBand } from '#shared/uncertainty/guard-band';
import { propagate } from '#shared/uncertainty/propagate';
import { readingBudget } from '#shared/uncertainty/reading-budget';
import { judgeReading } from '#shared/verdict/reading-verdict';
import normalCdf from '@stdlib/stats-base-dists-normal-cdf';
import normalQuantile from '@stdlib/stats-base-dists-normal-quantile';
import tQuantile from '@stdlib/stats-base-dists-t-quantile';
import { describe, expect, it } from 'vitest';
import reference from './data/e-uncertainty.json' with { type: 'json' };

/** A case by its id; the file tells each one's source and provenance. */
function caseOf<T>(id: string): T {
  const found = reference.cases.find((one) => one.id === id);
  if (!found) throw new Error(`There is no case ${id}.`);
  return found as T;
}

// Source: JCGM 100:2008 (GUM), H.1, Table H.1; inputs published, some answers from memory, recomputed equal.
describe('E-1, the end-gauge calibration of the GUM', () => {
  const { recomputed, published } = caseOf<{
    recomputed: {
      contributions_nm: number[];
      uc_nm: number;
      veff: number;
      t99_16: number;
      U99_nm_from_rounded: number;
      u_d_nm: number;
      dof_d: number;
      second_order_terms_nm_unrounded_inputs: number[];
      uc_with_second_order_nm: number;
    };
    published: { l_mm: number; uc_nm: number; veff: number; U99_nm: number; uc_with_second_order_nm: number };
  }>('E-1');
  const input = (value: number, u: number, degreesOfFreedom = Infinity) => ({
    value,
    components: [normal('as stated', u, { degreesOfFreedom })],
  });
  // Lengths in nm, coefficients of expansion in 1/K, temperatures in K.
  const propagated = propagate(
    (given) => {
      const of = (name: string) => given[name] ?? Number.NaN;
      return of('l_s') + of('d') - of('l_s') * (of('dalpha') * of('theta') + of('alpha_s') * of('dtheta'));
    },
    new Map([
      ['l_s', input(50_000_623, 25, 18)],
      ['d', input(215, 9.7, 25.6)],
      ['dalpha', input(0, 0.58e-6, 50)],
      ['dtheta', input(0, 0.029, 2)],
      ['alpha_s', input(11.5e-6, 1.2e-6)],
      ['theta', input(-0.1, 0.41)],
    ]),
  );
  const combined = combine(propagated.components);

  it('propagates through its model: each contribution, and none of what enters by a difference of 0', () => {
    expect(propagated.value / 1e6).toBeCloseTo(published.l_mm, 6);
    const contributions = budgetLines(propagated.components).lines.map(({ contribution }) => contribution);
    expect(contributions).toEqual(
      [...recomputed.contributions_nm, 0, 0].map((one) => expect.closeTo(one, 4) as number),
    );
  });

  it('makes the difference of its three parts', () => {
    const parts = [
      normal('repeatability', 5.8, { degreesOfFreedom: 24 }),
      normal('random', 3.9, { degreesOfFreedom: 5 }),
      normal('systematic', 6.7, { degreesOfFreedom: 8 }),
    ];
    const difference = combine(unweighted(parts));
    expect(difference.standardUncertainty).toBeCloseTo(recomputed.u_d_nm, 8);
    expect(difference.effectiveDegreesOfFreedom).toBeCloseTo(recomputed.dof_d, 7);
  });

  it('is 34 nm with the terms of second order, which first-order propagation leaves out', () => {
    // u(l) of products of two uncertainties: l u(dalpha) u(theta) and l u(alpha) u(dtheta), inputs unrounded.
    const theta = Math.hypot(0.2, 0.5 / Math.SQRT2);
    const terms = [
      (50_000_623 * 1e-6 * theta) / Math.sqrt(3),
      (50_000_623 * 2e-6 * 0.05) / Math.sqrt(3) / Math.sqrt(3),
    ];
    expect(terms).toEqual(
      recomputed.second_order_terms_nm_unrounded_inputs.map((one) => expect.closeTo(one, 6) as number),
    );
    const more = terms.map((term) => ({ component: normal('second order', term), sensitivity: 1 }));
    const u = combine([...propagated.components, ...more]).standardUncertainty;
    expect(u).toBeCloseTo(recomputed.uc_with_second_order_nm, 3);
    expect(Math.round(u)).toBe(published.uc_with_second_order_nm);
  });

  it('combines to 32 nm with 16 effective degrees of freedom', () => {
    expect(combined.standardUncertainty).toBeCloseTo(recomputed.uc_nm, 3);
    expect(combined.effectiveDegreesOfFreedom).toBeCloseTo(recomputed.veff, 2);
    expect(Math.round(combined.standardUncertainty)).toBe(published.uc_nm);
    expect(Math.floor(combined.effectiveDegreesOfFreedom)).toBe(published.veff);
  });

  it('is expanded to 93 nm at 99 %', () => {
    expect(tQuantile(0.995, 16)).toBeCloseTo(recomputed.t99_16, 5);
    expect(Math.round(tQuantile(0.995, 16) * 32)).toBe(published.U99_nm);
    expect(tQuantile(0.995, 16) * 32).toBeCloseTo(recomputed.U99_nm_from_rounded, 4);
  });
});

// Source: EA-4/02 Supplement, example S9, hand-held digital multimeter at 100 V DC (from memory; recomputed equal).
describe('E-2, a multimeter at 100 V', () => {
  const { recomputed } = caseOf<{ recomputed: { u: number; U_k1_65: number; U_k2: number } }>('E-2');
  const components = [
    normal('reference', 0.001),
    rectangular('resolution of the meter', 0.05),
    rectangular('corrections of the reference', 0.011),
  ];
  const combined = combine(unweighted(components));

  it('has a standard uncertainty of 30 mV', () => {
    expect(combined.standardUncertainty).toBeCloseTo(recomputed.u, 9);
    expect(expandedUncertainty(components, 2)).toBeCloseTo(recomputed.U_k2, 9);
  });

  it('is dominated by one rectangular component, so that k = 1.65 covers 95 %', () => {
    expect(isDominatedByRectangular(combined)).toBe(true);
    expect(RECTANGULAR_COVERAGE_FACTOR).toBeCloseTo(1.65, 2);
    expect(1.65 * combined.standardUncertainty).toBeCloseTo(recomputed.U_k1_65, 9);
    expect(coverageSentence(combined, 2)).toMatch(/k = 2 covers more than 95 %; k = 1\.65 would cover 95 %/);
  });
});

// Source: constructed; recomputed.
it('E-3, 12.034 V on a 20 V range, 0.5 % and 2 counts of 1 mV, five readings', () => {
  const { components, answer } = caseOf<{
    components: { u: number; half_width?: number }[];
    answer: { uc: number; U_k2: number; veff: number };
  }>('E-3');
  const budget = readingBudget(12.034, null, {
    id: 1,
    form: 'digital',
    name: '20 V',
    unit: 'V',
    fullScale: 20,
    resolution: 0.001,
    ofReading: 0.005,
    ofRange: 0,
    counts: 2,
  });
  const all = [...budget, normal('repeatability', 0.0012 / Math.sqrt(5), { degreesOfFreedom: 4 })];
  expect(all[0]?.halfWidth).toBeCloseTo(components[0]?.half_width ?? 0, 9);
  expect(all.map((one) => one.standardUncertainty)).toEqual(components.map(({ u }) => expect.closeTo(u, 10) as number));
  const combined = combine(unweighted(all));
  expect(combined.standardUncertainty).toBeCloseTo(answer.uc, 10);
  expect(2 * combined.standardUncertainty).toBeCloseTo(answer.U_k2, 10);
  expect(combined.effectiveDegreesOfFreedom / answer.veff).toBeCloseTo(1, 3);
});

// Source: JCGM 106:2012, 7.4 and 7.5, examples (from memory; recomputed equal to the remembered values).
describe('the probability of conformity', () => {
  it.each([
    ['E-4', -5.47, 0.05, { lower: null, upper: -5.4 }],
    ['E-5', 509.7, 8.6, { lower: 490, upper: null }],
    ['E-6', 13.6, 1.8, { lower: 12.5, upper: 16.3 }],
  ] as const)('%s', (id, value, u, limits) => {
    const { recomputed, published } = caseOf<{ recomputed: number; published: number }>(id);
    expect(conformityProbability(value, u, limits)).toBeCloseTo(recomputed, 9);
    expect(conformityProbability(value, u, limits)).toBeCloseTo(published, 2);
  });
});

// Source: JCGM 106:2012, 8.3.3, Doppler radar (from memory; recomputed equal): the speed at which 100 km/h was exceeded with 99.9 %.
it('E-7, a guarded rejection', () => {
  const { recomputed } = caseOf<{ recomputed: number }>('E-7');
  const limit = 100 / (1 - 0.02 * normalQuantile(0.999, 0, 1));
  expect(limit).toBeCloseTo(recomputed, 5);
  expect(conformityProbability(limit, 0.02 * limit, { lower: 100, upper: null })).toBeCloseTo(0.999, 9);
});

// Source: JCGM 106:2012, 9.5; set-ups partly from memory, risks recomputed by scipy.
describe('the global risks', () => {
  interface Risk {
    consumer_risk_global: number;
    producer_risk_global: number;
    P_accept: number;
    P_conforming: number;
  }
  const expected = (risk: Risk) => ({
    consumer: expect.closeTo(risk.consumer_risk_global, 10) as number,
    producer: expect.closeTo(risk.producer_risk_global, 10) as number,
    accepted: expect.closeTo(risk.P_accept, 9) as number,
    conforming: expect.closeTo(risk.P_conforming, 9) as number,
  });

  it('E-8, precision resistors, without and with a guard band', () => {
    const { simple_acceptance, guard_band_w_2um } = caseOf<{ simple_acceptance: Risk; guard_band_w_2um: Risk }>('E-8');
    const process = { mean: 1500, processDeviation: 0.12, standardUncertainty: 0.04, lower: 1499.8, upper: 1500.2 };
    expect(globalRisk({ ...process, guardWidth: 0 })).toEqual(expected(simple_acceptance));
    expect(globalRisk({ ...process, guardWidth: 0.08 })).toEqual(expected(guard_band_w_2um));
  });

  const { grid } = caseOf<{ grid: (Risk & Record<'y0' | 'u0' | 'um' | 'TL' | 'TU' | 'guard_w', number>)[] }>('E-9');
  it.each(grid)('E-9, process $u0, measurement $um, guard $guard_w', (one) => {
    const { y0: mean, u0: processDeviation, um: standardUncertainty, TL: lower, TU: upper, guard_w: guardWidth } = one;
    const risk = globalRisk({ mean, processDeviation, standardUncertainty, lower, upper, guardWidth });
    expect(risk).toEqual(expected(one));
    expect(risk.accepted).toBeCloseTo(risk.conforming - risk.producer + risk.consumer, 12);
  });

  it('E-10, one limit', () => {
    const process = {
      mean: 0.2,
      processDeviation: 0.4,
      standardUncertainty: 0.1,
      lower: null,
      upper: 1,
      guardWidth: 0,
    };
    expect(globalRisk(process)).toEqual(expected(caseOf<Risk>('E-10')));
  });
});

// Source: ILAC-G8:09/2019, 4.2 and Table 2; boundaries inclusive; recomputed.
describe('E-11, the decision rules', () => {
  const { checks } = caseOf<{
    checks: (Record<'y' | 'U' | 'TL' | 'TU' | 'w' | 'AL' | 'AU' | 'p_conform', number> &
      Record<'binary' | 'non_binary', string>)[];
  }>('E-11');
  const words: Partial<Record<string, string>> = {
    pass: 'conforming ',
    fail: 'nonconforming ',
    'conditional pass': 'conditional inside',
    'conditional fail': 'conditional outside',
  };

  it.each(checks)('$y V, guard band $w V: $binary, or $non_binary', (check) => {
    const { y, U, TL, TU, w, AL, AU, p_conform } = check;
    const limits = { lower: TL, upper: TU };
    const guarded = judgeReading(y, limits, { rule: 'guarded', expandedUncertainty: w });
    expect(guarded.verdict).toBe(words[check.binary]?.trim());
    const { verdict, side } = judgeReading(y, limits, { rule: 'non-binary', expandedUncertainty: w });
    expect(`${verdict} ${side ?? ''}`).toBe(words[check.non_binary]);
    expect(acceptanceLimits(limits, w)).toEqual({
      lower: expect.closeTo(AL, 9) as number,
      upper: expect.closeTo(AU, 9) as number,
    });
    expect(conformityProbability(y, U / 2, limits)).toBeCloseTo(p_conform, 8);
  });

  it.each([
    ['6 sigma', 3],
    ['3 sigma', 1.5],
    ['ILAC-G8:2009 rule', 1],
    ['ISO 14253-1:2017', 0.83],
    ['simple acceptance', 0],
  ])('at the acceptance limit of the %s the risk is as its table says', (rule, width) => {
    const row = reference.ilac_g8.table.find((one) => one.rule === rule);
    const U = 0.1;
    const atLimit = 1 - conformityProbability(1 - width * U, U / 2, { lower: null, upper: 1 });
    expect(atLimit / (row?.recomputed_max_specific_PFA_one_sided_U_eq_2u ?? -1)).toBeCloseTo(1, 6);
    expect(1 - normalCdf(2 * width, 0, 1)).toBeCloseTo(atLimit, 12);
  });

  it('an uncritical rule, w = -U, rejects wrongly with less than 2.5 %', () => {
    expect(conformityProbability(1.1, 0.05, { lower: null, upper: 1 })).toBeLessThan(0.025);
    expect(acceptanceLimits({ lower: 0, upper: 1 }, -0.1)).toEqual({ lower: -0.1, upper: 1.1 });
  });

  it('the guard band is U under both rules that have one', () => {
    expect(guardBand('simple', 0.1)).toBe(0);
    expect(guardBand('guarded', 0.1)).toBe(0.1);
    expect(guardBand('non-binary', 0.1)).toBe(0.1);
  });
});
