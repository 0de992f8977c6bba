import {
  ChangeDetectionStrategy,
  Component,
  computed,
  effect,
  inject,
  input,
  untracked,
  viewChild,
} from '@angular/core';
import { MatButton } from '@angular/material/button';
import { Router, RouterLink } from '@angular/router';
import { bookLot, listLots } from '#shared/contract/lots';
import { endpointResource } from '../../data/api';
import { LiveCounts } from '../../data/live-counts';
import { may } from '../../session/may';
import { narrowerThan } from '../../shell/screen-width';
import { FigureBlock } from '../../ui/figure-block';
import { Icon } from '../../ui/marks/icon';
import { Loaded } from '../../ui/page-state/loaded';
import { PageState } from '../../ui/page-state/page-state';
import { type Segment, Segmented } from '../../ui/segmented';
import { EmptyState } from '../../ui/states/empty-state';
import { durationText } from '../../ui/values/duration-pipe';
import { formatNumber } from '#shared/quantities/format-number';
import { ArrivalPanel } from '../arrival-panel/arrival-panel';
import { minuteClock } from '../minute-clock';
import { belongsTo, QUEUE_FILTERS, queueAt, type QueueFilter } from '../waiting';
import { QueueTable } from './queue-table/queue-table';
import { pageKey } from './page-key';

const TITLES: Readonly<Record<QueueFilter, string>> = { all: 'All', differs: 'Counts differ', 'no-plan': 'No plan' };
const filterOf = (text: unknown): QueueFilter => QUEUE_FILTERS.find((filter) => filter === text) ?? 'all';
const idOf = (text: unknown) => (text === undefined ? null : Number(text));

/** The queue of lots that are received and not yet on a bench, the most urgent first. */
@Component({
  selector: 'qr-arrivals-page',
  imports: [
    ArrivalPanel,
    EmptyState,
    FigureBlock,
    Icon,
    Loaded,
    MatButton,
    PageState,
    QueueTable,
    RouterLink,
    Segmented,
  ],
  templateUrl: './arrivals-page.html',
  styleUrl: './arrivals-page.scss',
  host: { '(document:keydown)': 'press($event)' },
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ArrivalsPage {
  private readonly router = inject(Router);
  private readonly counts = inject(LiveCounts, { optional: true })?.counts;
  private readonly panel = viewChild(ArrivalPanel);
  private readonly table = viewChild(QueueTable);

  readonly show = input('all', { transform: filterOf });
  /** The chosen lot. */
  readonly lot = input(null, { transform: idOf });

  protected readonly lots = endpointResource(listLots, () => ({ query: { station: 'arrivals' as const, limit: 200 } }));
  protected readonly now = minuteClock();
  protected readonly narrow = narrowerThan(1024);
  protected readonly mayBook = may(bookLot);

  private readonly queue = computed(() => queueAt(this.now(), this.lots.hasValue() ? this.lots.value().items : []));
  protected readonly shown = computed(() => this.queue().filter((waiting) => belongsTo(this.show(), waiting)));
  protected readonly chosen = computed(() => {
    const shown = this.shown();
    return shown.find(({ lot }) => lot.id === this.lot()) ?? shown[0];
  });
  protected readonly first = computed(() => this.queue()[0]?.lot.id);
  protected readonly segments = computed<Segment<QueueFilter>[]>(() =>
    QUEUE_FILTERS.map((value) => ({ value, label: `${TITLES[value]} ${this.count(value)}` })),
  );
  protected readonly figures = computed(() => {
    const queue = this.queue();
    const toSample = queue.reduce((sum, { lot }) => sum + (lot.sampleSize ?? 0), 0);
    const longest = Math.max(0, ...queue.map(({ hours }) => hours));
    return [
      { value: formatNumber(queue.length, 0), caption: queue.length === 1 ? 'lot waiting' : 'lots waiting' },
      { value: durationText(longest), caption: 'longest wait' },
      { value: formatNumber(toSample, 0), caption: 'units to sample' },
      { value: formatNumber(this.count('differs'), 0), caption: 'counts differ' },
    ];
  });

  constructor() {
    const waiting = computed(() => this.counts?.()?.arrivals);
    effect(() => {
      const expected = waiting();
      const known = untracked(() => (this.lots.hasValue() ? this.lots.value().items.length : undefined));
      if (expected !== undefined && known !== undefined && expected !== known) untracked(() => this.lots.reload());
    });
  }

  protected filter(show: QueueFilter): void {
    void this.router.navigate([], {
      queryParams: { show: show === 'all' ? null : show },
      queryParamsHandling: 'merge',
    });
  }

  protected choose(id: number): void {
    const replaceUrl = true;
    void this.router.navigate([], { queryParams: { lot: id }, queryParamsHandling: 'merge', replaceUrl });
  }

  /** R receives a lot, the arrows choose one, Enter starts the inspection of the chosen one. */
  protected press(event: KeyboardEvent): void {
    const key = pageKey(event);
    if (key === undefined) return;
    if (key === 'receive') {
      if (this.mayBook()) void this.router.navigate(['/arrivals/new']);
    } else if (this.narrow()) {
      return;
    } else if (key === 'start') {
      this.panel()?.start();
    } else {
      this.table()?.move(key === 'down' ? 1 : -1);
    }
    event.preventDefault();
  }

  private count(filter: QueueFilter): number {
    return this.queue().filter((waiting) => belongsTo(filter, waiting)).length;
  }
}
