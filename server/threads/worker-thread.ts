import { Worker } from 'node:worker_threads';

/** What a thread is asked, and what it answers: a result, or why there is none. */
export interface Question<Task> {
  id: number;
  task: Task;
}
export type Answer<Result, Failure> =
  { id: number; result: Result } | { id: number; refused: Failure } | { id: number; failure: string };

interface Waiting<Result> {
  resolve(result: Result): void;
  reject(error: unknown): void;
}

/**
 * A worker thread with the questions it has not answered yet; it is started when it is first needed, and anew after it
 * failed.
 *
 * @param refusal makes the error of a task that the thread refuses, out of what it says of it
 */
export class WorkerThread<Task, Result, Failure = never> {
  private worker: Worker | undefined;
  private readonly waiting = new Map<number, Waiting<Result>>();
  private asked = 0;

  constructor(
    private readonly url: URL,
    private readonly refusal: (failure: Failure) => Error = () => new Error('The thread refused its task.'),
  ) {}

  ask(task: Task): Promise<Result> {
    const id = ++this.asked;
    return new Promise((resolve, reject) => {
      this.waiting.set(id, { resolve, reject });
      this.running().postMessage({ id, task } satisfies Question<Task>);
    });
  }

  async close(): Promise<void> {
    await this.worker?.terminate();
  }

  private running(): Worker {
    if (this.worker) return this.worker;
    const worker = new Worker(this.url);
    worker.on('message', (answer: Answer<Result, Failure>) => this.settle(answer));
    worker.on('error', (error) => this.stop(worker, error));
    worker.on('exit', () => this.stop(worker, new Error('The thread has stopped.')));
    this.worker = worker;
    return worker;
  }

  private settle(answer: Answer<Result, Failure>): void {
    const waiting = this.waiting.get(answer.id);
    this.waiting.delete(answer.id);
    if ('failure' in answer) waiting?.reject(new Error(answer.failure));
    else if ('refused' in answer) waiting?.reject(this.refusal(answer.refused));
    else waiting?.resolve(answer.result);
  }

  private stop(worker: Worker, error: unknown): void {
    // A worker that failed says so twice, the second time when its successor may already be at work.
    if (worker !== this.worker) return;
    this.worker = undefined;
    for (const waiting of this.waiting.values()) waiting.reject(error);
    this.waiting.clear();
  }
}
