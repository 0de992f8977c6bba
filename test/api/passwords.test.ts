import { inProcessPasswords, type Passwords, unmatchableHash, workerPasswords } from '#server/sessions/passwords';
import { build } from 'esbuild';
import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { fileURLToPath, pathToFileURL } from 'node:url';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';

const PASSWORD = 'a plain long password';

async function holdsPasswords(passwords: Passwords): Promise<void> {
  const hash = await passwords.hash(PASSWORD);
  expect(hash).toMatch(/^\$2b\$04\$/);
  expect(await passwords.matches(PASSWORD, hash)).toBe(true);
  expect(await passwords.matches('a wrong long password', hash)).toBe(false);
}

describe('passwords', () => {
  let folder: string;
  let worker: URL;
  beforeAll(async () => {
    folder = mkdtempSync(path.join(tmpdir(), 'quietrail-'));
    const outfile = path.join(folder, 'password-worker.mjs');
    const source = fileURLToPath(new URL('../../server/sessions/password-worker.ts', import.meta.url));
    await build({ entryPoints: [source], outfile, bundle: true, platform: 'node', format: 'esm', logLevel: 'silent' });
    worker = pathToFileURL(outfile);
  });
  afterAll(() => rmSync(folder, { recursive: true }));

  it('are hashed and checked on the calling thread', async () => {
    await holdsPasswords(inProcessPasswords(4));
  });

  it('are hashed and checked in a worker, which goes on after it was closed', async () => {
    const passwords = workerPasswords(4, worker);
    await holdsPasswords(passwords);
    await passwords.close();
    await holdsPasswords(passwords);
    await passwords.close();
  });

  it('are answered each to its own question', async () => {
    const passwords = workerPasswords(4, worker);
    const words = ['one long password', 'two long passwords', 'three long passwords'];
    const hashes = await Promise.all(words.map((word) => passwords.hash(word)));
    const answers = await Promise.all(hashes.map((hash) => passwords.matches('two long passwords', hash)));
    expect(answers).toEqual([false, true, false]);
    await passwords.close();
  });

  it('are refused, not awaited for ever, when the worker fails', async () => {
    const missing = workerPasswords(4, new URL('missing.mjs', worker));
    await expect(missing.hash(PASSWORD)).rejects.toThrow();
    const passwords = workerPasswords(99, worker);
    const hash = passwords.hash(PASSWORD);
    await passwords.close();
    await expect(hash).rejects.toThrow('stopped');
  });

  it('match no hash that nobody has', async () => {
    const passwords = inProcessPasswords(4);
    expect(unmatchableHash(12)).toHaveLength(60);
    expect(await passwords.matches('', unmatchableHash(4))).toBe(false);
    expect(await passwords.matches(PASSWORD, unmatchableHash(4))).toBe(false);
  });
});
