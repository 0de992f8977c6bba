import { ChangeDetectionStrategy, Component, inject, input } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { RouterLink } from '@angular/router';
import { keepReading } from '#shared/contract/bench';
import { listLots, type LotHead } from '#shared/contract/lots';
import { endpointResource } from '../../data/api';
import { may } from '../../session/may';
import { PageLinks } from '../../shell/page-links';
import { VerdictChip } from '../../ui/marks/verdict-chip';
import { SeverityMark } from '../../ui/marks/severity-mark';
import { Loaded } from '../../ui/page-state/loaded';
import { PageState } from '../../ui/page-state/page-state';
import { PartName } from '../../ui/part-name';
import { ScrollRegion } from '../../ui/scroll-region';
import { EmptyState } from '../../ui/states/empty-state';
import { CountPipe } from '../../ui/values/count-pipe';
import { MomentPipe } from '../../ui/values/moment-pipe';
import { ReadingQueue } from '../waiting/reading-queue';

/** The lots whose sample is drawn: those being measured, and those still to be started. */
@Component({
  selector: 'qr-bench-list-page',
  imports: [
    CountPipe,
    EmptyState,
    Loaded,
    MatButton,
    MomentPipe,
    PageLinks,
    PageState,
    PartName,
    RouterLink,
    ScrollRegion,
    SeverityMark,
    VerdictChip,
  ],
  templateUrl: './bench-list-page.html',
  styleUrl: './bench-list-page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class BenchListPage {
  private readonly queue = inject(ReadingQueue);

  /** Where the page of the list starts; given by the page before. */
  readonly after = input<string>();

  protected readonly lots = endpointResource(listLots, () => ({
    query: { station: 'bench' as const, after: this.after() },
  }));
  protected readonly mayMeasure = may(keepReading);

  protected step(lot: LotHead): string {
    if (!this.mayMeasure()) return 'Look';
    return lot.status === 'drawn' ? 'Start' : 'Continue';
  }

  /** How much of the sample is judged, in percent. */
  protected share(lot: LotHead): number {
    return (100 * lot.unitsJudged) / Math.max(lot.sampleSize ?? 0, 1);
  }

  /** Entries of the lot that have not reached the server. */
  protected waiting(lot: LotHead): number {
    return this.queue.entries().filter(({ act }) => act.lotId === lot.id).length;
  }
}
