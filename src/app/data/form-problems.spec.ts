import { FormArray, FormControl, FormGroup } from '@angular/forms';
import * as z from 'zod';
import { ApiProblem } from './api-problem';
import { bodyOfForm, bySchema, showFaults } from './form-problems';

const form = () =>
  new FormGroup({
    name: new FormControl('', { nonNullable: true }),
    limits: new FormArray([new FormGroup({ upper: new FormControl(2, { nonNullable: true }) })]),
  });

const problem = (errors: { path: (string | number)[]; message: string }[]) =>
  new ApiProblem({ title: 'Something is not as it must be.', status: 400, code: 'not-the-shape', errors }, new Date());

describe('the faults of a refused call', () => {
  it('stand beside the fields they name, however deep', () => {
    const fields = form();
    const rest = showFaults(fields, problem([{ path: ['limits', 0, 'upper'], message: 'Must be more than 0.' }]));
    expect(fields.get(['limits', 0, 'upper'])?.errors).toEqual({ refused: 'Must be more than 0.' });
    expect(fields.get(['limits', 0, 'upper'])?.touched).toBe(true);
    expect(rest).toEqual([]);
  });

  it('stand at the nearest field when the exact one is not on the page', () => {
    const fields = form();
    showFaults(fields, problem([{ path: ['name', 'first'], message: 'Fill this in.' }]));
    expect(fields.controls.name.errors).toEqual({ refused: 'Fill this in.' });
  });

  it('are handed back when no field takes them', () => {
    expect(showFaults(form(), problem([{ path: ['other'], message: 'No such thing.' }]))).toEqual(['No such thing.']);
    expect(showFaults(form(), problem([]))).toEqual(['Something is not as it must be.']);
  });

  it('go away when the field is typed in', () => {
    const fields = form();
    showFaults(fields, problem([{ path: ['name'], message: 'Fill this in.' }]));
    fields.controls.name.setValue('Kestrin Power');
    expect(fields.valid).toBe(true);
  });
});

describe("an endpoint's schema", () => {
  const body = z.object({ name: z.string().min(1, 'Fill this in.') });

  it('validates a field in the same words as the server', () => {
    const control = new FormControl('', bySchema(body.shape.name));
    expect(control.errors).toEqual({ schema: 'Fill this in.' });
    control.setValue('Kestrin Power');
    expect(control.valid).toBe(true);
  });

  it('validates a whole form and yields the body to send', () => {
    const fields = form();
    expect(bodyOfForm(fields, body, fields.getRawValue())).toEqual({ unplaced: [] });
    expect(fields.controls.name.errors).toEqual({ refused: 'Fill this in.' });
    fields.controls.name.setValue('Kestrin Power');
    expect(bodyOfForm(fields, body, fields.getRawValue())).toEqual({ body: { name: 'Kestrin Power' } });
  });
});
