import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';

const WIDTH = 96;

/** A share as a strip of ink on a line that ends at the whole. The figure beside it says the same, so it is not read out. */
@Component({
  selector: 'qr-share-strip',
  template: `
    <svg width="96" height="8" viewBox="0 0 96 8" aria-hidden="true">
      <path d="M0 4H96M95.5 0V8" />
      <rect height="8" rx="1" [attr.width]="filled()" />
    </svg>
  `,
  styles: `
    :host {
      display: inline-block;
      vertical-align: middle;
    }
    path {
      stroke: var(--qr-line-2);
    }
    rect {
      fill: var(--qr-chart-1);
    }
    @media (forced-colors: active) {
      rect {
        fill: CanvasText;
      }
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ShareStrip {
  /** A fraction; what is more than the whole fills the strip. */
  readonly share = input.required<number>();

  protected readonly filled = computed(() => WIDTH * Math.min(1, Math.max(0, this.share())));
}
