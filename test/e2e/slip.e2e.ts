import { type Page } from '@playwright/test';
import { lotAtBench } from './support/lot-at-bench';
import { goToCharacteristic } from './support/measuring';
import { ADAPTER_PLAN, plannedPart } from './support/planned-part';
import { expect, test } from './support/site';

/** Ripple is the fourth characteristic of the adapter's plan. */
const RIPPLE = 3;

/** Types a scope reading into the panel: the height in the grid, the settings in their fields. */
async function typeScope(page: Page, height: string, voltsPerDivision: string): Promise<void> {
  await page.keyboard.type(height);
  const panel = page.getByRole('region', { name: 'Reading' });
  await panel.getByLabel('Scale').fill(voltsPerDivision);
  await panel.getByLabel('Probe').fill('1');
  await panel.getByLabel('Wave height').press('Enter');
}

test('a slip: a reading ten times off is questioned, corrected or confirmed, and both are on record', async ({
  pageOf,
  api,
}) => {
  const part = await plannedPart(await api('quality'), await api('quality2'), ADAPTER_PLAN);
  const lot = await lotAtBench(await api('receiving'), await api('inspector'), { partId: part.id, quantity: 1200 });

  const inspector = await pageOf('inspector');
  await inspector.goto(`/bench/${lot.id}`);
  await expect(inspector.getByRole('grid')).toBeVisible();
  await goToCharacteristic(inspector, RIPPLE);
  const panel = inspector.getByRole('region', { name: 'Reading' });

  // Five volts per division instead of half a volt: the reading is ten times what the rectifier gives.
  await typeScope(inspector, '3.2', '5');
  const question = panel.getByRole('group', { name: /more than what this part can give/ });
  await expect(question).toContainText(/1\.18 to 1\.98\sV\sp-p/);
  await expect(question).toContainText('ten times less would fit');
  await inspector.keyboard.press('F2');
  await expect(panel.getByLabel('Scale')).toHaveValue('0.5');
  await expect(panel).toContainText(/Corrected from 16\.00\sV\sp-p/);
  await inspector.keyboard.press('Enter');
  await expect(panel.getByRole('heading', { name: /^Unit 2/ })).toBeVisible();

  // The same again on the next unit, which is faulty: kept with a reason of the list.
  await typeScope(inspector, '3.3', '5');
  await expect(question).toBeVisible();
  await expect(question).toContainText(/Nonconforming: Ripple 16\.50\sV\sp-p/);
  await expect(async () => {
    await inspector.keyboard.press('2');
    await expect(question.getByRole('radio', { name: 'The unit is faulty' })).toBeChecked({ timeout: 200 });
  }).toPass();
  await inspector.keyboard.press('Enter');
  await expect(panel.getByRole('heading', { name: /^Unit 3/ })).toBeVisible();
  await expect(inspector.getByRole('status').filter({ hasText: /Saved \d/ })).toBeVisible();

  // Quality sees both answers where the readings stand, and in the audit trail.
  const quality = await pageOf('quality');
  await quality.goto(`/bench/${lot.id}`);
  await expect(quality.getByRole('grid')).toBeVisible();
  await goToCharacteristic(quality, RIPPLE);
  const history = quality.getByRole('list', { name: 'Readings of this cell' });
  await expect(history).toContainText('3.2 div × 0.5 V/div × 1, AC');
  await expect(history).toContainText(/Corrected from 16\.00\sV\sp-p \(3\.2 div × 5 V\/div × 1, AC\) by I\. Sandvær/);
  await quality.keyboard.press('ArrowDown');
  await expect(history).toContainText('Confirmed by I. Sandvær: the unit is faulty');
  await expect(quality.getByRole('gridcell', { name: /^Ripple: 16\.50.*outside the expected band/ })).toBeVisible();

  const auditor = await api('auditor');
  const trail = await auditor.get('/api/audit?subject=reading');
  const text = await trail.text();
  expect(text).toContain('"answer":"corrected"');
  expect(text).toContain('"answer":"confirmed"');
});
