import { expect, type Page } from '@playwright/test';

/** How long nothing may be asked of the server before a page counts as shown, in milliseconds. */
const QUIET = 120;

/** Watches what a page asks of the server; the answer waits until it has all arrived. The stream of counts never ends. */
export function settling(page: Page): () => Promise<void> {
  const open = new Set<unknown>();
  let last = Date.now();
  page.on('request', (request) => {
    if (request.url().endsWith('/api/events')) return;
    open.add(request);
    last = Date.now();
  });
  const forget = (request: unknown) => {
    open.delete(request);
    last = Date.now();
  };
  page.on('requestfinished', forget);
  page.on('requestfailed', forget);
  return () =>
    expect
      .poll(() => open.size === 0 && Date.now() - last > QUIET, { intervals: [40], message: 'the page is shown' })
      .toBe(true);
}
