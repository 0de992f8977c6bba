import { DEMO_PASSWORD } from '#db/demo/sign-ins';
import { test as base, expect, type APIRequestContext, type Page } from '@playwright/test';
import { rmSync } from 'node:fs';
import { demoCopy } from './demo-folder';
import { startServer, type ServerProcess } from './server-process';

/** Signs in on the sign-in page, as a person does. */
export async function signIn(page: Page, address: string, who: string): Promise<void> {
  await page.goto(`${address}/sign-in`);
  await page.getByLabel('E-mail').fill(`${who}@hollowmere.example`);
  await page.getByLabel('Password').fill(DEMO_PASSWORD);
  await page.getByRole('button', { name: 'Sign in' }).click();
  await page.waitForURL((url) => !url.pathname.startsWith('/sign-in'));
}

interface WorkerFixtures {
  server: ServerProcess;
}
interface TestFixtures {
  /** A page whose console errors fail the test. */
  page: Page;
  /** A page of a signed-in person, in a browser context of its own. */
  pageOf: (who: string) => Promise<Page>;
  /** Calls of the interface as a person, to make data. */
  api: (who: string) => Promise<APIRequestContext>;
}

/**
 * What the browser reports although nothing is wrong: a letter's sandboxed frame refuses the scripts of the test driver, and
 * a refusal that a test asks for (422) is no failure of the page.
 */
const EXPECTED = /^Blocked script execution in 'about:(srcdoc|blank)'|^Failed to load resource: .* 422 /;

function failOnConsoleErrors(page: Page, errors: string[]): void {
  page.on('console', (message) => {
    if (message.type() === 'error' && !EXPECTED.test(message.text())) errors.push(message.text());
  });
  page.on('pageerror', (error) => errors.push(String(error)));
}

/** Tests on the demo, each worker with a program and a data folder of its own. */
export const test = base.extend<TestFixtures, WorkerFixtures>({
  server: [
    // Playwright wants the first argument destructured.
    // eslint-disable-next-line no-empty-pattern
    async ({}, use) => {
      const folder = demoCopy();
      const server = await startServer(folder);
      await use(server);
      await server.stop();
      rmSync(folder, { recursive: true, force: true });
    },
    { scope: 'worker' },
  ],
  baseURL: async ({ server }, use) => {
    await use(server.address);
  },
  pageOf: async ({ browser, server }, use) => {
    const errors: string[] = [];
    const contexts: { close(): Promise<void> }[] = [];
    await use(async (who) => {
      const context = await browser.newContext({ viewport: { width: 1440, height: 900 }, reducedMotion: 'reduce' });
      contexts.push(context);
      const page = await context.newPage();
      failOnConsoleErrors(page, errors);
      await signIn(page, server.address, who);
      return page;
    });
    for (const context of contexts) await context.close();
    expect(errors, 'errors in the console').toEqual([]);
  },
  api: async ({ playwright, server }, use) => {
    const made: APIRequestContext[] = [];
    await use(async (who) => {
      const context = await playwright.request.newContext({ baseURL: server.address });
      made.push(context);
      const answer = await context.post('/api/session', {
        data: { email: `${who}@hollowmere.example`, password: DEMO_PASSWORD },
      });
      expect(answer.status()).toBe(200);
      return context;
    });
    for (const context of made) await context.dispose();
  },
});

export { expect };
