import { WorkerThread } from '#server/threads/worker-thread';
import { WaveformNotUnderstood } from '#shared/waveform/waveform-not-understood';
import { type WavePeaks, type WaveRead, type WaveTask, workOnWave } from './wave-task';

type FileTask = Extract<WaveTask, { kind: 'file' }>;
type PeaksTask = Extract<WaveTask, { kind: 'peaks' }>;

/** Reads waveform files and computes what they give. */
export interface WaveReader {
  /** @throws {WaveformNotUnderstood} */
  read(task: FileTask): Promise<WaveRead>;
  withPeaks(task: PeaksTask): Promise<WavePeaks>;
  close(): Promise<void>;
}

function readerOf(work: (task: WaveTask) => Promise<WaveRead | WavePeaks>, close: () => Promise<void>): WaveReader {
  return {
    read: async (task) => (await work(task)) as WaveRead,
    withPeaks: async (task) => (await work(task)) as WavePeaks,
    close,
  };
}

/** Reads on the calling thread, where nothing else waits for it. */
export function inProcessWaves(): WaveReader {
  return readerOf(
    (task) => new Promise((resolve) => resolve(workOnWave(task))),
    () => Promise.resolve(),
  );
}

/**
 * Reads in a worker thread, so that a file of millions of samples holds no other request up.
 *
 * @param workerUrl where the compiled waveform-worker lies
 */
export function workerWaves(workerUrl: URL): WaveReader {
  const refusal = (message: string) => new WaveformNotUnderstood(message);
  const thread = new WorkerThread<WaveTask, WaveRead | WavePeaks, string>(workerUrl, refusal);
  return readerOf(
    (task) => thread.ask(task),
    () => thread.close(),
  );
}
