import { type Fault } from '../contract/problem';
import { type Aql, NONCONFORMITY_CLASSES } from '../sampling/scheme';
import { type PlanContent } from './plan-content';

/**
 * The highest AQL that can be a percentage of nonconforming units; higher ones count nonconformities per hundred units,
 * which this product does not. Source: MIL-STD-105E, Table II-A and its definitions.
 */
export const HIGHEST_AQL = 10;

const TOO_HIGH = `An AQL of nonconforming units is at most ${HIGHEST_AQL}.`;

function isTooHigh(aql: Aql): boolean {
  return Number(aql) > HIGHEST_AQL;
}

/** Every class in use needs one AQL, and no AQL may be one that counts nonconformities. */
export function classFaults({ classAqls, characteristics }: PlanContent): Fault[] {
  const faults: Fault[] = [];
  classAqls.forEach((entry, index) => {
    if (isTooHigh(entry.aql)) faults.push({ path: ['classAqls', index, 'aql'], message: TOO_HIGH });
    if (classAqls.findIndex((other) => other.class === entry.class) < index)
      faults.push({ path: ['classAqls', index, 'class'], message: 'This class has an AQL already.' });
  });
  for (const nonconformityClass of NONCONFORMITY_CLASSES) {
    const isUsed = characteristics.some((one) => one.class === nonconformityClass && one.ownAql === null);
    if (isUsed && !classAqls.some((entry) => entry.class === nonconformityClass))
      faults.push({ path: ['classAqls'], message: `Class ${nonconformityClass} is used and has no AQL.` });
  }
  characteristics.forEach(({ ownAql }, index) => {
    if (ownAql !== null && isTooHigh(ownAql))
      faults.push({ path: ['characteristics', index, 'ownAql'], message: TOO_HIGH });
  });
  return faults;
}
