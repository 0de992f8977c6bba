import { Pipe, type PipeTransform } from '@angular/core';
import { type ValidationErrors } from '@angular/forms';

/**
 * The sentence that belongs under a field: `form.controls.name.errors | fieldError`. Errors of the product carry their
 * sentence as value; the few that Angular's own validators give are put into words here.
 */
@Pipe({ name: 'fieldError' })
export class FieldErrorPipe implements PipeTransform {
  transform(errors: ValidationErrors | null | undefined): string {
    const [name, value] = Object.entries(errors ?? {})[0] ?? [];
    if (name === undefined) return '';
    if (typeof value === 'string') return value;
    if (name === 'required') return 'Fill this in.';
    if (name === 'email') return 'This is not an e-mail address.';
    return 'This does not fit.';
  }
}
