// npm run dev: the server restarts and the page reloads when their sources change.
import { spawn } from 'node:child_process';
import { installWhenNeeded } from './install.mjs';
import { serverBuild } from './building.mjs';

installWhenNeeded();
const { context } = await import('esbuild');
const watching = await context(serverBuild);
await watching.rebuild();
await watching.watch();
const env = { ...process.env, PORT: '3000' };
const children = [
  spawn('node', ['--watch', '--watch-preserve-output', 'dist/server/main.js'], { stdio: 'inherit', env }),
  spawn('node', ['node_modules/@angular/cli/bin/ng.js', 'serve'], { stdio: 'inherit' }),
];

async function stop() {
  for (const child of children) child.kill('SIGTERM');
  await watching.dispose();
}
process.on('SIGTERM', stop);
process.on('SIGINT', stop);
