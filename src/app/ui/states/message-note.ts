import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import { VerdictMark } from '../marks/verdict-mark';
import { type VerdictLook } from '../verdict-look';

/** A sentence in the page about something that holds now: all saved, due soon, refused. */
@Component({
  selector: 'qr-message-note',
  imports: [VerdictMark],
  template: `
    <qr-verdict-mark [look]="look()" [size]="16" />
    <div><ng-content /></div>
  `,
  styles: `
    :host {
      display: flex;
      gap: 8px;
      align-items: flex-start;
      padding: 8px 10px;
      border-radius: var(--qr-r-control);
      font: var(--qr-t-small);
      color: var(--qr-ink);
    }
    qr-verdict-mark {
      margin-top: 1px;
    }
    :host(.ok) {
      background: var(--qr-ok-tint);
    }
    :host(.hold) {
      background: var(--qr-hold-tint);
    }
    :host(.nok) {
      background: var(--qr-nok-tint);
    }
    :host(.open) {
      background: var(--qr-well);
    }
  `,
  host: { '[class]': 'look()', '[attr.role]': "look() === 'nok' ? 'alert' : 'status'" },
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class MessageNote {
  readonly look = input.required<VerdictLook>();
}
