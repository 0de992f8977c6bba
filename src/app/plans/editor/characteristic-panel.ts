import { ChangeDetectionStrategy, Component, computed, inject, input } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MatSnackBar } from '@angular/material/snack-bar';
import { cautionOf, METHOD_NOTES, methodNote } from '#shared/plan/method-notes';
import { LimitStrip } from '../../ui/limit-strip/limit-strip';
import { ClassGlyph } from '../../ui/marks/class-glyph';
import { VerdictMark } from '../../ui/marks/verdict-mark';
import { CautionNote } from '../../ui/states/caution-note';
import { readingText } from '../../ui/values/reading-text';
import { CharacteristicFacts } from './characteristic-facts';
import { CharacteristicFields } from './characteristic-fields';
import { type PlanDraft } from './plan-draft';

/** The chosen characteristic: its fields or its facts, its limits drawn, and what they mean. */
@Component({
  selector: 'qr-characteristic-panel',
  imports: [CautionNote, CharacteristicFacts, CharacteristicFields, ClassGlyph, LimitStrip, MatButton, VerdictMark],
  templateUrl: './characteristic-panel.html',
  styleUrl: './characteristic-panel.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class CharacteristicPanel {
  private readonly snackBar = inject(MatSnackBar);

  readonly draft = input.required<PlanDraft>();
  readonly editable = input.required<boolean>();

  protected readonly characteristic = computed(() => this.draft().selected()?.value ?? null);

  protected readonly note = computed(() => {
    const characteristic = this.characteristic();
    return characteristic === null ? METHOD_NOTES.other : methodNote(characteristic);
  });
  protected readonly caution = computed(() => {
    const characteristic = this.characteristic();
    return characteristic === null ? '' : cautionOf(characteristic);
  });

  /** What is drawn as a limit strip; nothing without a limit. */
  protected readonly limited = computed(() => {
    const characteristic = this.characteristic();
    if (characteristic === null || characteristic.kind === 'attribute') return null;
    const { lowerLimit, upperLimit } = characteristic;
    return lowerLimit === null && upperLimit === null ? null : characteristic;
  });

  protected readonly zones = computed(() => {
    const limited = this.limited();
    if (limited === null) return null;
    const text = (value: number) => readingText(value, limited.unit, limited.decimals);
    const { lowerLimit: lower, upperLimit: upper } = limited;
    if (lower !== null && upper !== null)
      return { within: `${text(lower)} to ${text(upper)}`, outside: `below ${text(lower)} or above ${text(upper)}` };
    if (upper !== null) return { within: `to ${text(upper)}`, outside: `above ${text(upper)}` };
    return lower === null ? null : { within: `from ${text(lower)}`, outside: `below ${text(lower)}` };
  });

  protected remove(): void {
    const row = this.draft().selected();
    if (row === null) return;
    const putBack = this.draft().remove(row.id);
    this.snackBar
      .open(`${row.value.name || 'The characteristic'} removed from the draft`, 'Undo', { duration: 8000 })
      .onAction()
      .subscribe(putBack);
  }
}
