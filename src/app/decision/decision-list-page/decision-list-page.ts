import { ChangeDetectionStrategy, Component, effect, inject, input, untracked } from '@angular/core';
import { RouterLink } from '@angular/router';
import { listLots } from '#shared/contract/lots';
import { endpointResource } from '../../data/api';
import { LiveCounts } from '../../data/live-counts';
import { PageLinks } from '../../shell/page-links';
import { SeverityMark } from '../../ui/marks/severity-mark';
import { VerdictChip } from '../../ui/marks/verdict-chip';
import { Loaded } from '../../ui/page-state/loaded';
import { PageState } from '../../ui/page-state/page-state';
import { EmptyState } from '../../ui/states/empty-state';
import { PartName } from '../../ui/part-name';
import { CountPipe } from '../../ui/values/count-pipe';
import { MomentPipe } from '../../ui/values/moment-pipe';

/** Measured lots that wait for quality's signature, the longest waiting first. */
@Component({
  selector: 'qr-decision-list-page',
  imports: [
    CountPipe,
    EmptyState,
    Loaded,
    MomentPipe,
    PageLinks,
    PageState,
    PartName,
    RouterLink,
    SeverityMark,
    VerdictChip,
  ],
  templateUrl: './decision-list-page.html',
  styleUrl: './decision-list-page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class DecisionListPage {
  readonly after = input<string>();

  protected readonly lots = endpointResource(listLots, () => ({
    query: { station: 'decision' as const, after: this.after() },
  }));

  constructor() {
    const counts = inject(LiveCounts, { optional: true })?.counts;
    let known: number | undefined;
    effect(() => {
      const waiting = counts?.()?.decision;
      if (known !== undefined && waiting !== known) untracked(() => this.lots.reload());
      known = waiting;
    });
  }
}
