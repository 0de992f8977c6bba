import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { type NonconformityClass } from '#shared/sampling/scheme';

const RANKS: Readonly<Record<NonconformityClass, number>> = { minor: 1, major: 2, critical: 3 };

/** Class of a characteristic: one, two or three bars, in the order of the spikes in the tally, and its name. */
@Component({
  selector: 'qr-class-glyph',
  template: `
    <svg width="11" height="12" viewBox="0 0 11 12" aria-hidden="true">
      @for (bar of [0, 1, 2]; track bar) {
        <rect
          [class.on]="bar < rank()"
          [attr.x]="bar * 4"
          [attr.y]="8 - bar * 3"
          width="3"
          [attr.height]="4 + bar * 3"
        />
      }
    </svg>
    @if (named()) {
      <span>{{ name() }}</span>
    } @else {
      <span class="unseen">{{ name() }}</span>
    }
  `,
  styles: `
    :host {
      display: inline-flex;
      align-items: center;
      gap: 6px;
      color: var(--qr-ink-2);
      font: var(--qr-t-label);
      white-space: nowrap;
      vertical-align: middle;
    }
    rect {
      fill: var(--qr-line);
    }
    rect.on {
      fill: currentColor;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ClassGlyph {
  readonly of = input.required<NonconformityClass>();
  /** Whether the name stands beside the bars. */
  readonly named = input(true);

  protected readonly rank = computed(() => RANKS[this.of()]);
  protected readonly name = computed(() => this.of().charAt(0).toUpperCase() + this.of().slice(1));
}
