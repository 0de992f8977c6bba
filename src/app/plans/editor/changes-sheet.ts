import { ChangeDetectionStrategy, Component, computed, effect, input, untracked } from '@angular/core';
import { takeUntilDestroyed } from '@angular/core/rxjs-interop';
import { FormControl, ReactiveFormsModule } from '@angular/forms';
import { MatFormFieldModule } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { type Revision } from '#shared/contract/plans';
import { revisionChanges } from '../revision-changes';
import { type PlanDraft } from './plan-draft';

/** What a revision changes against the one before it, line by line, and why. */
@Component({
  selector: 'qr-changes-sheet',
  imports: [MatFormFieldModule, MatInput, ReactiveFormsModule],
  templateUrl: './changes-sheet.html',
  styleUrl: './changes-sheet.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ChangesSheet {
  readonly draft = input.required<PlanDraft>();
  readonly editable = input.required<boolean>();
  /** Number of the revision shown; null for a plan that is not stored yet. */
  readonly revision = input.required<number | null>();
  /** What it is compared with; null for a first revision. */
  readonly against = input.required<Revision | null>();

  protected readonly note = new FormControl('', { nonNullable: true });
  protected readonly changes = computed(() => {
    const against = this.against();
    return against === null ? null : revisionChanges(against, this.draft().content());
  });

  constructor() {
    effect(() => {
      this.draft().shownTimes();
      untracked(() => this.note.setValue(this.draft().settings().changeNote, { emitEvent: false }));
    });
    this.note.valueChanges
      .pipe(takeUntilDestroyed())
      .subscribe((changeNote) => this.draft().changeSettings({ changeNote }));
  }
}
