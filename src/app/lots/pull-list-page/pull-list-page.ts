import { ChangeDetectionStrategy, Component, input, numberAttribute } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { RouterLink } from '@angular/router';
import { readBench } from '#shared/contract/bench';
import { readPullList } from '#shared/contract/lots';
import { endpointResource } from '../../data/api';
import { may } from '../../session/may';
import { BackLink } from '../../shell/back-link';
import { Loaded } from '../../ui/page-state/loaded';
import { PageState } from '../../ui/page-state/page-state';
import { CountPipe } from '../../ui/values/count-pipe';
import { MomentPipe } from '../../ui/values/moment-pipe';

/** Which units to pull, carton by carton, to be printed and ticked at the pallet. */
@Component({
  selector: 'qr-pull-list-page',
  imports: [BackLink, CountPipe, Loaded, MatButton, MomentPipe, PageState, RouterLink],
  templateUrl: './pull-list-page.html',
  styleUrl: './pull-list-page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PullListPage {
  readonly id = input.required({ transform: numberAttribute });

  protected readonly list = endpointResource(readPullList, () => ({ params: { id: this.id() } }));
  protected readonly mayMeasure = may(readBench);

  protected print(): void {
    window.print();
  }
}
