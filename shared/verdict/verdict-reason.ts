import { type SamplingGroup } from '../sampling/sampling-group';
import { formatNumber } from '../quantities/format-number';
import { type CharacteristicVerdict } from './sample-verdict';

/**
 * Why a characteristic is not judged: nothing was read (or computed), or its uncertainty is not known under a decision rule that
 * needs it; null where it is judged.
 */
export function unjudgedReason({
  verdict,
  value,
}: Pick<CharacteristicVerdict, 'verdict' | 'value'>): 'no reading' | 'uncertainty unknown' | null {
  if (verdict !== 'not judged') return null;
  return value === null ? 'no reading' : 'uncertainty unknown';
}

const count = (value: number) => formatNumber(value, 0);

function foundInSample(group: SamplingGroup, found: number, units: number): string {
  const noun = found === 1 ? 'unit' : 'units';
  const sample = units === group.sampleSize ? count(units) : `${count(units)} of ${count(group.sampleSize)}`;
  return `${found === 0 ? 'no' : count(found)} ${group.class} nonconforming ${noun} in ${sample}`;
}

function planWords(group: SamplingGroup): string {
  const row = group.planLetter === group.codeLetter ? '' : `, plan ${group.planLetter}`;
  const whole = group.wholeLot ? ', whole lot' : '';
  return `(AQL ${group.aql}, ${group.severity}, code ${group.codeLetter}${row}${whole})`;
}

/**
 * Why a group rejects, without the leading word: "4 major nonconforming units in 125, rejection number 4 (AQL 1.0, normal,
 * code K)". Before the sample is complete the units judged so far are named: "in 48 of 125".
 */
export function rejectionClause(group: SamplingGroup, found: number, judged: number): string {
  return `${foundInSample(group, found, judged)}, rejection number ${group.rejection} ${planWords(group)}`;
}

/**
 * Why a group accepts, without the leading word. Reduced plans leave a gap between their two numbers: a lot in the gap is
 * accepted, and the next one comes under normal inspection. Source: MIL-STD-105E, 4.7.4 and (number from memory) 4.10.1.4.
 */
export function acceptanceClause(group: SamplingGroup, found: number): string {
  const inGap = found > group.acceptance;
  const numbers = inGap
    ? `above acceptance number ${group.acceptance} and below rejection number ${group.rejection}, next lot normal`
    : `acceptance number ${group.acceptance}`;
  return `${foundInSample(group, found, group.sampleSize)}, ${numbers} ${planWords(group)}`;
}

/** How far an open sample is: "No rejection number reached, 48 of 80 units judged, 1 undecided." */
export function openReason(progress: { judged: number; undecided: number; sampleSize: number }): string {
  const undecided = progress.undecided > 0 ? `, ${count(progress.undecided)} undecided` : '';
  return `No rejection number reached, ${count(progress.judged)} of ${count(progress.sampleSize)} units judged${undecided}.`;
}

/** Why a group that has reached its rejection number does not reject yet: units in it may still move to a worse class. */
export function uncertainReason(group: SamplingGroup, found: number, unsettled: number): string {
  const units = unsettled === 1 ? '1 unit lacks' : `${count(unsettled)} units lack`;
  return `${foundInSample(group, found, group.sampleSize)}, rejection number ${group.rejection} reached but not certain: ${units} readings of a worse class.`;
}

/** A clause as a sentence of its own: "Rejected: ... ." */
export function sentence(word: 'Rejected' | 'Accepted', clauses: readonly string[]): string {
  return `${word}: ${clauses.join('; ')}.`;
}
