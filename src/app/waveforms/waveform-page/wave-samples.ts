import { inject, type ResourceRef } from '@angular/core';
import { rxResource } from '@angular/core/rxjs-interop';
import { from, map, switchMap } from 'rxjs';
import { readWaveformSamples } from '#shared/contract/waveforms';
import { EnvelopePyramid } from '#shared/waveform/envelope-pyramid';
import { ApiClient } from '../../data/api';

/** The samples of a waveform in volts, and the envelope of any stretch of them. */
export interface WaveSamples {
  readonly volts: Float32Array;
  readonly pyramid: EnvelopePyramid;
}

/** Loads the samples once, as bytes. Call it where injection is possible. */
export function waveSamples(id: () => string): ResourceRef<WaveSamples | undefined> {
  const api = inject(ApiClient);
  return rxResource({
    params: id,
    stream: ({ params }) =>
      api.download(readWaveformSamples, { params: { waveform: params } }).pipe(
        switchMap(({ body }) => from(body?.arrayBuffer() ?? Promise.resolve(new ArrayBuffer(0)))),
        map((bytes) => {
          const volts = new Float32Array(bytes);
          return { volts, pyramid: new EnvelopePyramid(volts) };
        }),
      ),
  });
}
