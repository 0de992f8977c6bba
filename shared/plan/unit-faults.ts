import { type Fault } from '../contract/problem';
import { MEASURAND_TITLES, type Measurand } from '../contract/plans';
import { FORMULAS } from '../measurement/formula';
import { unitParts } from '../quantities/display-unit';
import { type PlanContent } from './plan-content';

/** Whether two display units are of one kind of quantity: V and mV are, V and A are not. @throws {UnitNotKnown} */
export function isOfOneKind(one: string, other: string): boolean {
  return unitParts(one).unit === unitParts(other).unit;
}

/** The unit that each kind of measurement is in; those that are not named may be in any. */
const MEASURED_IN: Partial<Record<Measurand, readonly string[]>> = {
  ripple: ['V'],
  'ripple-rms': ['V'],
  'loaded-voltage': ['V'],
  'no-load-voltage': ['V'],
  'half-winding-peak': ['V'],
  current: ['A'],
  'input-power': ['W'],
  'output-power': ['W'],
  'insulation-resistance': ['Ω'],
  'junction-potential': ['V'],
  frequency: ['Hz'],
  temperature: ['°C', 'K'],
  dimension: ['mm'],
};

/** Whether a kind of measurement is in this unit or a multiple of it. */
function isMeasuredIn(measurand: Measurand, unit: string): boolean {
  const units = MEASURED_IN[measurand];
  return units === undefined || units.some((one) => isOfOneKind(one, unit));
}

/**
 * A scope reads volts, a kind of measurement and a formula have their own kind of quantity, and what is judged by eye needs a
 * requirement.
 */
export function unitFaults({ characteristics }: PlanContent): Fault[] {
  return characteristics.flatMap((one, index): Fault[] => {
    const fault = (field: string, message: string) => [{ path: ['characteristics', index, field], message }];
    switch (one.kind) {
      case 'measured':
        if (one.entryMode === 'scope' && !isOfOneKind(one.unit, 'V'))
          return fault('entryMode', 'A scope reads volts. Choose a unit of volts, or typed entry.');
        return isMeasuredIn(one.measurand, one.unit)
          ? []
          : fault('measurand', `${MEASURAND_TITLES[one.measurand]} is not measured in ${one.unit}.`);
      case 'computed': {
        const { unit } = FORMULAS[one.formula.key];
        return isOfOneKind(one.unit, unit) ? [] : fault('unit', `This formula yields ${unit}.`);
      }
      case 'attribute':
        return one.requirement.trim() === '' ? fault('requirement', 'Say what a unit must be to pass.') : [];
    }
  });
}
