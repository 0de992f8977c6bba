import { ChangeDetectionStrategy, Component } from '@angular/core';
import { Icon } from '../marks/icon';

/** Says why something cannot be edited; what changes it goes into an element marked `action`. */
@Component({
  selector: 'qr-read-only-note',
  imports: [Icon],
  template: `
    <qr-icon name="lock" [size]="18" />
    <div><ng-content /></div>
    <div class="action"><ng-content select="[action]" /></div>
  `,
  styles: `
    :host {
      display: flex;
      gap: 10px;
      align-items: center;
      padding: 9px 12px;
      border-radius: var(--qr-r-control);
      background: var(--qr-well);
      font: var(--qr-t-small);
    }
    .action {
      margin-left: auto;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ReadOnlyNote {}
