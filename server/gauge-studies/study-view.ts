import { type StudyResults } from '#shared/contract/gauge-studies';
import { type StudyReadings } from '#shared/statistics/gauge-study/gauge-study';
import { leadingTable } from '#shared/statistics/gauge-study/leading-table';
import { gaugeStudyResults } from '#shared/statistics/gauge-study/study-results';
import { gaugeShare } from '#shared/statistics/gauge-study/study-verdict';
import { type StudyRow } from './gauge-study-queries';

/** How many readings a study has, and how many it needs. */
export function countsOf({ values, parts, persons, trials }: StudyRow): { entered: number; needed: number } {
  const entered = values.flat(2).filter((value) => value !== null).length;
  return { entered, needed: parts.length * persons.length * trials };
}

/** The readings where none is missing. */
function completeReadings({ values }: StudyRow): StudyReadings | null {
  const readings = values.map((rows) => rows.map((cell) => cell.filter((value) => value !== null)));
  const isWhole = values.every((rows) => rows.every((cell) => !cell.includes(null)));
  return isWhole ? readings : null;
}

/** What the study says when no reading is missing; standard deviations in SI base units. */
export function resultsOf(row: StudyRow): StudyResults | null {
  const readings = completeReadings(row);
  if (readings === null) return null;
  const { lowerLimit, upperLimit } = row;
  return gaugeStudyResults(readings, lowerLimit === null || upperLimit === null ? null : upperLimit - lowerLimit);
}

/** The gauge's share of the total variation, by the analysis of variance to go by. */
export function gaugeOfVariation(results: StudyResults | null): number | null {
  return results === null ? null : (gaugeShare(leadingTable(results).analysis)?.ofVariation ?? null);
}
