import { type Fault } from '../contract/problem';
import { FORMULAS } from '../measurement/formula';
import { LARGEST_VALUE } from '../quantities/largest-value';
import { type ComputedCharacteristic, type PlanContent } from './plan-content';

type Characteristics = PlanContent['characteristics'];

/** What is wrong with the characteristic that an input names; undefined when nothing is. */
function inputFault(named: string | undefined, characteristics: Characteristics): string | undefined {
  if (named === undefined || named === '') return 'Choose the characteristic that this is taken from.';
  const found = characteristics.find(({ key }) => key === named);
  if (!found) return `This plan has no characteristic ${named}.`;
  return found.kind === 'measured' ? undefined : 'Only a measured characteristic can be taken here.';
}

/** What is wrong with a rating that a formula takes beside readings; undefined when nothing is. */
function constantFault(value: number | undefined): string | undefined {
  if (value === undefined) return 'Give this rating.';
  if (value <= 0) return 'A rating is more than 0.';
  return value > LARGEST_VALUE ? 'This is too large.' : undefined;
}

function constantFaults({ formula }: ComputedCharacteristic): [string, string][] {
  const wanted = FORMULAS[formula.key].constants.map(({ name }) => name);
  const faults = wanted.flatMap((name): [string, string][] => {
    const message = constantFault(formula.constants[name]);
    return message === undefined ? [] : [[name, message]];
  });
  const unknown = Object.keys(formula.constants).filter((name) => !wanted.includes(name));
  return [...faults, ...unknown.map((name): [string, string] => [name, 'This formula has no such rating.'])];
}

function inputFaults({ formula }: ComputedCharacteristic, characteristics: Characteristics): [string, string][] {
  const wanted = FORMULAS[formula.key].inputs.map(({ name }) => name);
  const faults = wanted.flatMap((name): [string, string][] => {
    const message = inputFault(formula.inputs[name], characteristics);
    return message === undefined ? [] : [[name, message]];
  });
  const unknown = Object.keys(formula.inputs).filter((name) => !wanted.includes(name));
  const taken = wanted.filter((name, index) =>
    wanted.slice(0, index).some((other) => formula.inputs[name] && formula.inputs[other] === formula.inputs[name]),
  );
  return [
    ...faults,
    ...unknown.map((name): [string, string] => [name, 'This formula has no such input.']),
    ...taken.map((name): [string, string] => [name, 'This characteristic is taken for another input already.']),
  ];
}

/**
 * Every input of a formula is a measured characteristic of the same plan, a different one each: what is computed never
 * feeds what is computed. Every rating it takes is given, in SI base units.
 */
export function formulaFaults({ characteristics }: PlanContent): Fault[] {
  return characteristics.flatMap((one, index) => {
    if (one.kind !== 'computed') return [];
    const placed =
      (part: 'inputs' | 'constants') =>
      ([name, message]: [string, string]): Fault => ({
        path: ['characteristics', index, 'formula', part, name],
        message,
      });
    return [
      ...inputFaults(one, characteristics).map(placed('inputs')),
      ...constantFaults(one).map(placed('constants')),
    ];
  });
}
