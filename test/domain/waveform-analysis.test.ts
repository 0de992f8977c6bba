import { type WaveformAnalysis } from '#shared/contract/waveforms';
import { analyseWaveform } from '#shared/waveform/analyse-waveform';
import { recordQuality } from '#shared/waveform/record-quality';
import { waveformFindings, type WaveformContext } from '#shared/waveform/waveform-findings';
import { waveformValue } from '#shared/waveform/waveform-value';
import { describe, expect, it } from 'vitest';
import { madeWave, type MadeWave } from '../support/made-wave';

const PART: WaveformContext = {
  topology: 'centre-tap',
  ratedVolts: 15,
  expectedRipple: { low: 0.4, high: 0.7 },
  alternateLimit: null,
};

function samplesOf(volts: readonly number[], interval: number) {
  return { volts: Float32Array.from(volts), start: 0, interval, interpolated: false };
}

function analysed(made: MadeWave, lineHertz = made.lineHertz ?? 50) {
  const { seconds, volts } = madeWave(made);
  const samples = samplesOf(volts, (seconds[1] ?? 0) - (seconds[0] ?? 0));
  return { samples, ...analyseWaveform(samples, lineHertz) };
}

function found(made: MadeWave, context: Partial<WaveformContext> = {}) {
  const { samples, analysis } = analysed(made);
  return waveformFindings(analysis, recordQuality(samples, analysis.lineHertz), { ...PART, ...context });
}
const kinds = (made: MadeWave, context: Partial<WaveformContext> = {}) => found(made, context).map(({ kind }) => kind);

describe('values of a waveform', () => {
  // A sine of amplitude A over whole periods: mean its offset, rms A/√2 (definition of the root mean square).
  it.each([50, 60])('of a sine at twice %i Hz are those of the sine', (lineHertz) => {
    const interval = 1 / (lineHertz * 333.3);
    const volts = Array.from({ length: 1700 }, (_, at) => 5 + 0.2 * Math.sin(4 * Math.PI * lineHertz * at * interval));
    const { analysis, spectrum } = analyseWaveform(samplesOf(volts, interval), lineHertz);
    expect(analysis.lineCycles).toBe(5);
    expect(analysis.mean).toBeCloseTo(5, 5);
    expect(analysis.rmsAc).toBeCloseTo(0.2 / Math.SQRT2, 5);
    expect(analysis.peakToPeak).toBeCloseTo(0.4, 4);
    expect(analysis.rippleHertz).toBe(2 * lineHertz);
    expect(analysis.atTwiceLine).toBeCloseTo(0.2, 3);
    expect(analysis.atLine).toBeLessThan(1e-3);
    expect(analysis.peaksPerCycle).toBe(2);
    expect(analysis.alternateDifference).toBeLessThan(1e-3);
    expect(spectrum.hertzPerBin).toBeCloseTo(lineHertz / 5, 9);
    expect(spectrum.amplitudes.indexOf(Math.max(...spectrum.amplitudes))).toBe(10);
  });

  // Parseval: half the sum of the squared amplitudes is the mean square.
  it('agree with their spectrum', () => {
    const { analysis, spectrum } = analysed({ lower: 0.2 });
    const power = spectrum.amplitudes.reduce((sum, amplitude) => sum + amplitude ** 2, 0) / 2;
    expect(Math.sqrt(power)).toBeCloseTo(analysis.rmsAc, 3);
  });

  it('count whole line cycles only', () => {
    const five = analysed({ cycles: 5 }).analysis;
    const more = analysed({ cycles: 5.7 }).analysis;
    expect(more.lineCycles).toBe(5);
    expect(more.mean).toBeCloseTo(five.mean, 6);
    expect(more.peaksPerCycle).toBe(2);
  });

  it('have peaks of two families, told apart by their place', () => {
    const { analysis } = analysed({ lower: 0.25 });
    expect(analysis.peaks.map(({ family }) => family)).toEqual(
      Array.from({ length: 10 }, (_, at) => (at % 2 === 0 ? 'odd' : 'even')),
    );
    expect(analysis.alternateDifference).toBeCloseTo(0.25, 3);
  });

  it('follow peaks that a person put', () => {
    const { samples, analysis } = analysed({ lower: 0.25 });
    const odd = analysis.peaks.filter(({ family }) => family === 'odd').map(({ index }) => index);
    const again = analyseWaveform(samples, 50, odd).analysis;
    expect(again.peaksPerCycle).toBe(1);
    expect(again.evenMean).toBeNull();
    expect(again.peakToPeak).toBe(analysis.peakToPeak);
  });

  it('without a whole line cycle are those of all samples', () => {
    const { analysis } = analysed({ cycles: 0.8 });
    expect(analysis).toMatchObject({ lineCycles: 0, rippleHertz: null, peaksPerCycle: 0, harmonics: [] });
    expect(analysis.peakToPeak).toBeGreaterThan(0.4);
  });

  it('of a flat line are no ripple', () => {
    const { analysis } = analyseWaveform(
      samplesOf(
        Array.from({ length: 2000 }, () => 12),
        5e-5,
      ),
      50,
    );
    expect(analysis).toMatchObject({ mean: 12, peakToPeak: 0, rmsAc: 0, rippleHertz: null, peaksPerCycle: 0 });
  });
});

