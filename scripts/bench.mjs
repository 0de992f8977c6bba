// npm run bench: how fast the program is, as one table. It is bundled as the program itself is, so that the same code is timed.
import path from 'node:path';
import { fileURLToPath, pathToFileURL } from 'node:url';

process.chdir(path.join(path.dirname(fileURLToPath(import.meta.url)), '..'));
const { installWhenNeeded } = await import('./install.mjs');
installWhenNeeded();
const { buildWhenNeeded, serverBuild } = await import('./building.mjs');
await buildWhenNeeded();
const { build } = await import('esbuild');
await build({
  ...serverBuild,
  entryPoints: { bench: 'test/bench/bench.ts', 'reading-server': 'test/bench/reading-server.ts' },
  outdir: 'dist/bench',
});
await import(pathToFileURL('dist/bench/bench.js').href);
