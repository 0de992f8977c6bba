import { spawn, type ChildProcess } from 'node:child_process';
import { fileURLToPath } from 'node:url';

const root = fileURLToPath(new URL('../../..', import.meta.url));

/** The built program, running on a data folder of its own. */
export interface ServerProcess {
  address: string;
  /** SIGTERM, and the wait until it has stopped; the exit code is the program's own. */
  stop(): Promise<number | null>;
  /** SIGKILL: what a power cut looks like to the program. */
  kill(): Promise<void>;
}

function ended(child: ChildProcess): Promise<number | null> {
  return new Promise((resolve) => child.once('exit', (code) => resolve(code)));
}

/** Starts the built program and waits until it says where it is. */
export function startServer(dataFolder: string, port = 0): Promise<ServerProcess> {
  const child = spawn('node', ['dist/server/main.js'], {
    cwd: root,
    env: {
      ...process.env,
      PORT: String(port),
      QUIETRAIL_DATA: dataFolder,
      PASSWORD_COST: '4',
      SIGN_IN_ATTEMPTS: '100',
    },
    stdio: ['ignore', 'pipe', 'inherit'],
  });
  const exit = ended(child);
  return new Promise((resolve, reject) => {
    let said = '';
    child.stdout.on('data', (chunk: Buffer) => {
      said += chunk.toString();
      const address = /Quietrail is at (http:\S+)/.exec(said)?.[1];
      if (address === undefined) return;
      resolve({
        address,
        stop: () => {
          child.kill('SIGTERM');
          return exit;
        },
        kill: async () => {
          child.kill('SIGKILL');
          await exit;
        },
      });
    });
    void exit.then((code) => {
      reject(new Error(`The program ended with ${code} before it listened: ${said}`));
    });
  });
}
