import { type AverageAndRange } from './average-and-range';
import { type VarianceTable } from './gauge-study';

/** Above this chance of the interaction's F the interaction is pooled. Common practice; AIAG MSA, 4th edition. */
export const POOLING_CHANCE = 0.25;

/** What a whole study says, by both methods. */
export interface GaugeStudyResults {
  varianceWithInteraction: VarianceTable;
  variancePooled: VarianceTable;
  /** Whether the pooled table is the one to go by. */
  pooled: boolean;
  averageRange: AverageAndRange;
}

/** The analysis of variance to go by. */
export function leadingTable(results: GaugeStudyResults): VarianceTable {
  return results.pooled ? results.variancePooled : results.varianceWithInteraction;
}
