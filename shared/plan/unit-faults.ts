import { type Fault } from '../contract/problem';
import { FORMULAS } from '../measurement/formula';
import { unitParts } from '../quantities/display-unit';
import { type PlanContent } from './plan-content';

/** Whether two display units measure the same thing: V and mV do, V and A do not. */
function measureTheSame(one: string, other: string): boolean {
  return unitParts(one).unit === unitParts(other).unit;
}

/** A scope reads volts, a formula yields its own kind of quantity, and what is judged by eye needs a requirement. */
export function unitFaults({ characteristics }: PlanContent): Fault[] {
  return characteristics.flatMap((one, index): Fault[] => {
    const fault = (field: string, message: string) => [{ path: ['characteristics', index, field], message }];
    switch (one.kind) {
      case 'measured':
        if (one.entryMode !== 'scope' || measureTheSame(one.unit, 'V')) return [];
        return fault('entryMode', 'A scope reads volts. Choose a unit of volts, or typed entry.');
      case 'computed': {
        const { unit } = FORMULAS[one.formula.key];
        return measureTheSame(one.unit, unit) ? [] : fault('unit', `This formula yields ${unit}.`);
      }
      case 'attribute':
        return one.requirement.trim() === '' ? fault('requirement', 'Say what a unit must be to pass.') : [];
    }
  });
}
