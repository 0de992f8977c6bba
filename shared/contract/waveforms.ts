import * as z from 'zod';
import { byId, done, endpoint, storedFile } from './endpoint';
import { id, line, moment, reason, version } from './fields';
import { type Role } from './roles';

const READERS = ['inspector', 'quality', 'engineering', 'auditor'] as const satisfies readonly Role[];
const WRITERS = ['inspector', 'quality'] as const satisfies readonly Role[];

/** What a waveform can be found to be, in the order in which it is decided. */
export const FINDING_KINDS = [
  'clipped',
  'aliased',
  'too-coarse',
  'too-short',
  'one-half-open',
  'unequal-halves',
  'unequal-paths',
  'capacitance-low-or-load-high',
  'load-missing',
  'nothing-unusual',
] as const;

export const waveformPeak = z.object({
  /** Number of the sample. */
  index: z.int().min(0),
  seconds: z.number(),
  volts: z.number(),
  family: z.enum(['odd', 'even']),
});
export type WaveformPeak = z.infer<typeof waveformPeak>;

/** What was computed of a waveform's whole line cycles; SI base units. */
export const waveformAnalysis = z.object({
  lineHertz: z.number(),
  /** Whole line cycles that everything below was computed from; 0 where there is not one, then from all samples. */
  lineCycles: z.int(),
  mean: z.number(),
  max: z.number(),
  min: z.number(),
  peakToPeak: z.number(),
  rmsAc: z.number(),
  /** The strongest multiple of the line frequency; null where there is no ripple or no whole line cycle. */
  rippleHertz: z.number().nullable(),
  /** Amplitudes at the line frequency and at twice it. */
  atLine: z.number(),
  atTwiceLine: z.number(),
  peaksPerCycle: z.number(),
  /** The first thousand of them; their means are over all. */
  peaks: z.array(waveformPeak),
  oddMean: z.number().nullable(),
  evenMean: z.number().nullable(),
  alternateDifference: z.number().nullable(),
  harmonics: z.array(z.object({ hertz: z.number(), amplitude: z.number() })),
});
export type WaveformAnalysis = z.infer<typeof waveformAnalysis>;

/** What a reading can be taken from. */
export const waveformValues = waveformAnalysis.pick({
  mean: true,
  min: true,
  peakToPeak: true,
  rmsAc: true,
  rippleHertz: true,
  oddMean: true,
  evenMean: true,
});
export type WaveformValues = z.infer<typeof waveformValues>;

export const waveformFinding = z.object({
  kind: z.enum(FINDING_KINDS),
  /** What is seen, with its figures. */
  evidence: z.string(),
  /** The likely cause. */
  cause: z.string(),
});
export type WaveformFinding = z.infer<typeof waveformFinding>;

/** What is kept of a waveform beside its file and its samples. */
export const waveformRecord = z.object({
  columns: z.array(z.string()),
  channel: z.string(),
  samples: z.int(),
  /** Instant of the first sample and the time between two, in seconds. */
  spacing: z.object({ start: z.number(), interval: z.number() }),
  /** Whether the file's samples were unevenly spaced: then these lie between its own, on straight lines. */
  interpolated: z.boolean(),
  analysis: waveformAnalysis,
  findings: z.array(waveformFinding),
  spectrum: z.object({ hertzPerBin: z.number(), amplitudes: z.array(z.number()) }),
  /** Peaks that a person moved, with who and when. */
  moved: z.object({ by: z.string(), at: moment }).nullable(),
});
export type WaveformRecord = z.infer<typeof waveformRecord>;

export const waveformHead = z.object({
  id: z.uuid(),
  lotId: id,
  unit: z.int(),
  characteristicKey: z.string().nullable(),
  fileName: z.string(),
  bytes: z.int(),
  sha256: z.string(),
  samples: z.int(),
  values: waveformValues,
  findings: z.array(waveformFinding),
  uploadedAt: moment,
  /** Null when a rack sent it. */
  uploadedBy: z.string().nullable(),
  rack: z.string().nullable(),
  withdrawn: z.object({ by: z.string(), at: moment, reason: z.string() }).nullable(),
  /** Readings that were taken from it. */
  readingIds: z.array(z.uuid()),
});
export type WaveformHead = z.infer<typeof waveformHead>;

export const waveform = waveformHead.extend({
  version,
  lot: z.object({ id, number: z.string(), atBench: z.boolean() }),
  part: z.object({ number: z.string(), name: z.string(), topology: z.string() }),
  record: waveformRecord,
});
export type Waveform = z.infer<typeof waveform>;

/** The largest file taken in: five million rows of thirty characters. */
export const LARGEST_WAVEFORM = 150_000_000;

export const listWaveforms = endpoint({
  method: 'GET',
  path: '/api/lots/:id/waveforms',
  who: READERS,
  summary: 'The waveforms of a lot, in the order of its units.',
  params: byId,
  reply: z.object({ items: z.array(waveformHead) }),
});
export const keepWaveform = endpoint({
  method: 'PUT',
  path: '/api/lots/:id/waveforms/:waveform',
  who: WRITERS,
  summary: 'Keep a waveform file (CSV) of a unit under an id made by the client; sending it twice changes nothing.',
  params: z.object({ id: z.coerce.number().int().positive(), waveform: z.uuid() }),
  query: z.object({
    fileName: line(200),
    unit: z.coerce.number().int().positive(),
    characteristicKey: z.string().max(32).optional(),
    /** Name of the column to take; the first after the time unless given. */
    channel: z.string().max(200).optional(),
  }),
  upload: LARGEST_WAVEFORM,
  reply: waveform,
});

const byWaveform = z.object({ waveform: z.uuid() });

export const readWaveform = endpoint({
  method: 'GET',
  path: '/api/waveforms/:waveform',
  who: READERS,
  summary: 'A waveform with what was computed and found.',
  params: byWaveform,
  reply: waveform,
});
export const readWaveformSamples = endpoint({
  method: 'GET',
  path: '/api/waveforms/:waveform/samples',
  who: READERS,
  summary: 'The samples: 32-bit floats in volts, little-endian, evenly spaced as the record says.',
  params: byWaveform,
  media: 'application/octet-stream',
  reply: storedFile,
});
export const readWaveformFile = endpoint({
  method: 'GET',
  path: '/api/waveforms/:waveform/file',
  who: READERS,
  summary: 'The file of a waveform as it was sent.',
  params: byWaveform,
  media: 'application/octet-stream',
  reply: storedFile,
});
export const moveWaveformPeaks = endpoint({
  method: 'PUT',
  path: '/api/waveforms/:waveform/peaks',
  who: WRITERS,
  summary: 'Put peaks where a person sees them; what is computed of them and found follows, and it goes on record.',
  params: byWaveform,
  body: z.object({ indices: z.array(z.int().min(0)).min(2, 'At least two peaks.').max(1000, 'At most 1 000 peaks.') }),
  versioned: true,
  reply: waveform,
});
export const withdrawWaveform = endpoint({
  method: 'POST',
  path: '/api/waveforms/:waveform/withdrawal',
  who: WRITERS,
  summary: 'Take a waveform back that no reading rests on, with a reason; it stays on record.',
  params: byWaveform,
  body: z.object({ reason }),
  versioned: true,
  reply: done,
});
