import { type Instrument } from '../contract/instruments';
import { type Characteristic, type RevisionBody } from '../contract/plans';
import { combinedStandardUncertainty } from '../uncertainty/combine';
import { type Component, unweighted } from '../uncertainty/component';
import { expandedUncertainty } from '../uncertainty/expanded-uncertainty';
import { chosenRange } from '../uncertainty/range-choice';
import { type ReadEntry, readingBudget, smallestScale } from '../uncertainty/reading-budget';
import { computedUncertainty } from '../verdict/computed-uncertainty';
import { judgedCharacteristic } from './judged-characteristic';

/** What a site measures with, as far as the uncertainty of a usual reading depends on it. */
export type SiteInstrument = Pick<Instrument, 'kind' | 'status' | 'ranges'>;

type Measured = Extract<Characteristic, { kind: 'measured' }>;
type Limits = Pick<Measured, 'target' | 'lowerLimit' | 'upperLimit'>;

/** A usual reading: the target, or the middle of two limits, or the one limit there is; undefined where there is none. */
export function typicalValue({ target, lowerLimit, upperLimit }: Limits): number | undefined {
  if (target !== null) return target;
  if (lowerLimit !== null && upperLimit !== null) return (lowerLimit + upperLimit) / 2;
  return upperLimit ?? lowerLimit ?? undefined;
}

/** A wave of this height on the smallest scale that shows it whole. */
function wholeWave(height: number, screenDivisions: number): ReadEntry {
  const voltsPerDivision = smallestScale(height, screenDivisions);
  const settings = { voltsPerDivision, probeFactor: 1, coupling: 'ac' } as const;
  return { kind: 'scope', scope: { form: 'whole', divisions: height / voltsPerDivision, ...settings } };
}

/** The budget of a reading of this value on one instrument; undefined where none of its ranges reads it. */
function budgetOn(value: number, characteristic: Measured, { ranges }: SiteInstrument): Component[] | undefined {
  const readAs = characteristic.entryMode === 'scope' ? 'scope' : 'direct';
  try {
    const range = chosenRange(ranges, null, value, { unit: characteristic.unit, readAs });
    if (range === undefined) return undefined;
    const entry: ReadEntry =
      range.form === 'graticule' ? wholeWave(Math.abs(value), range.screenDivisions) : { kind: 'direct' };
    return readingBudget(value, entry, range, characteristic.alternatePeaks);
  } catch (error) {
    if (error instanceof RangeError) return undefined;
    throw error;
  }
}

function combinedUncertainty(budget: readonly Component[]): number {
  return combinedStandardUncertainty(unweighted(budget));
}

/** The finest budget that the site's instruments give a usual reading. */
function finestBudget(characteristic: Measured, instruments: readonly SiteInstrument[]): Component[] | undefined {
  const value = typicalValue(characteristic);
  if (value === undefined) return undefined;
  const [first, ...others] = instruments
    .filter(({ kind, status }) => kind === characteristic.instrumentKind && status === 'in-service')
    .map((instrument) => budgetOn(value, characteristic, instrument))
    .filter((budget) => budget !== undefined);
  return others.reduce(
    (finest, other) => (finest && combinedUncertainty(other) < combinedUncertainty(finest) ? other : finest),
    first,
  );
}

/**
 * U of a usual reading of each characteristic, by its key, in SI base units: read on the finest instrument in service of the
 * kind that the plan asks for, at the target or between the limits; of a computed one out of the readings it takes. What no
 * instrument with an accuracy specification reads is left out.
 */
export function typicalUncertainties(
  { characteristics, coverageFactor }: Pick<RevisionBody, 'characteristics' | 'coverageFactor'>,
  instruments: readonly SiteInstrument[],
): Map<string, number> {
  const values = new Map<string, number>();
  const budgets = new Map<string, readonly Component[]>();
  const found = new Map<string, number>();
  for (const one of characteristics) {
    if (one.kind !== 'measured') continue;
    const [value, budget] = [typicalValue(one), finestBudget(one, instruments)];
    if (value === undefined || budget === undefined) continue;
    values.set(one.key, value);
    budgets.set(one.key, budget);
    found.set(one.key, expandedUncertainty(budget, coverageFactor));
  }
  for (const one of characteristics) {
    if (one.kind !== 'computed') continue;
    const u = uncertaintyOfComputed(one, values, budgets);
    if (u !== undefined) found.set(one.key, coverageFactor * u);
  }
  return found;
}

/** u of what is computed of usual readings; undefined where one of them is not known, or the formula has no value there. */
function uncertaintyOfComputed(
  characteristic: Characteristic,
  values: ReadonlyMap<string, number>,
  budgets: ReadonlyMap<string, readonly Component[]>,
): number | undefined {
  try {
    const propagated = computedUncertainty(judgedCharacteristic(characteristic), values, budgets);
    return propagated && combinedStandardUncertainty(propagated.components);
  } catch (error) {
    if (error instanceof RangeError) return undefined;
    throw error;
  }
}
