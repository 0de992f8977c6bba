import { type Aql, type InspectionLevel, type NonconformityClass, type Severity } from './scheme';
import { type SingleSamplingPlan } from './single-sampling-plan';

/** The characteristics of a plan that share class, level and AQL, with the sampling plan they are judged by. */
export interface SamplingGroup extends SingleSamplingPlan {
  /** Class, level and AQL in one word, for instance "major-II-1.0". */
  key: string;
  class: NonconformityClass;
  level: InspectionLevel;
  aql: Aql;
  /** Keys of the characteristics, in the order of the plan. */
  characteristicKeys: string[];
  severity: Severity;
}
