import { ChangeDetectionStrategy, Component, computed } from '@angular/core';
import { elementWidth } from '../ui/element-width';
import { markPath } from '../ui/marks/mark-path';

/** The mark drawn across the whole page: the ripple settles before it reaches the form. Decoration only. */
@Component({
  selector: 'qr-front-ripple',
  template: `
    <svg [attr.width]="width()" height="320" [attr.viewBox]="'0 0 ' + width() + ' 320'" aria-hidden="true">
      <path [attr.d]="path()" />
    </svg>
  `,
  styles: `
    :host {
      position: absolute;
      inset-inline: 0;
      height: 320px;
      overflow: hidden;
      pointer-events: none;
    }
    path {
      fill: none;
      stroke: var(--qr-primary);
      stroke-width: 3;
      stroke-linecap: round;
      stroke-linejoin: round;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class FrontRipple {
  protected readonly width = elementWidth(1440);

  protected readonly path = computed(() => {
    const ripple = this.width() * 0.528;
    const tail = this.width() - ripple;
    return markPath({ x: 0, y: 160, width: ripple, amplitude: 150, turns: 7, tail, steps: 560 });
  });
}
