import { type Fault } from '../contract/problem';
import { classFaults } from './class-faults';
import { formulaFaults } from './formula-faults';
import { keyFaults } from './key-faults';
import { limitFaults } from './limit-faults';
import { type PlanContent } from './plan-content';
import { unitFaults } from './unit-faults';

/**
 * What is wrong with a plan across its fields, each fault with the path of its field; none for a plan that can be used.
 *
 * A measured or computed characteristic may have no limit at all: it is then recorded and never fails a unit. Limits and
 * targets are in SI base units. These rules are the product's own; those from a standard name it where they stand.
 */
export function planFaults(plan: PlanContent): Fault[] {
  return [...classFaults(plan), ...keyFaults(plan), ...limitFaults(plan), ...unitFaults(plan), ...formulaFaults(plan)];
}
