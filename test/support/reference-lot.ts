import { type Characteristic, type RevisionBody } from '#shared/contract/plans';
import { type Aql } from '#shared/sampling/scheme';
import { readFileSync } from 'node:fs';
import { measured } from './bench-fixtures';
import { SIMPLE_RULES } from './plan-bodies';

/** A lot of readings made by an independent circuit simulator, with what must be decided of it. */
export interface ReferenceLot {
  csv: string;
  lotSize: number;
  code: string;
  sampleSize: number;
  acRe: Record<'major' | 'minor', [number, number]>;
  nonconformingUnits: Record<'major' | 'minor', number>;
  unitsFailing: Record<string, string[]>;
  verdict: 'accept' | 'reject';
  plan: RevisionBody;
}

interface GivenPlan {
  inspectionLevel: RevisionBody['level'];
  aql: Record<'major' | 'minor', number>;
  characteristics: { key: string; class: 'major' | 'minor'; lsl?: number; usl?: number; computed?: string }[];
}

const COMPUTED = {
  regulation: { key: 'load-regulation', inputs: { no_load: 'v_no_load', loaded: 'v_loaded' }, constants: {} },
  balance: { key: 'transformer-balance', inputs: { half1: 'half1_peak', half2: 'half2_peak' }, constants: {} },
} as const;

function characteristicOf(given: GivenPlan['characteristics'][number]): Characteristic {
  const limits = { lower: given.lsl, upper: given.usl };
  const base = measured(given.key, given.class, limits);
  if (given.computed === undefined || base.kind !== 'measured') return base;
  const { key, name, class: nonconformityClass, condition, method, caution, ownLevel, ownAql } = base;
  const { decimals, target, lowerLimit, upperLimit } = base;
  return {
    kind: 'computed',
    ...{ key, name, class: nonconformityClass, condition, method, caution, ownLevel, ownAql },
    ...{ unit: '%', decimals, target, lowerLimit, upperLimit },
    formula: COMPUTED[given.key as keyof typeof COMPUTED],
  };
}

function planOf(given: GivenPlan): RevisionBody {
  // The half-winding peaks have no limits of their own; they feed the balance.
  const halves = [measured('half1_peak', 'minor', {}), measured('half2_peak', 'minor', {})];
  return {
    level: given.inspectionLevel,
    classAqls: [
      { class: 'major', aql: given.aql.major.toFixed(1) as Aql },
      { class: 'minor', aql: given.aql.minor.toFixed(1) as Aql },
    ],
    characteristics: [...halves, ...given.characteristics.map(characteristicOf)],
    ...SIMPLE_RULES,
    changeNote: '',
  };
}

export function referenceLot(name: 'lot-good' | 'lot-low-capacitance' | 'lot-bad-tap'): ReferenceLot {
  const folder = new URL('../reference/data/lots/', import.meta.url);
  const answer = JSON.parse(readFileSync(new URL(`${name}.json`, folder), 'utf8')) as Omit<
    ReferenceLot,
    'csv' | 'plan'
  > & {
    plan: GivenPlan;
  };
  return { ...answer, csv: readFileSync(new URL(`${name}.csv`, folder), 'utf8'), plan: planOf(answer.plan) };
}
