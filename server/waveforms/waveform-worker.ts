import { type Answer, type Question } from '#server/threads/worker-thread';
import { WaveformNotUnderstood } from '#shared/waveform/waveform-not-understood';
import { parentPort } from 'node:worker_threads';
import { type WavePeaks, type WaveRead, type WaveTask, workOnWave } from './wave-task';

function answer({ id, task }: Question<WaveTask>): Answer<WaveRead | WavePeaks, string> {
  try {
    return { id, result: workOnWave(task) };
  } catch (error) {
    if (error instanceof WaveformNotUnderstood) return { id, refused: error.message };
    return { id, failure: error instanceof Error ? error.message : String(error) };
  }
}

parentPort?.on('message', (question: Question<WaveTask>) => parentPort?.postMessage(answer(question)));
