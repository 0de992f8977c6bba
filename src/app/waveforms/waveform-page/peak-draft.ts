import { computed, signal } from '@angular/core';
import { type WaveformPeak, type WaveformRecord } from '#shared/contract/waveforms';
import { peakFamilies } from '#shared/waveform/peak-families';
import { type WaveSamples } from './wave-samples';

/** Peaks that a person is putting where they see them; nothing of it counts until it is saved. */
export class PeakDraft {
  private readonly placed = signal<readonly number[]>([]);

  /** Number of the peak that is moved. */
  readonly chosen = signal(0);
  readonly peaks = computed<readonly WaveformPeak[]>(() => {
    const { spacing, analysis } = this.record;
    const { volts } = this.samples;
    const placed = this.placed().map((index) => ({ index, volts: volts[index] ?? 0 }));
    const samplesPerCycle = 1 / (analysis.lineHertz * spacing.interval);
    return peakFamilies(placed, samplesPerCycle, (index) => spacing.start + index * spacing.interval).peaks;
  });
  readonly indices = this.placed.asReadonly();
  readonly changed = computed(() => {
    const before = this.record.analysis.peaks.map(({ index }) => index);
    const now = this.placed();
    return now.length !== before.length || now.some((index, nth) => index !== before[nth]);
  });

  constructor(
    private readonly record: WaveformRecord,
    private readonly samples: WaveSamples,
  ) {
    this.placed.set(record.analysis.peaks.map(({ index }) => index));
  }

  /** Moves the chosen peak by so many samples, within the waveform; peaks keep their order. */
  move(by: number): void {
    const nth = this.chosen();
    const now = this.placed();
    const index = now[nth];
    if (index === undefined) return;
    const lowest = (now[nth - 1] ?? -1) + 1;
    const highest = (now[nth + 1] ?? this.samples.volts.length) - 1;
    const moved = Math.min(highest, Math.max(lowest, index + by));
    this.placed.set(now.map((one, at) => (at === nth ? moved : one)));
  }

  remove(): void {
    const nth = this.chosen();
    this.placed.update((now) => now.filter((_, at) => at !== nth));
    this.chosen.set(Math.max(0, Math.min(nth, this.placed().length - 1)));
  }

  /** Puts one more peak at a sample, unless there is one, and chooses it. */
  add(index: number): void {
    const now = [...new Set([...this.placed(), index])].sort((one, other) => one - other);
    this.placed.set(now);
    this.chosen.set(now.indexOf(index));
  }
}
