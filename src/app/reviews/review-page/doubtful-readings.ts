import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { type DoubtfulReading, listDoubtfulReadings } from '#shared/contract/calibrations';
import { endpointResource } from '../../data/api';
import { VerdictMark } from '../../ui/marks/verdict-mark';
import { Loaded } from '../../ui/page-state/loaded';
import { PageState } from '../../ui/page-state/page-state';
import { ScrollRegion } from '../../ui/scroll-region';
import { LimitsPipe } from '../../ui/values/limits-pipe';
import { MomentPipe } from '../../ui/values/moment-pipe';
import { ReadingPipe } from '../../ui/values/reading-pipe';

/** Every reading of one lot that is in doubt, those first that the error found could have turned. */
@Component({
  selector: 'qr-doubtful-readings',
  imports: [LimitsPipe, Loaded, MomentPipe, PageState, ReadingPipe, ScrollRegion, VerdictMark],
  templateUrl: './doubtful-readings.html',
  styleUrl: './doubtful-readings.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class DoubtfulReadings {
  readonly reviewId = input.required<number>();
  readonly lot = input.required<{ id: number; number: string }>();

  protected readonly readings = endpointResource(listDoubtfulReadings, () => ({
    params: { id: this.reviewId(), lot: this.lot().id },
  }));
  protected readonly rows = computed(() => {
    const items = this.readings.hasValue() ? this.readings.value().items : [];
    const isNear = (reading: DoubtfulReading) => Number(reading.nearLimit === true);
    // Sorting is stable: within each half the order of the units stays.
    return [...items].sort((a, b) => isNear(b) - isNear(a));
  });
}
