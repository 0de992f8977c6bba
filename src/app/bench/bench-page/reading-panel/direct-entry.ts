import {
  ChangeDetectionStrategy,
  Component,
  computed,
  type ElementRef,
  input,
  model,
  output,
  viewChild,
} from '@angular/core';
import { displayUnit } from '#shared/quantities/display-unit';
import { readingDigits } from '../../../ui/values/reading-text';

/** A reading typed as people write it, 185m or 0.185, its unit always in view; the result follows every key. */
@Component({
  selector: 'qr-direct-entry',
  template: `
    <label>
      <span>Reading</span>
      <span class="box" [class.refused]="refused()">
        <input
          #box
          type="text"
          inputmode="decimal"
          autocomplete="off"
          spellcheck="false"
          [value]="text()"
          [attr.aria-invalid]="refused()"
          (input)="text.set(box.value)"
        />
        <small>{{ unitLabel() }}</small>
      </span>
    </label>
    <output class="result" aria-live="off">
      <b [class.empty]="value() === null">{{ digits() }}</b>
      <span class="unit">{{ unitLabel() }}</span>
      @if (uncertainty(); as u) {
        <span class="spread">
          {{ u.text }}
          <small>{{ u.reason }}</small>
        </span>
      }
    </output>
  `,
  styleUrl: './direct-entry.scss',
  host: {
    '(keydown.enter)': 'keep($event)',
    '(keydown.escape)': 'leave($event)',
    '(keydown.tab)': 'step($event)',
    '(keydown.f2)': 'cured.emit()',
  },
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class DirectEntry {
  readonly text = model.required<string>();
  readonly unit = input.required<string>();
  readonly decimals = input.required<number>();
  /** What is typed, or what stands in the cell, in SI base units. */
  readonly value = input.required<number | null>();
  /** U as it is written, and what it consists of. */
  readonly uncertainty = input<{ readonly text: string; readonly reason: string } | null>(null);
  readonly refused = input(false);
  readonly kept = output();
  /** F2: the offered correction is taken. */
  readonly cured = output();
  readonly left = output();
  /** Tab: on to the next characteristic. */
  readonly stepped = output();

  private readonly box = viewChild.required<ElementRef<HTMLInputElement>>('box');

  protected readonly unitLabel = computed(() => displayUnit(this.unit()).label);
  protected readonly digits = computed(() => readingDigits(this.value() ?? 0, this.unit(), this.decimals()));

  /** Puts the cursor into the field; text replaces what stands there. */
  focusFirst(text?: string): void {
    const box = this.box().nativeElement;
    if (text !== undefined) this.text.set(text);
    box.value = this.text();
    box.focus();
    if (text === undefined) box.select();
  }

  protected keep(event: Event): void {
    event.preventDefault();
    this.kept.emit();
  }

  protected step(event: Event): void {
    event.preventDefault();
    this.stepped.emit();
  }

  protected leave(event: Event): void {
    event.stopPropagation();
    this.left.emit();
  }
}
