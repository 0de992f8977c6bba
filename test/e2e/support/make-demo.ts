import { rmSync } from 'node:fs';
import process from 'node:process';

/** Makes the demo once; every worker starts from a copy of it. */
export default async function makeDemo(): Promise<() => void> {
  process.env['QUIETRAIL_TEST_RUN'] = String(process.pid);
  const { DEMO_FOLDER } = await import('./demo-folder');
  const { startServer } = await import('./server-process');
  rmSync(DEMO_FOLDER, { recursive: true, force: true });
  const server = await startServer(DEMO_FOLDER);
  await server.stop();
  return () => {
    rmSync(DEMO_FOLDER, { recursive: true, force: true });
  };
}