describe('what a waveform is found to be', () => {
  it.each<[string, MadeWave, Partial<WaveformContext>, string]>([
    ['two equal peaks within the band', {}, {}, 'nothing-unusual'],
    ['the same with noise', { noise: 0.01 }, {}, 'nothing-unusual'],
    [
      'the same with much noise, which is in the ripple',
      { noise: 0.02, samplesPerCycle: 4000 },
      { expectedRipple: { low: 0.4, high: 0.8 } },
      'nothing-unusual',
    ],
    ['the same through an 8-bit converter', { step: 0.004, samplesPerCycle: 2000 }, {}, 'nothing-unusual'],
    ['a half-wave part with its one peak', { halves: 1 }, { topology: 'half-wave' }, 'nothing-unusual'],
    ['one peak where two are due', { halves: 1 }, {}, 'one-half-open'],
    ['one peak with noise', { halves: 1, noise: 0.01 }, { topology: 'bridge' }, 'one-half-open'],
    ['unequal peaks of a centre tap', { lower: 0.4 }, {}, 'unequal-halves'],
    ['unequal peaks with noise', { lower: 0.4, noise: 0.01 }, {}, 'unequal-halves'],
    ['unequal peaks of a bridge', { lower: 0.4 }, { topology: 'bridge' }, 'unequal-paths'],
    [
      'peaks closer than 2 % of the rated voltage',
      { lower: 0.2 },
      { expectedRipple: { low: 0.4, high: 0.8 } },
      'nothing-unusual',
    ],
    ['peaks apart by more than the plan allows', { lower: 0.2 }, { alternateLimit: 0.15 }, 'unequal-halves'],
    ['a ripple above the band', { droop: 0.9 }, {}, 'capacitance-low-or-load-high'],
    ['a ripple below the band', { droop: 0.2 }, {}, 'load-missing'],
    ['a ripple of which nothing is known', { droop: 0.2 }, { expectedRipple: null }, 'nothing-unusual'],
    ['unequal halves, whatever the size', { lower: 0.5, droop: 0.9 }, {}, 'unequal-halves'],
    ['one second of it', { cycles: 50 }, {}, 'nothing-unusual'],
    ['a top that is cut off', { ceiling: 15.9 }, {}, 'clipped'],
    ['too few samples', { samplesPerCycle: 30 }, {}, 'aliased'],
    ['too few levels', { step: 0.2 }, {}, 'too-coarse'],
    ['one line cycle', { cycles: 1.5 }, {}, 'too-short'],
    ['less than one', { cycles: 0.5 }, {}, 'too-short'],
  ])('%s', (_name, made, context, kind) => {
    expect(kinds(made, context)).toEqual([kind]);
  });

  it('names all that is wrong with a record, and nothing of the part', () => {
    expect(kinds({ cycles: 1.2, ceiling: 15.9, lower: 0.4 })).toEqual(['clipped', 'too-short']);
  });

  it('takes noise alone for no ripple', () => {
    expect(kinds({ droop: 0, noise: 0.1 })).toEqual(['aliased']);
  });

  it('is not moved by the strongest component at the line frequency', () => {
    const { analysis } = analysed({ lower: 0.4 });
    expect(analysis.rippleHertz).toBe(50);
    expect(kinds({ lower: 0.4 })).toEqual(['unequal-halves']);
  });

  it('says what was seen, with figures, and that some faults look alike', () => {
    const [open] = found({ halves: 1 });
    expect(open?.evidence).toBe(
      'One peak in a line cycle over 5 cycles, where two are due; the ripple has 50\u00a0Hz.',
    );
    expect(open?.cause).toContain('look alike');
    const [unequal] = found({ lower: 0.4 });
    expect(unequal?.evidence).toContain('400\u00a0mV apart');
  });
});

describe('a reading from a waveform', () => {
  const analysis: WaveformAnalysis = { ...analysed({ lower: 0.25 }).analysis, rippleHertz: 50 };
  const of = (
    measurand: Parameters<typeof waveformValue>[1]['measurand'],
    alternatePeaks: 'worst' | 'mean' = 'worst',
  ) => waveformValue(analysis, { name: 'Ripple', measurand, alternatePeaks });

  it('is what the plan asks for', () => {
    expect(of('ripple')).toBe(analysis.peakToPeak);
    expect(of('ripple', 'mean')).toBeCloseTo(analysis.peakToPeak - 0.125, 3);
    expect(of('ripple-rms')).toBe(analysis.rmsAc);
    expect(of('loaded-voltage')).toBe(analysis.mean);
    expect(of('frequency')).toBe(50);
  });

  it('is refused of what a waveform does not show', () => {
    expect(() => of('temperature')).toThrow('A waveform of the output does not give Ripple.');
  });
});
