import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import { RouterLink } from '@angular/router';
import { readMessage } from '#shared/contract/mail';
import { type Nonconformance } from '#shared/contract/nonconformances';
import { may } from '../session/may';
import { Icon } from '../ui/marks/icon';
import { VerdictChip } from '../ui/marks/verdict-chip';
import { MomentPipe } from '../ui/values/moment-pipe';

type Notice = Nonconformance['notices'][number];

/** The e-mails that told of a nonconformance, and how far each has come. */
@Component({
  selector: 'qr-notice-list',
  imports: [Icon, MomentPipe, RouterLink, VerdictChip],
  template: `
    @for (notice of notices(); track notice.id) {
      <div class="notice">
        <qr-icon name="mail" [size]="18" />
        <div>
          @switch (notice.status) {
            @case ('sent') {
              <b>E-mail sent</b>&ngsp;<span class="mono">{{ notice.sentAt | moment }}</span>
            }
            @case ('queued') {
              <b>E-mail waits to be sent</b>&ngsp;<span class="mono">since {{ notice.queuedAt | moment }}</span>
            }
            @default {
              <qr-verdict-chip look="nok" word="E-mail could not be sent" />
            }
          }
          <p class="quiet">{{ notice.to.join(', ') || 'nobody is on the list' }}</p>
          @if (mayRead()) {
            <a class="link" [routerLink]="['/mail', notice.id]">Open message</a>
          }
        </div>
      </div>
    } @empty {
      <p class="small quiet">No notice was sent.</p>
    }
  `,
  styles: `
    .notice {
      display: flex;
      gap: 10px;
      padding: 9px 12px;
      border-radius: 4px;
      background: var(--qr-well);
      font: var(--qr-t-small);
      overflow-wrap: anywhere;
    }
    .notice + .notice {
      margin-top: 8px;
    }
    .notice > div {
      min-width: 0;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class NoticeList {
  readonly notices = input.required<readonly Notice[]>();

  protected readonly mayRead = may(readMessage);
}
