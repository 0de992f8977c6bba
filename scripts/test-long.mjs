// npm run test:long: what takes too long for every run. Each parser is given 100 000 inputs.
import { spawnSync } from 'node:child_process';
import path from 'node:path';
import process from 'node:process';
import { fileURLToPath } from 'node:url';
import { installWhenNeeded } from './install.mjs';

process.chdir(path.join(path.dirname(fileURLToPath(import.meta.url)), '..'));
installWhenNeeded();
const files = ['test/domain/quantity-fuzz.test.ts', 'test/domain/waveform-fuzz.test.ts'];
const command = ['node_modules/vitest/vitest.mjs', 'run', '--config', 'test/vitest.config.ts', ...files];
const env = { ...process.env, FUZZ_RUNS: '100000' };
const { status } = spawnSync('node', [...command, '--testTimeout', '900000'], { stdio: 'inherit', env });
process.exit(status ?? 1);
