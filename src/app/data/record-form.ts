import { computed, signal } from '@angular/core';
import { type FormGroup } from '@angular/forms';
import { type Observable } from 'rxjs';
import type * as z from 'zod';
import { type Difference } from '../ui/conflict-note';
import { RecordSave } from './record-save';

/** The fields of a record, and how they say themselves. */
export interface FieldsOf<Stored> {
  readonly group: FormGroup;
  show(record: Stored): void;
  /** What was typed against what is saved now, where they differ, in words. */
  differences(theirs: Stored): Difference[];
}

/**
 * A form over one versioned record. When somebody else has saved first, `theirs` holds the record as it is now, and the
 * person chooses between both. Make it where injection is possible.
 */
export class RecordForm<Stored extends { version: number }, Fields extends FieldsOf<Stored>> {
  readonly saving = new RecordSave();
  readonly theirs = signal<Stored | null>(null);
  readonly differences = computed(() => {
    const theirs = this.theirs();
    return theirs === null ? [] : this.fields.differences(theirs);
  });
  private version = 0;

  constructor(
    readonly fields: Fields,
    private readonly readAgain: () => Observable<Stored>,
  ) {}

  /** Sends the form; `call` gets the version the typing started from. */
  submit<S extends z.ZodType>(
    schema: S,
    value: unknown,
    call: (body: z.output<S>, version: number) => Observable<Stored>,
    saved: (stored: Stored) => void,
  ): void {
    this.saving.submit(this.fields.group, {
      schema,
      value,
      call: (body) => call(body, this.version),
      saved: (stored) => {
        this.take(stored);
        saved(stored);
      },
      overtaken: () => this.saving.run(this.readAgain(), (theirs) => this.theirs.set(theirs)),
    });
  }

  /** Shows a record as it is stored; whatever was typed goes. */
  take(stored: Stored): void {
    this.fields.show(stored);
    this.version = stored.version;
    this.theirs.set(null);
  }

  /** Keeps what was typed: the next save replaces what the other person saved. */
  keepMine(): void {
    this.version = this.theirs()?.version ?? this.version;
    this.theirs.set(null);
  }

  hasUnsaved(): boolean {
    return this.fields.group.dirty;
  }
}
