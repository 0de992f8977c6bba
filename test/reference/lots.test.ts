import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { type FormulaKey } from '#shared/measurement/formula';
import { lotSampling } from '#shared/sampling/lot-sampling';
import { type Aql, type InspectionLevel } from '#shared/sampling/scheme';
import { judgeSample, type JudgedCharacteristic, type UnitReadings } from '#shared/verdict/judge-sample';

// Three lots whose readings an independent circuit simulator (ngspice 39) made with random tolerances; what must be decided
// was computed apart from this program. Source and plan stand in each lot's .json.

interface StatedCharacteristic {
  key: string;
  class: 'major' | 'minor';
  lsl?: number;
  usl?: number;
  computed?: string;
}

interface StatedLot {
  plan: {
    inspectionLevel: InspectionLevel;
    aql: { major: Aql | number; minor: Aql | number };
    characteristics: StatedCharacteristic[];
  };
  lotSize: number;
  code: string;
  sampleSize: number;
  acRe: Record<'major' | 'minor', [number, number]>;
  nonconformingUnits: Record<'major' | 'minor', number>;
  unitsFailing: Record<string, string[]>;
  verdict: 'accept' | 'reject';
}

const FORMULA_OF: Record<string, { key: FormulaKey; inputs: Record<string, string> }> = {
  regulation: { key: 'load-regulation', inputs: { no_load: 'v_no_load', loaded: 'v_loaded' } },
  balance: { key: 'transformer-balance', inputs: { half1: 'half1_peak', half2: 'half2_peak' } },
};

/** The half-winding peaks are columns of the rack file without limits of their own. */
const PEAKS: StatedCharacteristic[] = [
  { key: 'half1_peak', class: 'minor' },
  { key: 'half2_peak', class: 'minor' },
];

const read = (name: string) => readFileSync(new URL(`./data/lots/${name}`, import.meta.url), 'utf8');
const stated = (name: string): StatedLot => JSON.parse(read(`${name}.json`));

function readings(name: string): UnitReadings[] {
  const [head = '', ...rows] = read(`${name}.csv`).trim().split(/\r?\n/);
  const [, ...keys] = head.split(',');
  return rows.map((row) => {
    const [unit, ...values] = row.split(',').map(Number);
    return { unit: unit ?? NaN, values: new Map(keys.map((key, at) => [key, values[at] ?? NaN])), setAside: null };
  });
}

function judge(name: string) {
  const { plan, lotSize } = stated(name);
  const all = [...plan.characteristics, ...PEAKS];
  const sampling = lotSampling({
    lotSize,
    severity: 'normal',
    level: plan.inspectionLevel,
    classAqls: [
      { class: 'major', aql: Number(plan.aql.major).toFixed(1) as Aql },
      { class: 'minor', aql: Number(plan.aql.minor).toFixed(1) as Aql },
    ],
    characteristics: all.map((each) => ({ key: each.key, class: each.class, level: null, aql: null })),
  });
  const characteristics: JudgedCharacteristic[] = all.map((each) => ({
    key: each.key,
    kind: each.computed === undefined ? 'measured' : 'computed',
    class: each.class,
    lowerLimit: each.lsl ?? null,
    upperLimit: each.usl ?? null,
    formula: FORMULA_OF[each.key] ?? null,
  }));
  return { sampling, verdict: judgeSample({ characteristics, groups: sampling.groups, units: readings(name) }) };
}

describe.each(['lot-good', 'lot-bad-tap', 'lot-low-capacitance'])('%s', (name) => {
  const lot = stated(name);
  const { sampling, verdict } = judge(name);

  it('has the stated code letter and sample size', () => {
    expect(sampling.sampleSize).toBe(lot.sampleSize);
    expect(sampling.groups.map((group) => group.codeLetter)).toEqual([lot.code, lot.code]);
    expect(verdict.units).toHaveLength(lot.sampleSize);
  });

  it('finds exactly the stated units failing, each in the stated characteristics', () => {
    const failing = verdict.units.filter((unit) => unit.verdict === 'nonconforming');
    expect(Object.fromEntries(failing.map((unit) => [unit.unit, unit.failed]))).toEqual(lot.unitsFailing);
    expect(verdict.units.filter((unit) => unit.verdict === 'conforming')).toHaveLength(lot.sampleSize - failing.length);
  });

  it.each(['major', 'minor'] as const)('counts the stated %s units against the stated numbers', (of) => {
    const group = verdict.groups.find((each) => each.group.class === of);
    expect([group?.group.acceptance, group?.group.rejection]).toEqual(lot.acRe[of]);
    expect(group?.found).toBe(lot.nonconformingUnits[of]);
    expect(group?.judged).toBe(lot.sampleSize);
  });

  it('comes to the stated verdict', () => {
    expect(verdict.lot.verdict).toBe(lot.verdict === 'accept' ? 'accepted' : 'rejected');
    expect(verdict.lot.complete).toBe(true);
    expect(verdict.lot.stop).toBe(lot.verdict === 'reject');
  });
});

describe('the reasons', () => {
  it('of the good lot name both acceptance numbers', () => {
    expect(judge('lot-good').verdict.lot.reason).toBe(
      'Accepted: no major nonconforming units in 80, acceptance number 2 (AQL 1.0, normal, code J); ' +
        'no minor nonconforming units in 80, acceptance number 7 (AQL 4.0, normal, code J).',
    );
  });

  it('of the lot with low capacitance name the rejection number', () => {
    expect(judge('lot-low-capacitance').verdict.lot.reason).toBe(
      'Rejected: 6 major nonconforming units in 80, rejection number 3 (AQL 1.0, normal, code J).',
    );
  });

  it('of the lot with a bad tap name the minor class', () => {
    expect(judge('lot-bad-tap').verdict.lot.reason).toBe(
      'Rejected: 4 minor nonconforming units in 50, rejection number 4 (AQL 2.5, normal, code H).',
    );
  });
});
