import bcrypt from 'bcryptjs';
import { Worker } from 'node:worker_threads';

/** Makes and checks the hashes of passwords (bcrypt). */
export interface Passwords {
  hash(password: string): Promise<string>;
  matches(password: string, hash: string): Promise<boolean>;
  close(): Promise<void>;
}

/** Hashes on the calling thread: for low costs, where a worker would be slower than the work. */
export function inProcessPasswords(cost: number): Passwords {
  return {
    hash: (password) => bcrypt.hash(password, cost),
    matches: (password, hash) => bcrypt.compare(password, hash),
    close: () => Promise.resolve(),
  };
}

/** What the worker is asked; it answers with the hash, or whether it matches. */
export type PasswordTask =
  | { id: number; kind: 'hash'; password: string; cost: number }
  | { id: number; kind: 'matches'; password: string; hash: string };
export type PasswordAnswer = { id: number; result: string | boolean } | { id: number; failure: string };
type Asked = { kind: 'hash'; password: string; cost: number } | { kind: 'matches'; password: string; hash: string };

interface Waiting {
  resolve(result: string | boolean): void;
  reject(error: Error): void;
}

/** A worker thread with the questions it has not answered yet; it is started when it is first needed. */
class PasswordThread {
  private worker: Worker | undefined;
  private readonly waiting = new Map<number, Waiting>();
  private asked = 0;

  constructor(private readonly url: URL) {}

  ask(task: Asked): Promise<string | boolean> {
    const id = ++this.asked;
    return new Promise((resolve, reject) => {
      this.waiting.set(id, { resolve, reject });
      this.running().postMessage({ ...task, id } satisfies PasswordTask);
    });
  }

  async close(): Promise<void> {
    await this.worker?.terminate();
  }

  private running(): Worker {
    if (this.worker) return this.worker;
    const worker = new Worker(this.url);
    worker.on('message', (answer: PasswordAnswer) => this.settle(answer));
    worker.on('error', (error) => this.stop(worker, error));
    worker.on('exit', () => this.stop(worker, new Error('The password thread has stopped.')));
    this.worker = worker;
    return worker;
  }

  private settle(answer: PasswordAnswer): void {
    const waiting = this.waiting.get(answer.id);
    this.waiting.delete(answer.id);
    if ('failure' in answer) waiting?.reject(new Error(answer.failure));
    else waiting?.resolve(answer.result);
  }

  private stop(worker: Worker, error: Error): void {
    // A worker that failed says so twice, the second time when its successor may already be at work.
    if (worker !== this.worker) return;
    this.worker = undefined;
    for (const waiting of this.waiting.values()) waiting.reject(error);
    this.waiting.clear();
  }
}

/**
 * Hashes in a worker thread, so that a costly hash holds no other request up.
 *
 * @param workerUrl where the compiled password-worker lies
 */
export function workerPasswords(cost: number, workerUrl: URL): Passwords {
  const thread = new PasswordThread(workerUrl);
  return {
    hash: async (password) => String(await thread.ask({ kind: 'hash', password, cost })),
    matches: async (password, hash) => (await thread.ask({ kind: 'matches', password, hash })) === true,
    close: () => thread.close(),
  };
}

/** A well-formed hash that no password has; comparing with it takes as long as comparing with a real one. */
export function unmatchableHash(cost: number): string {
  return `$2b$${String(cost).padStart(2, '0')}$${'.'.repeat(53)}`;
}
