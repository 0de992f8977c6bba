import { inject, type ResourceRef } from '@angular/core';
import { takeUntilDestroyed } from '@angular/core/rxjs-interop';
import { filter, throttleTime } from 'rxjs';
import { listWaveforms } from '#shared/contract/waveforms';
import { endpointResource, type Reply } from '../data/api';
import { LiveCounts } from '../data/live-counts';

/** A lot that changes often is asked for so often at most, in ms. */
const NOT_OFTENER = 1000;

/** The waveforms of a lot, read anew when the lot changes. Call it where injection is possible. */
export function lotWaveforms(lotId: () => number | undefined): ResourceRef<Reply<typeof listWaveforms> | undefined> {
  const list = endpointResource(listWaveforms, () => {
    const id = lotId();
    return id === undefined ? undefined : { params: { id } };
  });
  inject(LiveCounts)
    .lotChanges.pipe(
      filter((changed) => changed === null || changed === lotId()),
      throttleTime(NOT_OFTENER, undefined, { leading: true, trailing: true }),
      takeUntilDestroyed(),
    )
    .subscribe(() => list.reload());
  return list;
}
