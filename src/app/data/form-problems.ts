import { type AbstractControl, type ValidatorFn } from '@angular/forms';
import type * as z from 'zod';
import { type Fault } from '#shared/contract/problem';
import { type ApiProblem } from './api-problem';

/** Puts the faults of a refused call beside the fields they name; yields the sentences for which there is no field. */
export function showFaults(form: AbstractControl, problem: ApiProblem): string[] {
  return problem.faults.length === 0 ? [problem.message] : placeFaults(form, problem.faults);
}

/**
 * Checks a form's value, as it would be sent, against an endpoint's body schema and puts the faults beside the fields;
 * yields the body to send, or the sentences without a field.
 */
export function bodyOfForm<S extends z.ZodType>(
  form: AbstractControl,
  schema: S,
  value: unknown,
): { body: z.output<S> } | { unplaced: string[] } {
  form.markAllAsTouched();
  const read = schema.safeParse(value);
  if (read.success) return { body: read.data };
  return { unplaced: placeFaults(form, faultsOf(read.error)) };
}

/** Validates one control by the schema the contract has for that field. */
export function bySchema(schema: z.ZodType): ValidatorFn {
  return (control) => {
    const read = schema.safeParse(control.value as unknown);
    return read.success ? null : { schema: read.error.issues[0]?.message ?? 'This does not fit.' };
  };
}

function placeFaults(form: AbstractControl, faults: readonly Fault[]): string[] {
  return faults.filter((fault) => !placeFault(form, fault)).map((fault) => fault.message);
}

/** Walks as far down the form as the path goes; a fault on the whole form has no place. */
function placeFault(form: AbstractControl, fault: Fault): boolean {
  for (let depth = fault.path.length; depth > 0; depth -= 1) {
    const control = form.get(fault.path.slice(0, depth));
    if (control !== null) {
      control.setErrors({ ...control.errors, refused: fault.message });
      control.markAsTouched();
      return true;
    }
  }
  return false;
}

function faultsOf(error: z.ZodError): Fault[] {
  return error.issues.map((issue) => ({
    path: issue.path.filter((step) => typeof step !== 'symbol'),
    message: issue.message,
  }));
}
