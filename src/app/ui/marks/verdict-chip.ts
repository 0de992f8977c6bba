import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { LOOK_WORDS, type VerdictLook } from '../verdict-look';
import { VerdictMark } from './verdict-mark';

/** Mark and word of a verdict. Give `word` where a more precise one than the look's own is known. */
@Component({
  selector: 'qr-verdict-chip',
  imports: [VerdictMark],
  template: `<qr-verdict-mark [look]="look()" [size]="size()" />{{ shown() }}`,
  styles: `
    :host {
      display: inline-flex;
      align-items: center;
      gap: 6px;
      font: var(--qr-t-title-s);
      white-space: nowrap;
      vertical-align: middle;
    }
    :host(.ok) {
      color: var(--qr-ok-text);
    }
    :host(.nok) {
      color: var(--qr-nok-text);
    }
    :host(.hold) {
      color: var(--qr-hold-text);
    }
    :host(.open) {
      color: var(--qr-ink-2);
    }
  `,
  host: { '[class]': 'look()' },
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class VerdictChip {
  readonly look = input.required<VerdictLook>();
  readonly word = input('');
  /** Width of the mark in px. */
  readonly size = input(14);

  protected readonly shown = computed(() => this.word() || LOOK_WORDS[this.look()]);
}
