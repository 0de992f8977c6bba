// Type-checks every part of the project with its own settings.
import { spawnSync } from 'node:child_process';

const checks = [
  ['server, database and shared core', ['node_modules/typescript/bin/tsc', '-p', 'server/tsconfig.json']],
  ['tests', ['node_modules/typescript/bin/tsc', '-p', 'test/tsconfig.json']],
  [
    'application',
    ['node_modules/@angular/compiler-cli/bundles/src/bin/ngc.js', '-p', 'src/tsconfig.app.json', '--noEmit'],
  ],
];
let failed = false;
for (const [name, command] of checks) {
  const { status } = spawnSync('node', command, { stdio: 'inherit' });
  console.log(`Types of ${name}: ${status === 0 ? 'agree' : 'do not agree'}`);
  failed ||= status !== 0;
}
process.exit(failed ? 1 : 0);
