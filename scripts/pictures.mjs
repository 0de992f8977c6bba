// Takes the README's pictures from the built program, on a demo of its own.
import { spawn } from 'node:child_process';
import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { chromium } from '@playwright/test';
import { CHROMIUM } from './chromium.mjs';

const PASSWORD = 'quiet-rail-demo-2026';

function started(data) {
  const env = { ...process.env, PORT: '0', QUIETRAIL_DATA: data };
  const child = spawn('node', ['dist/server/main.js'], { env, stdio: ['ignore', 'pipe', 'inherit'] });
  return new Promise((resolve) => {
    child.stdout.on('data', (chunk) => {
      const address = /Quietrail is at (\S+)/.exec(String(chunk))?.[1];
      if (address) resolve({ child, address });
    });
  });
}

async function pageOf(browser, address, who) {
  const context = await browser.newContext({
    baseURL: address,
    viewport: { width: 1440, height: 900 },
    reducedMotion: 'reduce',
  });
  const page = await context.newPage();
  await page.goto(`${address}/sign-in`);
  await page.getByLabel('E-mail').fill(`${who}@hollowmere.example`);
  await page.getByLabel('Password').fill(PASSWORD);
  await page.getByRole('button', { name: 'Sign in' }).click();
  await page.waitForURL((url) => !url.pathname.startsWith('/sign-in'));
  return page;
}

async function firstAt(page, station, wanted) {
  const answer = await page.request.get(`/api/lots?station=${station}`);
  const { items } = await answer.json();
  return items.find(wanted).id;
}

async function takeBench(page) {
  const id = await firstAt(page, 'bench', (lot) => lot.unitsJudged > 0 && !lot.stopped);
  await page.goto(`/bench/${id}`);
  const grid = page.getByRole('grid');
  await grid.locator('[tabindex="0"]').first().focus();
  for (let step = 0; step < 5; step += 1) await page.keyboard.press('ArrowRight');
  await page.keyboard.type('3.7');
  await page.keyboard.press('Tab');
  await page.keyboard.type('0.5');
  await page.waitForTimeout(500);
  await page.screenshot({ path: 'scripts/pictures/bench.png' });
}

async function takeRejected(page) {
  const id = await firstAt(page, 'on-hold', (lot) => lot.verdict === 'rejected');
  await page.goto(`/lots/${id}`);
  await page.getByText('REJECTED', { exact: true }).waitFor();
  await page.waitForTimeout(500);
  await page.screenshot({ path: 'scripts/pictures/rejected-lot.png' });
}

const data = mkdtempSync(path.join(tmpdir(), 'quietrail-pictures-'));
const { child, address } = await started(data);
const browser = await chromium.launch({ executablePath: CHROMIUM, args: ['--no-sandbox', '--disable-gpu'] });
await takeBench(await pageOf(browser, address, 'inspector'));
await takeRejected(await pageOf(browser, address, 'quality'));
await browser.close();
child.kill('SIGTERM');
await new Promise((resolve) => child.once('exit', resolve));
rmSync(data, { recursive: true, force: true });
