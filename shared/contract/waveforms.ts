import * as z from 'zod';

/** What is kept of a waveform beside its file and its samples. */
export const waveformRecord = z.object({
  samples: z.int(),
});
export type WaveformRecord = z.infer<typeof waveformRecord>;
