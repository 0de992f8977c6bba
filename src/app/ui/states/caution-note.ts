import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import { Icon } from '../marks/icon';

/** A safety caution: always shown while it applies, never dismissed. */
@Component({
  selector: 'qr-caution-note',
  imports: [Icon],
  template: `
    <qr-icon name="bolt" />
    <div>
      @if (title()) {
        <b>{{ title() }}</b>&ngsp;
      }
      <ng-content />
    </div>
  `,
  styles: `
    :host {
      display: flex;
      gap: 10px;
      padding: 8px 12px;
      border-left: 4px solid var(--qr-hold-edge);
      border-radius: 0 var(--qr-r-control) var(--qr-r-control) 0;
      background: var(--qr-hold-tint);
      color: var(--qr-ink);
      font: var(--qr-t-small);
    }
    qr-icon {
      color: var(--qr-hold-text);
    }
    b {
      font-weight: 700;
    }
  `,
  host: { role: 'note' },
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class CautionNote {
  readonly title = input('');
}
