import { ChangeDetectionStrategy, Component, inject } from '@angular/core';
import { Connection, ConnectionCheck } from '../data/connection';
import { Icon } from '../ui/marks/icon';
import { CountPipe } from '../ui/values/count-pipe';
import { MomentPipe } from '../ui/values/moment-pipe';

/** Says that the server does not answer, since when, and what happens to readings meanwhile. */
@Component({
  selector: 'qr-offline-banner',
  imports: [CountPipe, Icon, MomentPipe],
  template: `
    <div role="status">
      @if (connection.lostSince(); as since) {
        <div class="banner">
          <qr-icon name="offline" />
          <span>
            <b>No connection since {{ since | moment }}.</b>
            @if (connection.waitingReadings() > 0) {
              Readings are kept on this device and sent when the server answers.
            } @else {
              What you see may be out of date.
            }
          </span>
          <span class="right">
            @if (connection.waitingReadings(); as waiting) {
              <b>{{ waiting | count }} readings waiting</b>
            }
            <button type="button" class="link" (click)="check.tryNow()">Try now</button>
          </span>
        </div>
      }
    </div>
  `,
  styles: `
    .banner {
      display: flex;
      align-items: center;
      gap: 10px;
      min-height: 44px;
      padding: 4px 20px;
      border-bottom: 1px solid var(--qr-hold-edge);
      background: var(--qr-hold-tint);
      font: var(--qr-t-small);
    }
    qr-icon {
      color: var(--qr-hold-text);
    }
    .right {
      display: flex;
      align-items: center;
      gap: 10px;
      margin-left: auto;
      white-space: nowrap;
    }
    button {
      min-height: 28px;
      border: 0;
      background: none;
      font: inherit;
      font-weight: 500;
      cursor: pointer;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class OfflineBanner {
  protected readonly connection = inject(Connection);
  protected readonly check = inject(ConnectionCheck);
}
