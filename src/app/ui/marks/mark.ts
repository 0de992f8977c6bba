import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { markPath } from './mark-path';

/** The mark of the product; `busy` lets its ripple travel while something is being done. Decorative: a word goes with it. */
@Component({
  selector: 'qr-mark',
  template: `
    <svg
      [attr.width]="width()"
      [attr.height]="height()"
      [attr.viewBox]="'0 0 ' + width() + ' ' + height()"
      aria-hidden="true"
    >
      <path [attr.d]="path()" [attr.stroke-width]="stroke()" pathLength="100" />
    </svg>
  `,
  styles: `
    :host {
      display: inline-flex;
      flex: none;
      color: var(--qr-primary);
    }
    path {
      fill: none;
      stroke: currentColor;
      stroke-linecap: round;
      stroke-linejoin: round;
    }
    @media (prefers-reduced-motion: no-preference) {
      :host(.busy) path {
        stroke-dasharray: 70 30;
        stroke-linecap: butt;
        animation: travel 1.2s linear infinite;
      }
    }
    @keyframes travel {
      to {
        stroke-dashoffset: -100;
      }
    }
  `,
  host: { '[class.busy]': 'busy()' },
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class Mark {
  /** Size in px. */
  readonly width = input(54);
  readonly height = input(28);
  readonly stroke = input(2.4);
  readonly busy = input(false);

  protected readonly path = computed(() => {
    const inset = this.stroke() / 2;
    const length = this.width() - this.stroke();
    return markPath({
      x: inset,
      y: this.height() / 2,
      width: length * 0.83,
      amplitude: this.height() / 2 - this.stroke(),
      tail: length * 0.17,
    });
  });
}
