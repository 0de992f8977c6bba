import { type AbstractControl, FormGroup } from '@angular/forms';
import { type Fault } from '#shared/contract/problem';
import { type CharacteristicForm } from './characteristic-form';

/** Fields in which a quantity is typed. */
const QUANTITIES = ['target', 'lowerLimit', 'upperLimit'] as const;

/** The quantities whose text is not understood; without them they would pass for "none". */
export function unreadFields({ group }: CharacteristicForm): Fault[] {
  return QUANTITIES.flatMap((name) => {
    const message: unknown = group.controls[name].errors?.['quantity'];
    return typeof message === 'string' ? [{ path: [name], message }] : [];
  });
}

/** Puts the faults of the characteristic at `index` beside its fields, and takes away those that are mended. */
export function showCharacteristicFaults({ group }: CharacteristicForm, index: number, faults: readonly Fault[]): void {
  const messages = new Map<string, string>();
  for (const { path, message } of faults) {
    if (path[0] !== 'characteristics' || path[1] !== index) continue;
    const field = fieldOf(path.slice(2));
    if (!messages.has(field)) messages.set(field, message);
  }
  for (const [name, control] of leaves(group)) {
    const message = messages.get(name);
    control.setErrors(message === undefined ? null : { fault: message });
  }
}

/** The field that a path inside a characteristic points to. */
function fieldOf(path: Fault['path']): string {
  const [first, second, third] = path;
  if (first !== 'formula') return String(first ?? '');
  return second === 'inputs' && third !== undefined ? `inputs.${third}` : 'formulaKey';
}

function leaves(group: FormGroup, prefix = ''): [string, AbstractControl][] {
  return Object.entries(group.controls).flatMap(([name, control]) =>
    control instanceof FormGroup
      ? leaves(control, `${prefix}${name}.`)
      : [[`${prefix}${name}`, control] as [string, AbstractControl]],
  );
}
