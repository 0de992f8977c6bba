// Installs the packages when the lock file is not the one they were installed from.
import { spawnSync } from 'node:child_process';
import { createHash } from 'node:crypto';
import { existsSync, readFileSync, writeFileSync } from 'node:fs';

const stamp = 'node_modules/.installed-from';

function lockHash() {
  return createHash('sha256').update(readFileSync('package-lock.json')).digest('hex');
}

function missingTools() {
  return ['make', 'g++', 'python3'].filter((tool) => spawnSync(tool, ['--version'], { stdio: 'ignore' }).error);
}

/** Ends the program with words when Node is too old or the packages cannot be installed. */
export function installWhenNeeded() {
  const [major, minor] = process.versions.node.split('.').map(Number);
  if (major < 20 || (major === 20 && minor < 19)) {
    console.error(`Quietrail needs Node.js 20.19 or newer; this is ${process.versions.node}.`);
    process.exit(1);
  }
  const wanted = lockHash();
  if (existsSync(stamp) && readFileSync(stamp, 'utf8') === wanted) return;
  const missing = missingTools();
  if (missing.length > 0)
    console.error(
      `The database driver is compiled during the installation and needs ${missing.join(', ')}, which this machine lacks. ` +
        'On Debian: apt-get install make g++ python3',
    );
  console.log('Installing the packages; the database driver is compiled, which takes some minutes the first time.');
  const { status } = spawnSync('npm', ['ci', '--include=dev', '--no-audit', '--no-fund'], { stdio: 'inherit' });
  if (status !== 0) {
    console.error('The packages could not be installed; npm says why above.');
    process.exit(status ?? 1);
  }
  writeFileSync(stamp, wanted);
}
