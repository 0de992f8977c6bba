import { type StudyReadings, type VarianceTable } from './gauge-study';
import { spreadAnalysis } from './spread-analysis';
import { studyShape } from './study-shape';
import { sumsOfSquares } from './sums-of-squares';
import { meanSquare, varianceLine, type Divisor } from './variance-line';

/**
 * Analysis of variance of a study, both factors random, with the interaction of part and person kept as a source. Parts and
 * persons are tested against the interaction, the interaction against the repeatability; the table says so line by line,
 * since some printed tables divide all by the repeatability.
 *
 *     EV² = MSe,  INT² = (MSi − MSe) ÷ r,  AV² = (MSo − MSi) ÷ (p r),  PV² = (MSp − MSi) ÷ (o r)
 *
 * for p parts, o persons, r trials. Source: AIAG Measurement Systems Analysis, 4th edition; Montgomery, Design and Analysis
 * of Experiments (from memory).
 *
 * @param tolerance upper minus lower limit, in the readings' unit; null where there are not both
 * @throws {StudyUneven}
 * @throws {ReadingNotFinite} for NaN or an infinite reading
 */
export function varianceWithInteraction(readings: StudyReadings, tolerance: number | null): VarianceTable {
  const { parts, persons, trials } = studyShape(readings);
  const squares = sumsOfSquares(readings);
  const crossed: Divisor = { against: 'interaction', squares: squares.interaction };
  const interaction = meanSquare(squares.interaction);
  const repeatability = meanSquare(squares.repeatability);
  const found = {
    repeatability,
    interaction: (interaction - repeatability) / trials,
    persons: (meanSquare(squares.persons) - interaction) / (parts * trials),
    parts: (meanSquare(squares.parts) - interaction) / (persons * trials),
  };
  return {
    lines: [
      varianceLine('parts', squares.parts, crossed),
      varianceLine('persons', squares.persons, crossed),
      varianceLine('interaction', squares.interaction, { against: 'repeatability', squares: squares.repeatability }),
      varianceLine('repeatability', squares.repeatability, null),
      varianceLine('total', squares.total, null),
    ],
    analysis: spreadAnalysis(found, tolerance),
  };
}

/**
 * The same with the interaction pooled into the repeatability: their sums of squares and degrees of freedom are added, and
 * the pooled mean square takes the place of both. Units, source and errors as above.
 *
 * @throws {StudyUneven}
 * @throws {ReadingNotFinite} for NaN or an infinite reading
 */
export function variancePooled(readings: StudyReadings, tolerance: number | null): VarianceTable {
  const { parts, persons, trials } = studyShape(readings);
  const squares = sumsOfSquares(readings);
  const pooled = {
    sum: squares.interaction.sum + squares.repeatability.sum,
    degrees: squares.interaction.degrees + squares.repeatability.degrees,
  };
  const divisor: Divisor = { against: 'repeatability', squares: pooled };
  const repeatability = meanSquare(pooled);
  const found = {
    repeatability,
    interaction: null,
    persons: (meanSquare(squares.persons) - repeatability) / (parts * trials),
    parts: (meanSquare(squares.parts) - repeatability) / (persons * trials),
  };
  return {
    lines: [
      varianceLine('parts', squares.parts, divisor),
      varianceLine('persons', squares.persons, divisor),
      varianceLine('repeatability', pooled, null),
      varianceLine('total', squares.total, null),
    ],
    analysis: spreadAnalysis(found, tolerance),
  };
}
