import { type FormulaKey } from '../measurement/formula';
import { type SamplingGroup } from '../sampling/sampling-group';
import { type NonconformityClass } from '../sampling/scheme';
import { type Component } from '../uncertainty/component';
import { type ReadingVerdict } from './reading-verdict';

/** A characteristic of a plan, as far as judging needs it. Limits are in SI base units; null is no limit. */
export interface JudgedCharacteristic {
  key: string;
  kind: 'measured' | 'computed' | 'attribute';
  class: NonconformityClass;
  lowerLimit: number | null;
  upperLimit: number | null;
  /** For a computed characteristic: its formula, and for each formula input the key of the characteristic it takes. */
  formula: { key: FormulaKey; inputs: Record<string, string>; constants?: Record<string, number> } | null;
}

/** What was found on one unit. */
export interface UnitReadings {
  /** Number of the unit in draw order, from 1. */
  unit: number;
  /** The counting reading by characteristic key, in SI base units; for an attribute whether it passes. */
  values: ReadonlyMap<string, number | boolean>;
  /** Why the inspector set the unit aside, or null. */
  setAside: string | null;
  /**
   * Quality's ruling, which settles doubt: conditional readings and a unit set aside. It makes no failed reading good, and no
   * missing one.
   */
  ruling?: 'conforming' | 'nonconforming' | null;
  /** Uncertainty budgets of the counting readings by characteristic key, where the decision rule needs them. */
  components?: ReadonlyMap<string, readonly Component[]>;
}

/** One characteristic of one unit. */
export interface CharacteristicVerdict {
  /** The value judged; null where there is none, or where a formula has no value for the readings given. */
  value: number | boolean | null;
  verdict: ReadingVerdict | 'not judged';
  /** On which side of the limit a conditional one lies. */
  side: 'inside' | 'outside' | null;
  /** U of the value; null where it is not known, or where the decision rule does not ask for it. */
  expandedUncertainty: number | null;
}

/** One unit. */
export interface UnitVerdict {
  unit: number;
  verdict: 'conforming' | 'nonconforming' | 'undecided' | 'not judged';
  /** Whether it was set aside and nobody has ruled on it: the doubt is about the unit as a whole. */
  setAside: boolean;
  /** Keys of the characteristics that fail, in the order of the plan. */
  failed: string[];
  /** The class the unit counts at: the worst it fails in. */
  worstClass: NonconformityClass | null;
  /** Keys of the characteristics still to be judged on this unit; none on a unit set aside. */
  missing: string[];
  characteristics: ReadonlyMap<string, CharacteristicVerdict>;
}

/** One sampling group. */
export interface GroupVerdict {
  group: SamplingGroup;
  /** Units that count as nonconforming in this group. */
  found: number;
  /** Units set aside or conditional, on which this group waits. */
  undecided: number;
  /** Units of the group's sample on which nothing of this group is left to be judged. */
  judged: number;
  /** How many more nonconforming units reach the rejection number; 0 once it is reached. */
  moreToReject: number;
  verdict: 'open' | 'accepted' | 'rejected';
  reason: string;
}

/** The lot. */
export interface LotVerdict {
  verdict: 'continue' | 'accepted' | 'rejected';
  reason: string;
  /** Whether a rejection number is reached, so that the rejection is certain. */
  stop: boolean;
  /** Whether every unit of every group is judged or set aside, so that nothing is left to measure. */
  complete: boolean;
}

/** Everything judged about a sample. */
export interface SampleVerdict {
  units: UnitVerdict[];
  groups: GroupVerdict[];
  lot: LotVerdict;
}
