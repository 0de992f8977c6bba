import { ChangeDetectionStrategy, Component, computed, inject, input, output } from '@angular/core';
import { MatButtonModule } from '@angular/material/button';
import { MatMenuModule } from '@angular/material/menu';
import { RouterLink } from '@angular/router';
import { readRecordCounts } from '#shared/contract/counts';
import { endpointResource } from '../../data/api';
import { Session } from '../../session/session';
import { Icon } from '../../ui/marks/icon';
import { VerdictMark } from '../../ui/marks/verdict-mark';
import { CountPipe } from '../../ui/values/count-pipe';
import { currentArea } from '../current-address';
import { RECORDS } from '../records';
import { STATIONS } from '../stations';

/**
 * The quiet menu of the records beside the line. On narrower screens it is an icon and also holds what has no room in the
 * header: the account, on a phone trends and the colour scheme.
 */
@Component({
  selector: 'qr-records-menu',
  imports: [RouterLink, MatButtonModule, MatMenuModule, CountPipe, Icon, VerdictMark],
  templateUrl: './records-menu.html',
  styleUrl: './records-menu.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class RecordsMenu {
  private readonly session = inject(Session);

  readonly compact = input(false);
  readonly phone = input(false);
  readonly signOut = output();
  readonly toggleScheme = output();

  protected readonly area = currentArea();
  protected readonly me = this.session.me;
  private readonly sizes = endpointResource(readRecordCounts, () => ({}));

  protected readonly groups = computed(() =>
    RECORDS.map((group) =>
      group
        .filter((record) => this.session.mayCall(record))
        .map((record) => ({ ...record, size: record.count === undefined ? undefined : this.counts()[record.count] })),
    ).filter((group) => group.length > 0),
  );
  protected readonly current = computed(() => RECORDS.flat().find(({ path }) => path === this.area())?.title);
  protected readonly due = computed(() => this.counts().instrumentsDue ?? 0);
  protected readonly trends = computed(() => {
    const station = STATIONS.find(({ key }) => key === 'trends');
    return station !== undefined && this.session.mayCall(station);
  });
  private readonly counts = computed(() => (this.sizes.hasValue() ? this.sizes.value() : {}));

  /** Counts are read again each time the menu opens. */
  protected opened(): void {
    this.sizes.reload();
  }
}
