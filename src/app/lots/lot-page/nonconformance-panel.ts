import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import { RouterLink } from '@angular/router';
import { readNonconformance } from '#shared/contract/nonconformances';
import { endpointResource } from '../../data/api';
import { NoticeList } from '../../nonconformances/notice-list';
import { Loaded } from '../../ui/page-state/loaded';
import { PageState } from '../../ui/page-state/page-state';
import { MomentPipe } from '../../ui/values/moment-pipe';

/** The nonconformance of a rejected lot, in short: how the lot is contained and who was told. */
@Component({
  selector: 'qr-nonconformance-panel',
  imports: [Loaded, MomentPipe, NoticeList, PageState, RouterLink],
  template: `
    <qr-page-state what="The nonconformance" [rows]="3">
      <ng-template [qrLoaded]="nonconformance" let-shown>
        @if (shown) {
          <header>
            <h2>Nonconformance</h2>
            <a class="ident link" [routerLink]="['/nonconformances', shown.id]">{{ shown.number }}</a>
          </header>
          <p class="contained">
            <span class="caption">Containment</span>
            {{ shown.containment }}
          </p>
          <dl class="kv">
            <dt>Status</dt>
            <dd>Open</dd>
            <dt>Opened</dt>
            <dd>{{ shown.openedAt | moment }}, {{ shown.openedBy }}</dd>
          </dl>
          <qr-notice-list [notices]="shown.notices" />
        }
      </ng-template>
    </qr-page-state>
  `,
  styles: `
    header {
      display: flex;
      justify-content: space-between;
      align-items: baseline;
    }
    .contained {
      display: grid;
      margin: 10px 0 12px;
      padding: 8px 12px;
      border: 1px solid var(--qr-nok-fill);
      border-left-width: 6px;
      overflow-wrap: anywhere;
    }
    qr-notice-list {
      display: block;
      margin-top: 12px;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class NonconformancePanel {
  readonly nonconformanceId = input.required<number>();

  protected readonly nonconformance = endpointResource(readNonconformance, () => ({
    params: { id: this.nonconformanceId() },
  }));
}
