import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import { RouterLink } from '@angular/router';
import { listNonconformances } from '#shared/contract/nonconformances';
import { endpointResource } from '../../data/api';
import { PageLinks } from '../../shell/page-links';
import { Loaded } from '../../ui/page-state/loaded';
import { PageState } from '../../ui/page-state/page-state';
import { EmptyState } from '../../ui/states/empty-state';
import { PartName } from '../../ui/part-name';
import { MomentPipe } from '../../ui/values/moment-pipe';

/** All nonconformances, newest first. */
@Component({
  selector: 'qr-nonconformance-list-page',
  imports: [EmptyState, Loaded, MomentPipe, PageLinks, PageState, PartName, RouterLink],
  templateUrl: './nonconformance-list-page.html',
  styles: `
    .name {
      max-width: 300px;
      overflow-wrap: break-word;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class NonconformanceListPage {
  readonly after = input<string>();

  protected readonly nonconformances = endpointResource(listNonconformances, () => ({
    query: { after: this.after() },
  }));
}
