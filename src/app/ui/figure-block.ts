import { ChangeDetectionStrategy, Component, input } from '@angular/core';

/** A figure of a page's head and what it counts. */
@Component({
  selector: 'qr-figure-block',
  template: `
    <b>{{ value() }}</b>
    <span>{{ caption() }}</span>
  `,
  styles: `
    :host {
      display: block;
      border-left: 1px solid var(--qr-line-2);
      padding-left: 14px;
    }
    b {
      display: block;
      font: 500 26px/32px var(--qr-sans);
      letter-spacing: -0.3px;
      white-space: nowrap;
    }
    span {
      font: var(--qr-t-caption);
      color: var(--qr-ink-2);
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class FigureBlock {
  readonly value = input.required<string | number>();
  readonly caption = input.required<string>();
}
