import { type WaveformRecord } from '#shared/contract/waveforms';
import { EnvelopePyramid } from '#shared/waveform/envelope-pyramid';
import { PeakDraft } from './peak-draft';

const volts = Float32Array.from({ length: 100 }, (_, at) => at);
const record = {
  spacing: { start: 1, interval: 0.001 },
  analysis: { lineHertz: 50, peaks: [{ index: 10 }, { index: 20 }, { index: 30 }] },
} as unknown as WaveformRecord;
const draft = () => new PeakDraft(record, { volts, pyramid: new EnvelopePyramid(volts) });

describe('PeakDraft', () => {
  it('begins with the peaks as they stand, told apart by half cycles', () => {
    const peaks = draft();
    expect(peaks.changed()).toBe(false);
    expect(peaks.peaks().map(({ index, family, seconds, volts: height }) => [index, family, seconds, height])).toEqual([
      [10, 'odd', 1.01, 10],
      [20, 'even', 1.02, 20],
      [30, 'odd', 1.03, 30],
    ]);
  });

  it('moves a peak between its neighbours and never past them', () => {
    const peaks = draft();
    peaks.chosen.set(1);
    peaks.move(5);
    expect(peaks.indices()).toEqual([10, 25, 30]);
    peaks.move(500);
    expect(peaks.indices()).toEqual([10, 29, 30]);
    peaks.move(-500);
    expect(peaks.indices()).toEqual([10, 11, 30]);
    expect(peaks.changed()).toBe(true);
  });

  it('removes the chosen one, and adds one where there is none', () => {
    const peaks = draft();
    peaks.chosen.set(2);
    peaks.remove();
    expect(peaks.indices()).toEqual([10, 20]);
    expect(peaks.chosen()).toBe(1);
    peaks.add(15);
    peaks.add(15);
    expect(peaks.indices()).toEqual([10, 15, 20]);
    expect(peaks.chosen()).toBe(1);
  });
});
