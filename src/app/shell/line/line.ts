import { ChangeDetectionStrategy, Component, computed, inject } from '@angular/core';
import { type Counts } from '#shared/contract/counts';
import { LiveCounts } from '../../data/live-counts';
import { Session } from '../../session/session';
import { momentText } from '../../ui/values/moment-pipe';
import { currentArea } from '../current-address';
import { LinePlace } from '../line-place';
import { narrowerThan } from '../screen-width';
import { STATIONS, type Station } from '../stations';
import { StationLink } from './station-link';

/**
 * The line: the primary navigation, drawn as the rail the lots run on. After the decision it forks: released lots straight
 * on, held lots on the siding. Trends read the lots and hang on a dotted rail. On a phone it is the bar at the bottom.
 */
@Component({
  selector: 'qr-line',
  imports: [StationLink],
  templateUrl: './line.html',
  styleUrl: './line.scss',
  host: { '[class.bar]': 'phone()' },
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class Line {
  private readonly session = inject(Session);
  private readonly live = inject(LiveCounts);
  private readonly area = currentArea();
  private readonly place = inject(LinePlace);

  protected readonly phone = narrowerThan(600);
  protected readonly stale = computed(() => this.live.staleSince() !== null);
  protected readonly staleNote = computed(() => {
    const since = this.live.staleSince();
    return since === null ? '' : `Counts from ${momentText(since, 'auto', new Date())}`;
  });

  private readonly stations = computed(() =>
    STATIONS.filter((station) => this.session.mayCall(station)).map((station) => ({
      ...station,
      shown: this.countOf(station, this.live.counts()),
      active: station.key === this.activeKey(),
    })),
  );
  protected readonly trunk = computed(() => this.stations().slice(0, this.stations().findIndex(isEnd)));
  protected readonly released = computed(() => this.stations().find(({ key }) => key === 'released'));
  protected readonly held = computed(() => this.stations().find(({ key }) => key === 'on-hold'));
  protected readonly trends = computed(() => this.stations().find(({ key }) => key === 'trends'));
  protected readonly any = computed(() => this.stations().length > 0);

  private activeKey(): string | null {
    return this.area() === 'lots' ? this.place.station() : this.area();
  }

  private countOf(station: Station, counts: Counts | null): string {
    if (station.count === null) return '';
    const count = counts?.[station.count];
    if (count === undefined) return '·';
    return count > 999 ? '999+' : String(count);
  }
}

function isEnd({ key }: Station): boolean {
  return key === 'released' || key === 'on-hold';
}
