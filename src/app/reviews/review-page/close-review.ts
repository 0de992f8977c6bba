import { ChangeDetectionStrategy, Component, computed, inject, input, output } from '@angular/core';
import { FormControl, FormGroup, ReactiveFormsModule } from '@angular/forms';
import { MatButton } from '@angular/material/button';
import { MatFormFieldModule } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { closeReview, type Review } from '#shared/contract/calibrations';
import { ApiClient } from '../../data/api';
import { RecordSave } from '../../data/record-save';
import { Confirm } from '../../ui/confirm/confirm';
import { MessageNote } from '../../ui/states/message-note';
import { FieldErrorPipe } from '../../ui/values/field-error-pipe';

/** Closes a review with its conclusion, once every lot is assessed. */
@Component({
  selector: 'qr-close-review',
  imports: [FieldErrorPipe, MatButton, MatFormFieldModule, MatInput, MessageNote, ReactiveFormsModule],
  template: `
    <h2>Conclusion</h2>
    <form class="form" [formGroup]="form" (ngSubmit)="close()" novalidate>
      <mat-form-field>
        <mat-label>What the review found</mat-label>
        <textarea matInput formControlName="conclusion" rows="3" maxlength="500"></textarea>
        <mat-hint>Goes on record with your name</mat-hint>
        <mat-error>{{ form.controls.conclusion.errors | fieldError }}</mat-error>
      </mat-form-field>
      @for (sentence of saving.said(); track $index) {
        <qr-message-note look="nok">{{ sentence }}</qr-message-note>
      }
      <div class="actions">
        <button type="submit" matButton="filled" [disabled]="left() > 0 || saving.busy()" disabledInteractive>
          {{ saving.busy() ? 'Saving' : 'Close review' }}
        </button>
        @if (left() > 0) {
          <span class="small quiet"> {{ left() === 1 ? 'One lot is' : left() + ' lots are' }} not assessed yet. </span>
        }
      </div>
    </form>
  `,
  styles: `
    h2 {
      margin-bottom: 10px;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class CloseReview {
  private readonly api = inject(ApiClient);
  private readonly confirm = inject(Confirm);

  readonly review = input.required<Review>();
  readonly closed = output<Review>();
  /** Somebody else changed the review first; it must be read again. */
  readonly overtaken = output();

  protected readonly saving = new RecordSave();
  protected readonly form = new FormGroup({ conclusion: new FormControl('', { nonNullable: true }) });
  protected readonly left = computed(() => this.review().lots - this.review().assessed);

  hasUnsaved(): boolean {
    return this.form.dirty;
  }

  protected close(): void {
    if (this.left() > 0) return;
    const { id, version, number, instrument } = this.review();
    const step = {
      title: `Close review ${number}?`,
      text: ['It changes no more.', `${instrument.assetNumber} may then come back into service in the register.`],
      confirm: 'Close review',
    };
    this.confirm.ask(step).subscribe((yes) => {
      if (!yes) return;
      this.saving.submit(this.form, {
        schema: closeReview.body,
        value: this.form.getRawValue(),
        call: (body) => this.api.call(closeReview, { params: { id }, body, version }),
        saved: (review) => {
          this.form.markAsPristine();
          this.closed.emit(review);
        },
        overtaken: () => {
          this.saving.said.set([
            'Somebody else worked on this review meanwhile. It is read again; look and close again.',
          ]);
          this.overtaken.emit();
        },
      });
    });
  }
}
