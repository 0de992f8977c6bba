import { analyseWaveform } from '#shared/waveform/analyse-waveform';
import { recordQuality } from '#shared/waveform/record-quality';
import { waveformFindings } from '#shared/waveform/waveform-findings';
import { WaveformParser } from '#shared/waveform/waveform-parser';
import { madeFile } from '../support/made-wave';
import { median } from './quantile';
import { type Line } from './report';
import { timesOf } from './timing';

const SAMPLES = 1_000_000;
const CYCLES = 50;
const TURNS = 7;
const PIECE = 65_536;

const PART = { topology: 'bridge', ratedVolts: 15, expectedRipple: { low: 0.4, high: 0.7 }, alternateLimit: null };

/** Reads a file of a million samples as it comes from the disk, computes its values and decides what it shows. */
export async function measureWaveform(): Promise<Line[]> {
  const file = Buffer.from(madeFile({ cycles: CYCLES, samplesPerCycle: SAMPLES / CYCLES, noise: 0.01 }));
  const parse = () => {
    const parser = new WaveformParser();
    for (let at = 0; at < file.length; at += PIECE) parser.push(file.subarray(at, at + PIECE));
    return parser.finish();
  };
  const parsing = await timesOf(TURNS, parse);
  const wave = parse();
  const analysing = await timesOf(TURNS, () =>
    waveformFindings(analyseWaveform(wave, 50).analysis, recordQuality(wave, 50), PART),
  );
  const both = median(parsing) + median(analysing);
  return [
    {
      what: `waveform of ${(file.length / 1e6).toFixed(0)} MB, a million samples, parsed and analysed`,
      measured: `median ${both.toFixed(0)} ms: ${median(parsing).toFixed(0)} parsing, ${median(analysing).toFixed(0)} analysing`,
      bar: '< 1 s',
      holds: both < 1000,
    },
  ];
}
