import bcrypt from 'bcryptjs';
import { parentPort } from 'node:worker_threads';
import { type PasswordAnswer, type PasswordTask } from './passwords';

function answer(task: PasswordTask): PasswordAnswer {
  try {
    const result =
      task.kind === 'hash' ? bcrypt.hashSync(task.password, task.cost) : bcrypt.compareSync(task.password, task.hash);
    return { id: task.id, result };
  } catch (error) {
    return { id: task.id, failure: error instanceof Error ? error.message : String(error) };
  }
}

parentPort?.on('message', (task: PasswordTask) => parentPort?.postMessage(answer(task)));
