import { type Chance } from './chance';
import { type DemoPart } from './demo-part';
import { type Production } from './production';
import { supplyUnit } from './supply-model';

/** What a person or a rack would read on a unit, by characteristic key, in SI base units; for attributes what is wrong. */
export interface UnitTruth {
  values: ReadonlyMap<string, number>;
  /** Reasons for which an attribute fails, by its key. */
  failures: ReadonlyMap<string, string>;
}

/** The unit, in draw order, on which the one reversed plug of such a delivery is found. */
const REVERSED_UNIT = 43;

function failuresOf(unit: number, { fault, smearedShare }: Production, chance: Chance): Map<string, string> {
  const failures = new Map<string, string>();
  if (chance.happens(smearedShare)) failures.set('marking', chance.pick(['Smeared', 'Smeared', 'Rating line missing']));
  if (fault === 'reversed-plug' && unit === REVERSED_UNIT) failures.set('polarity', 'Reversed');
  return failures;
}

/** Insulation resistances spread over decades; testers show them in round figures. */
function insulationOhms(chance: Chance): number {
  return Math.round(10 ** chance.about(2.95, 0.13)) * 1e6;
}

/** A drawn unit as its readings will find it. */
export function unitTruth(part: DemoPart, unit: number, production: Production, chance: Chance): UnitTruth {
  const output = supplyUnit(part.body.model, production, chance);
  const values = new Map<string, number>([
    ['insulation', insulationOhms(chance)],
    ['v_no_load', output.noLoadVolts],
    ['v_loaded', output.loadedVolts],
    ['ripple_pp', output.rippleVolts],
    ['temp_rise', chance.about(31, 2)],
    ['cable_length', chance.about(1.8, 0.009)],
    ['no_load_power', output.noLoadWatts],
    ['current_limit', output.currentLimitAmperes],
  ]);
  if (output.halfPeaks) {
    values.set('half1_peak', output.halfPeaks[0]);
    values.set('half2_peak', output.halfPeaks[1]);
  }
  return { values, failures: failuresOf(unit, production, chance) };
}
