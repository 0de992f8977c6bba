import { chromium, type Browser } from '@playwright/test';
import { existsSync } from 'node:fs';
import { setTimeout } from 'node:timers/promises';
import { closeContext, contextOn, listen } from './bench-site';
import { type ReadingFile } from './reading-file';
import { type Line } from './report';

const CHROMIUM = '/usr/bin/chromium';
/** So long nothing came any more: the page is there. */
const QUIET = 1000;

/** Bytes that a browser with an empty cache receives for a page, heads included. */
async function bytesOf(browser: Browser, address: string, access?: string): Promise<number> {
  const context = await browser.newContext({ viewport: { width: 1440, height: 900 } });
  if (access !== undefined)
    await context.addCookies([{ name: 'qr_access', value: access, url: new URL(address).origin }]);
  const page = await context.newPage();
  const session = await context.newCDPSession(page);
  await session.send('Network.enable');
  let bytes = 0;
  let last = performance.now();
  session.on('Network.loadingFinished', ({ encodedDataLength }) => {
    bytes += encodedDataLength;
    last = performance.now();
  });
  await page.goto(address);
  while (performance.now() - last < QUIET) await setTimeout(100);
  await context.close();
  return bytes;
}

function lineOf(what: string, bytes: number, most: number): Line {
  return { what, measured: `${(bytes / 1000).toFixed(0)} kB`, bar: `<= ${most} kB`, holds: bytes <= most * 1000 };
}

/** The built application as it comes to an empty browser, from the program on a file with lots at the bench. */
export async function measureFirstPage({ file, access, lots }: ReadingFile): Promise<Line[]> {
  if (!existsSync(CHROMIUM)) return [{ what: 'first page', measured: `no ${CHROMIUM}`, bar: '<= 200 kB', holds: null }];
  const context = contextOn(file);
  const { port, close } = await listen(context);
  const address = `http://127.0.0.1:${port}`;
  const browser = await chromium.launch({ executablePath: CHROMIUM, args: ['--no-sandbox', '--disable-gpu'] });
  const signIn = await bytesOf(browser, `${address}/`);
  const bench = await bytesOf(browser, `${address}/bench/${lots[0]?.id ?? 0}`, access);
  await browser.close();
  close();
  closeContext(context);
  return [
    lineOf('first page, transferred to sign-in', signIn, 200),
    lineOf('  to the bench of a lot, signed in', bench, 350),
  ];
}
