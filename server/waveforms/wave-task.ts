import { type WaveformRecord } from '#shared/contract/waveforms';
import { analyseWaveform } from '#shared/waveform/analyse-waveform';
import { type EvenSamples } from '#shared/waveform/even-samples';
import { recordQuality } from '#shared/waveform/record-quality';
import { waveformFindings, type WaveformContext } from '#shared/waveform/waveform-findings';
import { WaveformParser } from '#shared/waveform/waveform-parser';
import { closeSync, openSync, readFileSync, readSync } from 'node:fs';

/** What a waveform was measured of, as far as its findings need it. */
export interface MeasuredPart extends WaveformContext {
  lineHertz: number;
}

/** A file to be read, or samples already read of which a person put the peaks. */
export type WaveTask = { part: MeasuredPart } & (
  | { kind: 'file'; path: string; channel: string | null }
  | { kind: 'peaks'; path: string; spacing: WaveformRecord['spacing']; interpolated: boolean; indices: number[] }
);

type Computed = Pick<WaveformRecord, 'analysis' | 'findings' | 'spectrum'>;
type Described = Pick<WaveformRecord, 'columns' | 'channel' | 'samples' | 'spacing' | 'interpolated'>;

/** What a file gave: its record but for what people did, and its samples as bytes. */
export interface WaveRead {
  record: Described & Computed;
  samples: Uint8Array;
}
export interface WavePeaks {
  computed: Computed;
}

const PIECE = 1_048_576;

function computed(samples: EvenSamples, part: MeasuredPart, indices?: readonly number[]): Computed {
  const { analysis, spectrum } = analyseWaveform(samples, part.lineHertz, indices);
  return { analysis, spectrum, findings: waveformFindings(analysis, recordQuality(samples, part.lineHertz), part) };
}

function parsed(path: string, channel: string | null) {
  const parser = new WaveformParser(channel);
  const piece = new Uint8Array(PIECE);
  const handle = openSync(path, 'r');
  try {
    for (;;) {
      const bytes = readSync(handle, piece);
      if (bytes === 0) return parser.finish();
      parser.push(piece.slice(0, bytes));
    }
  } finally {
    closeSync(handle);
  }
}

function readFile(path: string, channel: string | null, part: MeasuredPart): WaveRead {
  const { columns, channel: taken, volts, start, interval, interpolated } = parsed(path, channel);
  const samples = { volts: volts.slice(), start, interval, interpolated };
  const spacing = { start, interval };
  return {
    record: {
      columns,
      channel: taken,
      samples: volts.length,
      spacing,
      interpolated,
      ...computed(samples, part),
    },
    samples: new Uint8Array(samples.volts.buffer),
  };
}

/**
 * Reads a file and computes what is kept of it, or computes anew with other peaks. It works while it lasts; a thread of its
 * own runs it.
 *
 * @throws {WaveformNotUnderstood} for a file that is no waveform
 */
export function workOnWave(task: WaveTask): WaveRead | WavePeaks {
  if (task.kind === 'file') return readFile(task.path, task.channel, task.part);
  const { start, interval } = task.spacing;
  const bytes = readFileSync(task.path);
  const volts = new Float32Array(bytes.buffer.slice(bytes.byteOffset, bytes.byteOffset + bytes.byteLength));
  return { computed: computed({ volts, start, interval, interpolated: task.interpolated }, task.part, task.indices) };
}
