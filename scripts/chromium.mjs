// The browser tests drive Debian's chromium.
import { spawnSync } from 'node:child_process';
import { existsSync } from 'node:fs';

export const CHROMIUM = '/usr/bin/chromium';

/** Installs it with apt where it is missing; false, with words, where it cannot. */
export function chromiumWhenMissing() {
  if (existsSync(CHROMIUM)) return true;
  if (process.getuid?.() !== 0 || spawnSync('apt-get', ['--version'], { stdio: 'ignore' }).error) {
    console.error(
      `The browser tests need Debian's chromium at ${CHROMIUM}; it is missing and cannot be installed from here. ` +
        'As root on Debian: apt-get install chromium',
    );
    return false;
  }
  console.log('Installing chromium for the browser tests.');
  const options = { stdio: 'inherit', env: { ...process.env, DEBIAN_FRONTEND: 'noninteractive' } };
  spawnSync('apt-get', ['update', '-qq'], options);
  const { status } = spawnSync('apt-get', ['install', '-y', '-qq', '--no-install-recommends', 'chromium'], options);
  if (status === 0 && existsSync(CHROMIUM)) return true;
  console.error('apt could not install chromium; the browser tests cannot run. What apt said stands above.');
  return false;
}
