import { readFileSync } from 'node:fs';
import path from 'node:path';
import { describe, expect, it } from 'vitest';
import { analyseWaveform } from '#shared/waveform/analyse-waveform';
import { recordQuality } from '#shared/waveform/record-quality';
import { waveformFindings } from '#shared/waveform/waveform-findings';
import { WaveformParser } from '#shared/waveform/waveform-parser';

// Waveforms of an independent circuit simulator (ngspice 39.3), with the values it measured; test/reference/data/ripple.
const FOLDER = path.join(import.meta.dirname, 'data', 'ripple');

interface Case {
  id: string;
  topology: string;
  line_hz: number;
  Vdc: number;
  Vpeak: number;
  Vmin: number;
  Vpp: number;
  Vrms_ripple: number;
  ripple_hz: number;
  peaks_per_cycle: number;
  alternate_peak_difference: number | null;
}
const { cases } = JSON.parse(readFileSync(path.join(FOLDER, 'index.json'), 'utf8')) as { cases: Case[] };
const captured = cases.filter(({ id }) => /^o[1-6]_/.test(id));

const TOPOLOGIES: Record<string, string> = {
  'half-wave': 'half-wave',
  'full-wave centre-tap': 'centre-tap',
  bridge: 'bridge',
};
/** What the simulated circuits are, by the netlists' own description of their faults. */
const FOUND: Record<string, string> = {
  o1_hw_50hz: 'nothing-unusual',
  o2_ct_60hz: 'nothing-unusual',
  o3_bridge_50hz: 'nothing-unusual',
  o4_ct_unbal_50hz: 'unequal-halves',
  o5_bridge_opend_60hz: 'one-half-open',
  o6_bridge_esr_60hz: 'nothing-unusual',
};

function wave(id: string) {
  const parser = new WaveformParser();
  parser.push(readFileSync(path.join(FOLDER, `${id}.csv`)));
  return parser.finish();
}

describe('waveforms of a circuit simulator', () => {
  it('has its six cases', () => {
    expect(captured.map(({ id }) => id).sort()).toEqual(Object.keys(FOUND).sort());
  });

  it.each(captured)('$id has its values', (known) => {
    const { analysis } = analyseWaveform(wave(known.id), known.line_hz);
    expect(analysis.lineCycles).toBe(5);
    expect(Math.abs(analysis.mean - known.Vdc)).toBeLessThan(2e-4 * known.Vdc);
    expect(Math.abs(analysis.max - known.Vpeak)).toBeLessThan(1e-3 * known.Vpp);
    expect(Math.abs(analysis.min - known.Vmin)).toBeLessThan(5e-3 * known.Vpp);
    expect(Math.abs(analysis.peakToPeak - known.Vpp)).toBeLessThan(5e-3 * known.Vpp);
    expect(Math.abs(analysis.rmsAc - known.Vrms_ripple)).toBeLessThan(2e-3 * known.Vrms_ripple);
    expect(analysis.rippleHertz).toBe(known.ripple_hz);
    expect(analysis.peaksPerCycle).toBe(known.peaks_per_cycle);
    if (known.alternate_peak_difference === null) expect(analysis.alternateDifference).toBeNull();
    else
      expect(Math.abs((analysis.alternateDifference ?? NaN) - known.alternate_peak_difference)).toBeLessThan(
        2e-3 * known.Vpp,
      );
  });

  it.each(captured)('$id is found to be what it is', (known) => {
    const samples = wave(known.id);
    const { analysis } = analyseWaveform(samples, known.line_hz);
    const found = waveformFindings(analysis, recordQuality(samples, known.line_hz), {
      topology: TOPOLOGIES[known.topology] ?? '',
      ratedVolts: known.Vdc,
      expectedRipple: { low: known.Vpp * 0.8, high: known.Vpp * 1.25 },
      alternateLimit: null,
    });
    expect(found.map(({ kind }) => kind)).toEqual([FOUND[known.id]]);
  });
});
