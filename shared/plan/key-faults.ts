import { type Fault } from '../contract/problem';
import { type PlanContent } from './plan-content';

/** Readings, rack files and formulas name a characteristic by its key, so a key stands for one; so does a name on paper. */
export function keyFaults({ characteristics }: PlanContent): Fault[] {
  const faults: Fault[] = [];
  characteristics.forEach((one, index) => {
    const before = characteristics.slice(0, index);
    if (before.some((other) => other.key === one.key))
      faults.push({ path: ['characteristics', index, 'key'], message: 'Another characteristic has this key.' });
    if (before.some((other) => other.name === one.name && other.condition === one.condition))
      faults.push({
        path: ['characteristics', index, 'name'],
        message: 'Another characteristic has this name and condition.',
      });
  });
  return faults;
}
