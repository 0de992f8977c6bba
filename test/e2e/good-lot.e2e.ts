import { DEMO_PASSWORD } from '#db/demo/sign-ins';
import { type Page } from '@playwright/test';
import { goToCharacteristic, typeColumn } from './support/measuring';
import { ADAPTER_PLAN, plannedPart } from './support/planned-part';
import { expect, test } from './support/site';

async function bookLotIn(page: Page, part: string): Promise<string> {
  await page.keyboard.press('r');
  const form = page.getByRole('main');
  await form.getByLabel('Part').click();
  await page.getByRole('option', { name: new RegExp(`^${part},`) }).click();
  await form.getByLabel('Supplier').click();
  await page.getByRole('option', { name: 'Omdal Vik Supply' }).click();
  await form.getByLabel('Delivery number').fill('D-9001');
  await form.getByLabel('Order').fill('PO-9001');
  await form.getByLabel('Counted').fill('1200');
  await form.getByLabel('Stated on the delivery note').fill('1200');
  await form.getByLabel('Cartons').fill('12');
  const preview = form.getByRole('complementary');
  await expect(preview).toContainText('Normal');
  await expect(preview).toContainText('II, J');
  await expect(preview.getByRole('row', { name: /Major/ })).toContainText(/1\.0\s*80\s*2\s*3/);
  await form.getByRole('button', { name: 'Book lot in' }).click();
  const number = await form
    .getByText(/L-\d\d-\d{4}/)
    .first()
    .textContent();
  return /L-\d\d-\d{4}/.exec(number ?? '')?.[0] ?? '';
}

const UNITS = 80;

test('a good lot: booked in, drawn, measured with the keyboard alone, signed, certified', async ({ pageOf, api }) => {
  test.setTimeout(240_000);
  const part = await plannedPart(await api('quality'), await api('quality2'), ADAPTER_PLAN);
  const receiving = await pageOf('receiving');
  await receiving.goto('/arrivals');
  await expect(receiving.getByRole('heading', { name: 'Arrivals' })).toBeVisible();
  const number = await bookLotIn(receiving, part.number);
  expect(number).toMatch(/^L-\d\d-\d{4}$/);

  const inspector = await pageOf('inspector');
  await inspector.goto('/arrivals');
  await inspector.getByText(number).click();
  await expect(inspector.getByRole('complementary', { name: 'Chosen lot' })).toContainText(number);
  await inspector.keyboard.press('Enter');
  const draw = inspector.getByRole('dialog');
  await expect(draw).toContainText('80 of 1\u202f200 units');
  await draw.getByRole('button', { name: 'Draw sample' }).click();
  await inspector.getByRole('link', { name: 'To the bench' }).click();

  await goToCharacteristic(inspector, 0);
  for (let unit = 1; unit <= UNITS; unit += 1) await inspector.keyboard.press('p');
  await goToCharacteristic(inspector, 1);
  await inspector.getByRole('combobox', { name: 'Multimeter' }).focus();
  await inspector.keyboard.press('Enter');
  await expect(inspector.getByRole('option', { name: /DM-11/ })).toBeVisible();
  await inspector.keyboard.press('Enter');
  await goToCharacteristic(inspector, 1);
  await typeColumn(inspector, (unit) => (14.7 + (unit % 5) / 100).toFixed(2), { from: 1, to: UNITS });
  await goToCharacteristic(inspector, 2);
  await typeColumn(inspector, (unit) => (12.1 + (unit % 7) / 100).toFixed(2), { from: 1, to: UNITS });
  await goToCharacteristic(inspector, 3);
  // Wave height in divisions; the scale is typed once and remembered, the probe is x 1.
  await inspector.keyboard.type('3.7');
  await inspector.keyboard.press('Tab');
  await inspector.keyboard.type('0.5');
  await expect(inspector.locator('output').getByText('1.85')).toBeVisible();
  await inspector.keyboard.press('Enter');
  await typeColumn(inspector, (unit) => (3.4 + (unit % 4) / 10).toFixed(1), { from: 2, to: UNITS });

  await expect(inspector.getByText('80 of 80 judged')).toBeVisible();
  await inspector.getByRole('button', { name: 'Submit' }).click();
  await inspector
    .getByRole('dialog')
    .getByRole('button', { name: /Submit/ })
    .click();
  await inspector.waitForURL(/\/lots\/\d+$/);

  const quality = await pageOf('quality');
  await quality.goto('/decision');
  await quality.getByRole('link', { name: number }).click();
  await expect(quality.getByText('ACCEPTED', { exact: true })).toBeVisible();
  await quality.getByRole('button', { name: 'Release lot' }).click();
  const signing = quality.getByRole('dialog');
  await signing.getByLabel('Your password').fill('not my password');
  await signing.getByRole('button', { name: 'Release' }).click();
  await expect(signing.getByText('This is not your password.')).toBeVisible();
  await signing.getByLabel('Your password').fill(DEMO_PASSWORD);
  await signing.getByRole('button', { name: 'Release' }).click();

  const certificate = quality.getByRole('link', { name: /CC-\d\d-\d{4}/ });
  await expect(certificate).toBeVisible();
  await certificate.click();
  const href = await quality.getByRole('link', { name: /Open PDF/ }).getAttribute('href');
  const file = await quality.request.get(href ?? '');
  expect(file.headers()['content-type']).toContain('application/pdf');
  const bytes = await file.body();
  expect(bytes.subarray(0, 5).toString()).toBe('%PDF-');
  expect(bytes.toString('latin1')).toContain('/StructTreeRoot');
});
