// Builds the application and the server into dist/ when their sources changed since the last build.
import { spawnSync } from 'node:child_process';
import { createHash } from 'node:crypto';
import { existsSync, mkdirSync, readdirSync, readFileSync, statSync, writeFileSync } from 'node:fs';
import path from 'node:path';
import process from 'node:process';
import { compressFolder } from './compressing.mjs';

const sources = {
  app: ['src', 'shared', 'public', 'angular.json', 'package-lock.json', 'tsconfig.json'],
  server: ['server', 'shared', 'db', 'package-lock.json', 'tsconfig.json'],
};

function filesUnder(place) {
  if (!statSync(place).isDirectory()) return [place];
  return readdirSync(place)
    .sort()
    .flatMap((name) => filesUnder(path.join(place, name)));
}

function hashOf(places) {
  const hash = createHash('sha256');
  for (const file of places.filter((place) => existsSync(place)).flatMap(filesUnder)) {
    hash.update(file);
    hash.update(readFileSync(file));
  }
  return hash.digest('hex');
}

function builtFrom(part) {
  const stamp = `dist/.${part}-built-from`;
  return existsSync(stamp) ? readFileSync(stamp, 'utf8') : '';
}

/** What esbuild makes of the server: one file, and one for each thread beside it. Packages stay outside. */
export const serverBuild = {
  entryPoints: {
    main: 'server/main.ts',
    'password-worker': 'server/sessions/password-worker.ts',
    'waveform-worker': 'server/waveforms/waveform-worker.ts',
  },
  outdir: 'dist/server',
  bundle: true,
  platform: 'node',
  format: 'esm',
  target: 'node20',
  packages: 'external',
  sourcemap: true,
  logLevel: 'warning',
};

async function buildServer() {
  const { build } = await import('esbuild');
  await build(serverBuild);
}

async function buildApp() {
  // The many small files that lazy pages share are merged: a browser asks for far fewer of them.
  const env = { ...process.env, NG_BUILD_OPTIMIZE_CHUNKS: '1' };
  const { status } = spawnSync('node', ['node_modules/@angular/cli/bin/ng.js', 'build'], { stdio: 'inherit', env });
  if (status !== 0) throw new Error('The application could not be built.');
  await compressFolder('dist/app');
}

async function buildPart(part, build) {
  const wanted = hashOf(sources[part]);
  if (builtFrom(part) === wanted) return;
  console.log(`Building the ${part}.`);
  await build();
  mkdirSync('dist', { recursive: true });
  writeFileSync(`dist/.${part}-built-from`, wanted);
}

export async function buildWhenNeeded() {
  await buildPart('app', buildApp);
  await buildPart('server', buildServer);
}
