import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { RouterLink } from '@angular/router';
import { addGaugeStudy, listGaugeStudies } from '#shared/contract/gauge-studies';
import { percentText } from '#shared/papers/gauge-study-figures';
import { endpointResource } from '../../data/api';
import { may } from '../../session/may';
import { PageLinks } from '../../shell/page-links';
import { Icon } from '../../ui/marks/icon';
import { Loaded } from '../../ui/page-state/loaded';
import { PageState } from '../../ui/page-state/page-state';
import { EmptyState } from '../../ui/states/empty-state';
import { MomentPipe } from '../../ui/values/moment-pipe';
import { StudyStatus } from '../study-status';

/** All gauge studies, newest first. */
@Component({
  selector: 'qr-gauge-study-list-page',
  imports: [EmptyState, Icon, Loaded, MatButton, MomentPipe, PageLinks, PageState, RouterLink, StudyStatus],
  templateUrl: './gauge-study-list-page.html',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class GaugeStudyListPage {
  readonly after = input<string>();

  protected readonly studies = endpointResource(listGaugeStudies, () => ({ query: { after: this.after() } }));
  protected readonly mayAdd = may(addGaugeStudy);
  protected readonly percent = percentText;
}
