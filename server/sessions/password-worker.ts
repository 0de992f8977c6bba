import { type Answer, type Question } from '#server/threads/worker-thread';
import bcrypt from 'bcryptjs';
import { parentPort } from 'node:worker_threads';
import { type PasswordTask } from './passwords';

function answer({ id, task }: Question<PasswordTask>): Answer<string | boolean, never> {
  try {
    const result =
      task.kind === 'hash' ? bcrypt.hashSync(task.password, task.cost) : bcrypt.compareSync(task.password, task.hash);
    return { id, result };
  } catch (error) {
    return { id, failure: error instanceof Error ? error.message : String(error) };
  }
}

parentPort?.on('message', (question: Question<PasswordTask>) => parentPort?.postMessage(answer(question)));
