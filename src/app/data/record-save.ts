import { DestroyRef, inject, signal } from '@angular/core';
import { takeUntilDestroyed } from '@angular/core/rxjs-interop';
import { type AbstractControl, FormArray, FormGroup } from '@angular/forms';
import { finalize, type Observable } from 'rxjs';
import type * as z from 'zod';
import { type ApiProblem, problemOf } from './api-problem';
import { bodyOfForm, showFaults } from './form-problems';

/** How a form becomes a call, and what follows. */
export interface Saving<S extends z.ZodType, Saved> {
  readonly schema: S;
  /** The form's value as it would be sent. */
  readonly value: unknown;
  call(body: z.output<S>): Observable<Saved>;
  saved(saved: Saved): void;
  /** Somebody else saved first (412). */
  overtaken?(): void;
}

/** Saves the record a form describes; faults go beside the fields. Make it where injection is possible. */
export class RecordSave {
  private readonly destroyed = inject(DestroyRef);

  readonly busy = signal(false);
  /** What stands in the way of saving and belongs to no field. */
  readonly said = signal<readonly string[]>([]);

  /** Checks the form against the contract and, when it fits, sends it; nothing happens while a save is under way. */
  submit<S extends z.ZodType, Saved>(form: AbstractControl, saving: Saving<S, Saved>): void {
    if (this.busy()) return;
    this.said.set([]);
    checkAgain(form);
    if (form.invalid) {
      form.markAllAsTouched();
      this.said.set(['Mend what is marked first.']);
      return;
    }
    const read = bodyOfForm(form, saving.schema, saving.value);
    if ('unplaced' in read) {
      this.said.set(read.unplaced);
      return;
    }
    this.run(saving.call(read.body), saving.saved, (problem) => {
      if (problem.status === 412 && saving.overtaken) saving.overtaken();
      else this.said.set(showFaults(form, problem));
    });
  }

  /** Runs a call that no form stands behind; what goes wrong is said. */
  run<Saved>(
    call: Observable<Saved>,
    saved: (saved: Saved) => void,
    failed: (problem: ApiProblem) => void = (problem) => this.said.set([problem.message]),
  ): void {
    this.busy.set(true);
    this.said.set([]);
    call
      .pipe(
        finalize(() => this.busy.set(false)),
        takeUntilDestroyed(this.destroyed),
      )
      .subscribe({ next: saved, error: (thrown: unknown) => failed(problemOf(thrown)) });
  }
}

/** Lets the fields judge their values anew, so that what an earlier answer refused does not stand in the way for ever. */
function checkAgain(control: AbstractControl): void {
  if (control instanceof FormGroup || control instanceof FormArray) {
    for (const child of Object.values(control.controls) as AbstractControl[]) checkAgain(child);
  }
  control.updateValueAndValidity({ emitEvent: false });
}
