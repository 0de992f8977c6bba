import { analyseWaveform } from '#shared/waveform/analyse-waveform';
import { FINDING_KINDS } from '#shared/contract/waveforms';
import { NumeralBytes } from '#shared/waveform/numeral-bytes';
import { recordQuality } from '#shared/waveform/record-quality';
import { waveformFindings } from '#shared/waveform/waveform-findings';
import { WaveformNotUnderstood } from '#shared/waveform/waveform-not-understood';
import { WaveformParser } from '#shared/waveform/waveform-parser';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { numRuns } from '../support/fuzz-runs';

const field = fc.oneof(
  { weight: 6, arbitrary: fc.float({ noNaN: true, noDefaultInfinity: true }).map(String) },
  { weight: 3, arbitrary: fc.integer({ min: -1000, max: 1000 }).map((value) => (value / 8).toString()) },
  {
    weight: 1,
    arbitrary: fc.constantFrom(
      '',
      'NaN',
      'inf',
      '-',
      '.',
      ',',
      '1e',
      '+1',
      '1,5',
      '"2"',
      ' 3 ',
      '1e400',
      'V',
      's',
      '(ms)',
    ),
  },
  { weight: 1, arbitrary: fc.string({ maxLength: 6 }) },
);
const delimiter = fc.constantFrom(',', ';', '\t', ' ', '|', ', ');
const newline = fc.constantFrom('\n', '\r\n', '\r');
/** Tables that are nearly right: rows of fields, at times in the order of time. */
const table = fc
  .record({
    heading: fc.option(fc.string({ maxLength: 20 })),
    rows: fc.array(fc.array(field, { minLength: 1, maxLength: 4 }), { maxLength: 40 }),
    isOrdered: fc.boolean(),
    delimiter,
    newline,
  })
  .map(({ heading, rows, isOrdered, delimiter: between, newline: end }) =>
    [
      ...(heading === null ? [] : [heading]),
      ...rows.map((row, at) => (isOrdered ? [String(at * 1e-3), ...row] : row).join(between)),
    ].join(end),
  );
const text = fc.oneof(
  { weight: 6, arbitrary: table.map((made) => new TextEncoder().encode(made)) },
  { weight: 1, arbitrary: fc.string({ maxLength: 200, unit: 'binary' }).map((made) => new TextEncoder().encode(made)) },
  { weight: 1, arbitrary: fc.uint8Array({ maxLength: 200 }) },
);
function parse(bytes: Uint8Array) {
  const parser = new WaveformParser(null, 10_000);
  parser.push(bytes);
  return parser.finish();
}

describe('any bytes', () => {
  it('give finite samples with values and findings, or a sentence why not', () => {
    fc.assert(
      fc.property(text, (bytes) => {
        let wave;
        try {
          wave = parse(bytes);
        } catch (error) {
          expect(error).toBeInstanceOf(WaveformNotUnderstood);
          expect((error as WaveformNotUnderstood).message).toMatch(/\w{3}.*[.”]$/su);
          return;
        }
        expect(wave.volts.length).toBeGreaterThan(1);
        expect(wave.volts.every(Number.isFinite)).toBe(true);
        expect(wave.interval).toBeGreaterThan(0);
        const { analysis, spectrum } = analyseWaveform(wave, 50);
        const numbers = [
          analysis.mean,
          analysis.max,
          analysis.min,
          analysis.rmsAc,
          analysis.peaksPerCycle,
          ...spectrum.amplitudes,
        ];
        expect(numbers.every(Number.isFinite)).toBe(true);
        expect(analysis.max).toBeGreaterThanOrEqual(analysis.min);
        const context = {
          topology: 'bridge',
          ratedVolts: 12,
          expectedRipple: { low: 0.1, high: 1 },
          alternateLimit: null,
        };
        const findings = waveformFindings(analysis, recordQuality(wave, 50), context);
        expect(findings.length).toBeGreaterThan(0);
        for (const { kind } of findings) expect(FINDING_KINDS).toContain(kind);
      }),
      { numRuns },
    );
  });
});

describe('any number', () => {
  const numerals = new NumeralBytes('.'.charCodeAt(0));
  const read = (typed: string) => {
    const bytes = new TextEncoder().encode(typed);
    return numerals.read(bytes, 0, bytes.length);
  };
  it('is read as the language reads it', () => {
    const digits = fc.stringMatching(/^[+-]?\d{0,20}(\.\d{0,20})?([eE][+-]?\d{1,3})?$/);
    const printed = fc.oneof(fc.double({ noNaN: true }).map(String), digits);
    fc.assert(
      fc.property(printed, (typed) => {
        const isNumber = /^[+-]?(\d+\.?\d*|\.\d+)([eE][+-]?\d+)?$/.test(typed);
        expect(read(typed)).toBe(isNumber ? Number(typed) : NaN);
      }),
      { numRuns },
    );
  });
});
