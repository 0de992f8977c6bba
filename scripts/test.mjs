// npm test: everything that must hold. Each check and each test counts; the last line says how many passed and failed.
import { spawnSync } from 'node:child_process';
import { existsSync, mkdirSync, readFileSync, rmSync } from 'node:fs';
import path from 'node:path';
import { fileURLToPath } from 'node:url';
import { installWhenNeeded } from './install.mjs';
import { chromiumWhenMissing } from './chromium.mjs';

process.chdir(path.join(path.dirname(fileURLToPath(import.meta.url)), '..'));
installWhenNeeded();
rmSync('test-results', { recursive: true, force: true });
mkdirSync('test-results', { recursive: true });

let passed = 0;
let failed = 0;
const failures = [];

function count(ok, name) {
  if (ok) passed += 1;
  else {
    failed += 1;
    failures.push(name);
  }
}

function run(command, args, env = {}) {
  return spawnSync(command, args, { stdio: 'inherit', env: { ...process.env, ...env } }).status === 0;
}

/** A check that holds or does not. */
function check(name, command, args) {
  console.log(`\n== ${name}`);
  const ok = run(command, args);
  count(ok, name);
  return ok;
}

/** Test runs whose report is the JSON of vitest. */
function vitest(name, report, command, args) {
  console.log(`\n== ${name}`);
  const ok = run(command, args);
  if (!existsSync(report)) {
    count(false, `${name}: no report was written`);
    return;
  }
  const results = JSON.parse(readFileSync(report, 'utf8'));
  for (const file of results.testResults) {
    if (file.assertionResults.length === 0)
      count(file.status === 'passed', `${name}: ${file.name} ${file.message ?? ''}`);
    for (const test of file.assertionResults) {
      count(test.status === 'passed', `${name}: ${test.fullName}`);
      if (test.status !== 'passed') console.error(`${test.fullName}\n${test.failureMessages.join('\n')}`);
    }
  }
  if (!ok && results.numFailedTests === 0) count(false, `${name}: the run failed although no test did`);
}

function browserTests(name, report) {
  console.log(`\n== ${name}`);
  if (!chromiumWhenMissing()) {
    count(false, `${name}: no chromium`);
    return;
  }
  run('node', ['node_modules/@playwright/test/cli.js', 'test', '--config', 'test/playwright.config.ts']);
  if (!existsSync(report)) {
    count(false, `${name}: no report was written`);
    return;
  }
  const results = JSON.parse(readFileSync(report, 'utf8'));
  const walk = (suite) => {
    for (const spec of suite.specs ?? []) count(spec.ok, `${name}: ${spec.title}`);
    for (const inner of suite.suites ?? []) walk(inner);
  };
  results.suites.forEach(walk);
  for (const error of results.errors ?? []) count(false, `${name}: ${error.message}`);
}

const bin = (file) => `node_modules/${file}`;
check('formatting', 'node', [bin('prettier/bin/prettier.cjs'), '--check', '--log-level', 'warn', '.']);
check('lint', 'node', [bin('eslint/bin/eslint.js'), '.', '--max-warnings', '0']);
check('types', 'node', ['scripts/types.mjs']);
vitest('rules, reference values and interface', 'test-results/vitest.json', 'node', [
  bin('vitest/vitest.mjs'),
  'run',
  '--config',
  'test/vitest.config.ts',
  '--reporter=default',
  '--reporter=json',
  '--outputFile.json=test-results/vitest.json',
]);
vitest('components', 'test-results/components.json', 'node', [
  bin('@angular/cli/bin/ng.js'),
  'test',
  '--watch=false',
  '--reporters=json',
  '--output-file=test-results/components.json',
]);
if (check('build', 'node', ['scripts/build.mjs'])) browserTests('browser', 'test-results/browser.json');

if (failures.length > 0) console.log(`\nFailed:\n${failures.map((name) => `  ${name}`).join('\n')}`);
console.log(`${passed} passed, ${failed} failed`);
process.exit(failed > 0 ? 1 : 0);
