import { type Page } from '@playwright/test';

/** Focus on the first unit of a characteristic, without the mouse. */
export async function goToCharacteristic(page: Page, index: number): Promise<void> {
  await page.getByRole('grid').locator('[tabindex="0"]').first().focus();
  await page.keyboard.press('Control+Home');
  for (let step = 0; step < index; step += 1) await page.keyboard.press('ArrowRight');
}

/** Types a column down to a unit: Enter keeps and goes down. */
export async function typeColumn(
  page: Page,
  reading: (unit: number) => string,
  units: { from: number; to: number },
): Promise<void> {
  for (let unit = units.from; unit <= units.to; unit += 1) {
    await page.keyboard.type(reading(unit));
    await page.keyboard.press('Enter');
  }
}
