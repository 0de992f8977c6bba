import { type AbstractControl, FormGroup } from '@angular/forms';
import { type Fault } from '#shared/contract/problem';
import { type CharacteristicForm } from './characteristic-form';

/** Fields in which a quantity is typed. */
const QUANTITIES = ['target', 'lowerLimit', 'upperLimit'] as const;

/** The quantities whose text is not understood; without them they would pass for "none". */
export function unreadFields({ group }: CharacteristicForm): Fault[] {
  const limits = QUANTITIES.map((name): [AbstractControl, Fault['path']] => [group.controls[name], [name]]);
  const ratings = Object.entries(group.controls.constants.controls).map(
    ([name, control]): [AbstractControl, Fault['path']] => [control, ['formula', 'constants', name]],
  );
  return [...limits, ...ratings].flatMap(([control, path]) => {
    const message: unknown = control.errors?.['quantity'];
    return typeof message === 'string' ? [{ path, message }] : [];
  });
}

/**
 * Puts the faults of the characteristic at `index` beside its fields, and takes away those that are mended. A field that nobody
 * has been in keeps its fault to itself, unless it is `pressing`.
 */
export function showCharacteristicFaults(
  { group }: CharacteristicForm,
  index: number,
  faults: readonly Fault[],
  pressing: readonly Fault[],
): void {
  const messages = messagesOf(index, [...faults, ...pressing]);
  const shown = messagesOf(index, pressing);
  for (const [name, control] of leaves(group)) {
    const message = messages.get(name);
    control.setErrors(message === undefined ? null : { fault: message });
    if (shown.has(name)) control.markAsTouched();
  }
}

/** The first message of each field. */
function messagesOf(index: number, faults: readonly Fault[]): ReadonlyMap<string, string> {
  const messages = new Map<string, string>();
  for (const { path, message } of faults) {
    if (path[0] !== 'characteristics' || path[1] !== index) continue;
    const field = fieldOf(path.slice(2));
    if (!messages.has(field)) messages.set(field, message);
  }
  return messages;
}

/** The field that a path inside a characteristic points to. */
function fieldOf(path: Fault['path']): string {
  const [first, second, third] = path;
  if (first !== 'formula') return String(first ?? '');
  const isMember = (second === 'inputs' || second === 'constants') && third !== undefined;
  return isMember ? `${second}.${third}` : 'formulaKey';
}

function leaves(group: FormGroup, prefix = ''): [string, AbstractControl][] {
  return Object.entries(group.controls).flatMap(([name, control]) =>
    control instanceof FormGroup
      ? leaves(control, `${prefix}${name}.`)
      : [[`${prefix}${name}`, control] as [string, AbstractControl]],
  );
}
