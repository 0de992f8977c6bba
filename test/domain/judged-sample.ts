import { lotSampling, type SamplingGroup } from '#shared/sampling/lot-sampling';
import { type NonconformityClass } from '#shared/sampling/scheme';
import {
  judgeSample,
  type JudgedCharacteristic,
  type SampleVerdict,
  type UnitReadings,
} from '#shared/verdict/judge-sample';

/** Every value of these plans conforms at 0 and fails at 10. */
export const measured = (key: string, of: NonconformityClass): JudgedCharacteristic => ({
  key,
  kind: 'measured',
  class: of,
  lowerLimit: null,
  upperLimit: 1,
  formula: null,
});

const label: JudgedCharacteristic = { ...measured('label', 'minor'), kind: 'attribute', upperLimit: null };
export const PLAN = [
  measured('insulation', 'critical'),
  measured('ripple', 'major'),
  measured('loaded', 'major'),
  label,
];

/** n 20 for all: critical 0/1, major AQL 4.0 2/3, minor AQL 6.5 3/4 (lot 150, level II, code F). */
export const GROUPS = groupsOf(PLAN, 150);

export function groupsOf(
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

export const GOOD = { insulation: 0, ripple: 0, loaded: 0, label: true };

export function unit(
  number: number,
  values: Record<string, number | boolean> = {},
  setAside: string | null = null,
): UnitReadings {
  return { unit: number, values: new Map(Object.entries(values)), setAside };
}

/** Units 1 to n, good but for what is given by number. */
export function sample(n: number, differing: Record<number, Record<string, number | boolean>> = {}): UnitReadings[] {
  return Array.from({ length: n }, (_, index) => unit(index + 1, { ...GOOD, ...differing[index + 1] }));
}

export const judge = (units: UnitReadings[], submitting = false) =>
  judgeSample({ characteristics: PLAN, groups: GROUPS, units, submitting });

export const foundIn = (verdict: SampleVerdict) =>
  Object.fromEntries(verdict.groups.map((each) => [each.group.class, each.found]));
