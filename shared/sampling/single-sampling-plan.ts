import { codeLetter } from './code-letter';
import { type MasterTable } from './master-table';
import { type Aql, type CodeLetter, type InspectionLevel, type PlanLetter, type Severity } from './scheme';
import { NORMAL_TABLE, REDUCED_TABLE, TIGHTENED_TABLE } from './single-sampling-tables';

/** What decides how many units of a lot are inspected for one AQL. */
export interface SamplingQuestion {
  /** Units in the lot. */
  lotSize: number;
  level: InspectionLevel;
  aql: Aql;
  severity: Severity;
}

/** A single-sampling plan as it applies to one lot. */
export interface SingleSamplingPlan {
  /** Letter by lot size and level. */
  codeLetter: CodeLetter;
  /** Letter of the row whose numbers apply once the arrows are followed. */
  planLetter: PlanLetter;
  /** Units to inspect, never more than the lot holds. */
  sampleSize: number;
  /** Largest number of nonconforming units at which the lot is accepted. */
  acceptance: number;
  /** Smallest number of nonconforming units at which the lot is rejected. */
  rejection: number;
  /** Whether the sample is the whole lot. */
  wholeLot: boolean;
}

const TABLES: Readonly<Record<Severity, MasterTable>> = {
  normal: NORMAL_TABLE,
  tightened: TIGHTENED_TABLE,
  reduced: REDUCED_TABLE,
};

function followArrows(table: MasterTable, letter: CodeLetter, aql: Aql) {
  let index = table.findIndex((row) => row.letter === letter);
  for (let row = table[index]; row !== undefined; row = table[index]) {
    const cell = row.cells.get(aql);
    if (typeof cell === 'object') return { planLetter: row.letter, sampleSize: row.sampleSize, ...cell };
    if (cell !== 'down' && cell !== 'up') break;
    index += cell === 'down' ? 1 : -1;
  }
  throw new RangeError(`aql ${aql} has no plan for code letter ${letter}.`);
}

/**
 * The single-sampling plan for a lot: sample size in units, acceptance and rejection number.
 *
 * An arrow leads to the first plan below or above, which then gives the sample size as well. Where the sample size
 * reaches the lot size the whole lot is inspected, and the same numbers still decide it.
 * Source: MIL-STD-105E, Tables I and II-A to II-C; the same in ANSI/ASQ Z1.4.
 *
 * @throws {RangeError} unless lotSize is a whole number of at least 1 and the AQL is one of the tables
 */
export function singleSamplingPlan({ lotSize, level, aql, severity }: SamplingQuestion): SingleSamplingPlan {
  const letter = codeLetter(lotSize, level);
  const plan = followArrows(TABLES[severity], letter, aql);
  return {
    ...plan,
    codeLetter: letter,
    sampleSize: Math.min(plan.sampleSize, lotSize),
    wholeLot: plan.sampleSize >= lotSize,
  };
}
