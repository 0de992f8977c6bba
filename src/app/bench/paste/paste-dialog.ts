import { ChangeDetectionStrategy, Component, computed, inject, signal } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MAT_DIALOG_DATA, MatDialogModule, MatDialogRef } from '@angular/material/dialog';
import { CONFIRM_REASON_TITLES, CONFIRM_REASONS } from '#shared/contract/bench';
import { MessageNote } from '../../ui/states/message-note';
import { DECIMAL_COMMA } from '../../ui/values/decimal-comma';
import { CountPipe } from '../../ui/values/count-pipe';
import { type Confirmation } from '../waiting/bench-act';
import { cellsIn } from './checked-paste';
import { type PasteDesk } from './paste-desk';
import { PastePreview } from './paste-preview';

/** What was pasted, and who checks and keeps it. */
export interface PasteQuestion {
  readonly text: string;
  readonly desk: PasteDesk;
}

/** Faults told one by one; the rest is counted. */
const TOLD = 40;

/** Readings out of a spreadsheet, seen before they are kept: each with its verdict, each fault with its reason. */
@Component({
  selector: 'qr-paste-dialog',
  imports: [CountPipe, MatButton, MatDialogModule, MessageNote, PastePreview],
  templateUrl: './paste-dialog.html',
  styleUrl: './paste-dialog.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PasteDialog {
  private readonly dialog = inject<MatDialogRef<PasteDialog, number>>(MatDialogRef);
  private readonly question = inject<PasteQuestion>(MAT_DIALOG_DATA);

  protected readonly decimalComma = signal(DECIMAL_COMMA);
  protected readonly checked = computed(() => this.question.desk.check(this.question.text, this.decimalComma()));
  protected readonly good = computed(() => cellsIn(this.checked(), 'good').length);
  protected readonly questioned = computed(() => cellsIn(this.checked(), 'question'));
  protected readonly skipped = computed(() => cellsIn(this.checked(), 'skipped').length);
  protected readonly faults = computed(() => [
    ...this.checked().outside,
    ...cellsIn(this.checked(), 'fault').map(
      ({ unit, characteristic, why }) => `Unit ${unit}, ${characteristic.name.toLowerCase()}: ${why}`,
    ),
  ]);
  protected readonly told = computed(() => this.faults().slice(0, TOLD));
  protected readonly nonconforming = computed(
    () => this.checked().rows.filter(({ verdict }) => verdict.verdict === 'nonconforming').length,
  );

  protected readonly reasons = CONFIRM_REASONS.map((value) => ({ value, title: CONFIRM_REASON_TITLES[value] }));
  /** What becomes of the questioned ones: a reason for all, or left out; null until it is said. */
  protected readonly answer = signal<Confirmation['reason'] | 'leave-out' | null>(null);
  protected readonly note = signal('');
  protected readonly tried = signal(false);
  protected readonly lacking = computed(() => {
    if (this.questioned().length === 0) return '';
    if (this.answer() === null) return 'Say what becomes of the values that are far from what the part can give.';
    return this.answer() === 'other' && this.note().trim() === '' ? 'Say in a few words what it is.' : '';
  });
  /** How many readings the button keeps. */
  protected readonly keeping = computed(
    () => this.good() + (this.confirmation() === null ? 0 : this.questioned().length),
  );

  protected keep(): void {
    this.tried.set(true);
    if (this.lacking() !== '' || this.keeping() === 0) return;
    this.dialog.close(this.question.desk.keep(this.checked(), this.confirmation()));
  }

  private confirmation(): Confirmation | null {
    const reason = this.answer();
    return reason === null || reason === 'leave-out' ? null : { reason, note: this.note().trim() };
  }
}
