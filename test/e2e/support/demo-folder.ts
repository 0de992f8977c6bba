import { cpSync, mkdtempSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';

/** Where the demo is made once for all browser tests of a run. */
export const DEMO_FOLDER = path.join(tmpdir(), `quietrail-demo-${process.env['QUIETRAIL_TEST_RUN'] ?? 'x'}`);

/** A copy of the demo in a folder of its own. */
export function demoCopy(): string {
  const folder = mkdtempSync(path.join(tmpdir(), 'quietrail-'));
  cpSync(DEMO_FOLDER, folder, { recursive: true });
  return folder;
}
