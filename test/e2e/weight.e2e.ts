import { type Page } from '@playwright/test';
import { demoPlaces } from './support/demo-places';
import { settling } from './support/settling';
import { expect, signIn, test } from './support/site';

/** Counts the bytes on the wire, headers included, of everything that a page loads from now on. */
async function weighing(page: Page): Promise<() => number> {
  let bytes = 0;
  const network = await page.context().newCDPSession(page);
  network.on('Network.loadingFinished', ({ encodedDataLength }) => {
    bytes += encodedDataLength;
  });
  await network.send('Network.enable');
  return () => bytes;
}

test('the sign-in page transfers at most 200 kB, the way from there to a bench at most 350 kB', async ({
  browser,
  server,
  api,
}) => {
  const placeOf = await demoPlaces(await api('quality'));
  const context = await browser.newContext();
  const page = await context.newPage();
  const weight = await weighing(page);
  const shown = settling(page);
  await page.goto(`${server.address}/sign-in`);
  await shown();
  const first = weight();
  await signIn(page, server.address, 'inspector');
  await page.goto(server.address + placeOf('/bench/{measuring}'));
  await expect(page.getByRole('grid')).toBeVisible();
  await shown();
  const further = weight() - first;
  await context.close();
  expect(first).toBeGreaterThan(50_000);
  expect(first).toBeLessThanOrEqual(200_000);
  expect(further).toBeGreaterThan(50_000);
  expect(further).toBeLessThanOrEqual(350_000);
});
