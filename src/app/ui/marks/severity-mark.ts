import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { type Severity } from '#shared/sampling/scheme';

/** Severity of inspection: two lines and a dot, the gap showing the strictness, and its name. */
@Component({
  selector: 'qr-severity-mark',
  template: `
    <svg width="20" height="12" viewBox="0 0 20 12" aria-hidden="true">
      <path class="rails" [attr.d]="rails()" />
      <rect class="dot" x="9" y="4.8" width="2" height="2.4" />
    </svg>
    <span>{{ name() }}</span>
  `,
  styles: `
    :host {
      display: inline-flex;
      align-items: center;
      gap: 7px;
      color: var(--qr-ink-2);
      white-space: nowrap;
      vertical-align: middle;
    }
    .rails {
      stroke: currentColor;
      stroke-width: 1.4;
    }
    .dot {
      fill: currentColor;
    }
    :host(.tightened) {
      color: var(--qr-ink);
      font-weight: 700;
    }
    :host(.tightened) .rails {
      stroke-width: 1.8;
    }
    :host(.reduced) .rails {
      stroke-width: 1.2;
    }
  `,
  host: { '[class]': 'of()' },
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class SeverityMark {
  readonly of = input.required<Severity>();

  protected readonly rails = computed(() => {
    const half = { tightened: 1.3, normal: 2.5, reduced: 5 }[this.of()];
    return `M0 ${6 - half}H20M0 ${6 + half}H20`;
  });
  protected readonly name = computed(() => this.of().charAt(0).toUpperCase() + this.of().slice(1));
}
