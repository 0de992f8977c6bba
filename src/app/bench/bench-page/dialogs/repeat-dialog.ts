import { ChangeDetectionStrategy, Component, computed, inject, signal } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MAT_DIALOG_DATA, MatDialogModule, MatDialogRef } from '@angular/material/dialog';
import { MatFormFieldModule } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { formFieldDefaults } from '../../../ui/material-defaults';
import { type ReadingBody, REPEAT_REASON_TITLES, REPEAT_REASONS } from '#shared/contract/bench';
import { StillTyping } from './still-typing';

/** What is repeated: "Unit 48, ripple at 500 mA", and what stands there now. */
export interface RepeatQuestion {
  readonly what: string;
  readonly standing: string;
}

type Repeat = NonNullable<ReadingBody['repeat']>;

/** Asks why a reading is repeated; the first one stays on record. Keys 1 to 6 choose, Enter goes on. */
@Component({
  selector: 'qr-repeat-dialog',
  imports: [MatButton, MatDialogModule, MatFormFieldModule, MatInput],
  templateUrl: './repeat-dialog.html',
  styleUrl: './repeat-dialog.scss',
  host: { '(keydown)': 'press($event)' },
  providers: [formFieldDefaults],
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class RepeatDialog {
  private readonly dialog = inject<MatDialogRef<RepeatDialog, Repeat>>(MatDialogRef);
  private readonly typing = new StillTyping();

  protected readonly question = inject<RepeatQuestion>(MAT_DIALOG_DATA);
  protected readonly reasons = REPEAT_REASONS.map((value) => ({ value, title: REPEAT_REASON_TITLES[value] }));
  protected readonly reason = signal<Repeat['reason'] | null>(null);
  protected readonly note = signal('');
  protected readonly tried = signal(false);

  /** What is still missing; "other" needs a few words. */
  protected readonly lacking = computed(() => {
    if (this.reason() === null) return 'Choose a reason.';
    return this.reason() === 'other' && this.note().trim() === '' ? 'Say in a few words what it was.' : '';
  });

  protected take(): void {
    this.tried.set(true);
    const reason = this.reason();
    if (reason !== null && this.lacking() === '') this.dialog.close({ reason, note: this.note().trim() });
  }

  protected press(event: KeyboardEvent): void {
    if (this.typing.isMeant(event)) {
      event.preventDefault();
      return;
    }
    const inNote = event.target instanceof HTMLInputElement && event.target.type === 'text';
    const chosen = this.reasons[Number(event.key) - 1];
    if (inNote || chosen === undefined) return;
    event.preventDefault();
    this.reason.set(chosen.value);
  }
}
