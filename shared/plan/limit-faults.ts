import { type Fault } from '../contract/problem';
import { type LimitedCharacteristic, type PlanContent } from './plan-content';

type Limits = Pick<LimitedCharacteristic, 'lowerLimit' | 'upperLimit' | 'target'>;

/** The field at fault and what is wrong with it. */
type LimitFault = { field: keyof Limits; message: string };

function faultsOf({ lowerLimit, upperLimit, target }: Limits): LimitFault[] {
  const faults: LimitFault[] = [];
  if (lowerLimit !== null && upperLimit !== null && lowerLimit >= upperLimit)
    faults.push({ field: 'upperLimit', message: 'The upper limit must be above the lower one.' });
  if (target !== null && lowerLimit !== null && target < lowerLimit)
    faults.push({ field: 'target', message: 'The target is below the lower limit.' });
  if (target !== null && upperLimit !== null && target > upperLimit)
    faults.push({ field: 'target', message: 'The target is above the upper limit.' });
  return faults;
}

/** Limits leave an acceptance zone, and the target lies in it. Values in SI base units. */
export function limitFaults({ characteristics }: PlanContent): Fault[] {
  return characteristics.flatMap((one, index) =>
    one.kind === 'attribute'
      ? []
      : faultsOf(one).map(({ field, message }) => ({ path: ['characteristics', index, field], message })),
  );
}
