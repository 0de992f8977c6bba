import { ChangeDetectionStrategy, Component, input, model } from '@angular/core';

/** One choice of a segmented control. */
export interface Segment<T> {
  readonly value: T;
  readonly label: string;
}

let groups = 0;

/** One of a few choices, all in view. Radio buttons underneath, so the arrow keys move and Tab passes by. */
@Component({
  selector: 'qr-segmented',
  template: `
    @for (segment of options(); track segment.value) {
      <label [class.on]="segment.value === value()">
        <input
          class="unseen"
          type="radio"
          [name]="group"
          [checked]="segment.value === value()"
          (change)="value.set(segment.value)"
        />
        {{ segment.label }}
      </label>
    }
  `,
  styles: `
    :host {
      display: inline-flex;
      max-width: 100%;
      border: 1px solid var(--qr-line-2);
      border-radius: var(--qr-r-control);
      background: var(--qr-sheet);
      vertical-align: middle;
    }
    label {
      position: relative;
      display: inline-flex;
      align-items: center;
      min-height: calc(var(--qr-control) - 6px);
      padding: 0 var(--qr-segment-padding, 12px);
      font: 500 13px/18px var(--qr-sans);
      color: var(--qr-ink-2);
      white-space: nowrap;
      cursor: pointer;
    }
    label + label {
      border-left: 1px solid var(--qr-line-2);
    }
    label.on {
      background: var(--qr-primary-container);
      color: var(--qr-on-primary-container);
      font-weight: 700;
    }
    label:has(:focus-visible) {
      outline: 2px solid var(--qr-focus);
      outline-offset: 2px;
      z-index: 1;
    }
  `,
  host: { role: 'radiogroup', '[attr.aria-label]': 'label()' },
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class Segmented<T extends string | number | boolean> {
  readonly label = input.required<string>();
  readonly options = input.required<readonly Segment<T>[]>();
  readonly value = model.required<T>();

  protected readonly group = `qr-segmented-${++groups}`;
}
