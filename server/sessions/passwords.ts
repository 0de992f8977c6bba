import { WorkerThread } from '#server/threads/worker-thread';
import bcrypt from 'bcryptjs';

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

/** What the thread is asked; it answers with the hash, or whether it matches. */
export type PasswordTask =
  { kind: 'hash'; password: string; cost: number } | { kind: 'matches'; password: string; hash: string };

/**
 * Hashes in a worker thread, so that a costly hash holds no other request up.
 *
 * @param workerUrl where the compiled password-worker lies
 */
export function workerPasswords(cost: number, workerUrl: URL): Passwords {
  const thread = new WorkerThread<PasswordTask, string | boolean>(workerUrl);
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
