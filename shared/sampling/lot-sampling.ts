import { type SamplingGroup } from './sampling-group';
import { AQLS, INSPECTION_LEVELS, NONCONFORMITY_CLASSES } from './scheme';
import { type Aql, type InspectionLevel, type NonconformityClass, type Severity } from './scheme';
import { singleSamplingPlan } from './single-sampling-plan';

export type { SamplingGroup };

/** A characteristic as sampling sees it; null means the plan's own level and the AQL of its class. */
export interface SampledCharacteristic {
  key: string;
  class: NonconformityClass;
  level: InspectionLevel | null;
  aql: Aql | null;
}

/** A lot and the parts of its inspection plan that decide what is drawn. */
export interface LotSamplingInput {
  /** Units in the lot. */
  lotSize: number;
  severity: Severity;
  /** The level of every characteristic that names none of its own. */
  level: InspectionLevel;
  classAqls: readonly { class: NonconformityClass; aql: Aql }[];
  characteristics: readonly SampledCharacteristic[];
}

/** How a lot is sampled: its groups, and the units to draw, which is the largest sample of all groups. */
export interface LotSampling {
  groups: SamplingGroup[];
  sampleSize: number;
}

/** Worst class first, then general levels before special, then the stricter AQL. */
function byUrgency(a: SamplingGroup, b: SamplingGroup): number {
  return (
    NONCONFORMITY_CLASSES.indexOf(a.class) - NONCONFORMITY_CLASSES.indexOf(b.class) ||
    Number(a.level.startsWith('S')) - Number(b.level.startsWith('S')) ||
    INSPECTION_LEVELS.indexOf(b.level) - INSPECTION_LEVELS.indexOf(a.level) ||
    AQLS.indexOf(a.aql) - AQLS.indexOf(b.aql)
  );
}

function aqlOf(characteristic: SampledCharacteristic, input: LotSamplingInput): Aql {
  const aql = characteristic.aql ?? input.classAqls.find((entry) => entry.class === characteristic.class)?.aql;
  if (aql === undefined) {
    throw new RangeError(
      `classAqls has no AQL for class ${characteristic.class} of characteristic ${characteristic.key}.`,
    );
  }
  return aql;
}

function newGroup(characteristic: SampledCharacteristic, input: LotSamplingInput): SamplingGroup {
  const { lotSize, severity } = input;
  const level = characteristic.level ?? input.level;
  const aql = aqlOf(characteristic, input);
  const plan = singleSamplingPlan({ lotSize, level, aql, severity });
  const numbers = characteristic.class === 'critical' ? { acceptance: 0, rejection: 1 } : {};
  const key = `${characteristic.class}-${level}-${aql}`;
  return { ...plan, ...numbers, key, class: characteristic.class, level, aql, characteristicKeys: [], severity };
}

/**
 * Groups a plan's characteristics by class, level and AQL and gives each group its sampling plan for this lot.
 *
 * A critical group accepts on 0 and rejects on 1 whatever the tables give; they decide its sample size only. Groups come
 * worst class first, general levels before special ones.
 *
 * @throws {RangeError} for a plan without characteristics, a class without AQL (named with its characteristic), or a
 *   lotSize that is not a whole number of at least 1
 */
export function lotSampling(input: LotSamplingInput): LotSampling {
  if (input.characteristics.length === 0)
    throw new RangeError('characteristics must name at least one characteristic.');
  const groups = new Map<string, SamplingGroup>();
  for (const characteristic of input.characteristics) {
    const fresh = newGroup(characteristic, input);
    const group = groups.get(fresh.key) ?? fresh;
    group.characteristicKeys.push(characteristic.key);
    groups.set(group.key, group);
  }
  const ordered = [...groups.values()].sort(byUrgency);
  return { groups: ordered, sampleSize: Math.max(...ordered.map((group) => group.sampleSize)) };
}
