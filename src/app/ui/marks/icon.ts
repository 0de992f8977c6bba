import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { ICONS, type IconName } from './icons';

/** A stroke icon on a 20 px grid; it says nothing by itself, so the word stands beside it or in the button's label. */
@Component({
  selector: 'qr-icon',
  template: `
    <svg [attr.width]="size()" [attr.height]="size()" viewBox="0 0 20 20" aria-hidden="true">
      @for (line of lines(); track $index) {
        <path [attr.d]="line" />
      }
    </svg>
  `,
  styles: `
    :host {
      display: inline-flex;
      flex: none;
      vertical-align: -4px;
    }
    path {
      fill: none;
      stroke: currentColor;
      stroke-width: 1.5;
      stroke-linecap: round;
      stroke-linejoin: round;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class Icon {
  readonly name = input.required<IconName>();
  /** Width and height in px. */
  readonly size = input(20);

  protected readonly lines = computed(() => ICONS[this.name()]);
}
