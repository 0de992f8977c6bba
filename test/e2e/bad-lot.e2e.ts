import { DEMO_PASSWORD } from '#db/demo/sign-ins';
import { lotAtBench } from './support/lot-at-bench';
import { goToCharacteristic, typeColumn } from './support/measuring';
import { ADAPTER, ADAPTER_PLAN, plannedPart } from './support/planned-part';
import { expect, test } from './support/site';

test('a bad lot: the verdict turns before the last unit, the lot is held, the notice is received', async ({
  pageOf,
  api,
}) => {
  // Ripple alone: 1 200 units, level II, AQL 1.0 are code J, n 80, Ac 2, Re 3.
  const ripple = ADAPTER.filter(({ key }) => key === 'ripple_pp');
  const part = await plannedPart(await api('quality'), await api('quality2'), {
    ...ADAPTER_PLAN,
    characteristics: ripple,
  });
  const lot = await lotAtBench(await api('receiving'), await api('inspector'), { partId: part.id, quantity: 1200 });

  const inspector = await pageOf('inspector');
  await inspector.goto(`/bench/${lot.id}`);
  await goToCharacteristic(inspector, 0);
  await inspector.keyboard.type('3.7');
  await inspector.keyboard.press('Tab');
  await inspector.keyboard.type('0.5');
  await inspector.keyboard.press('Enter');
  await expect(inspector.getByText('CONTINUE', { exact: true })).toBeVisible();
  // A nonconforming reading is shown first and kept by the second Enter.
  for (const unit of [2, 3, 4]) {
    await inspector.keyboard.type('5.1');
    await inspector.keyboard.press('Enter');
    await expect(inspector.getByText(/Nonconforming: Ripple 2\.55/).first(), `unit ${unit}`).toBeVisible();
    await inspector.keyboard.press('Enter');
  }
  await expect(inspector.getByText('STOP', { exact: true })).toBeVisible();
  await expect(
    inspector.getByText('reject number reached').or(inspector.getByText('rejection number reached')).first(),
  ).toBeVisible();
  // Inspection may go on; the verdict stands.
  await typeColumn(inspector, () => '3.6', { from: 5, to: 6 });
  await inspector.getByRole('button', { name: 'Submit' }).click();
  await inspector
    .getByRole('dialog')
    .getByRole('button', { name: /Submit/ })
    .click();
  await inspector.waitForURL(/\/lots\/\d+$/);

  const quality = await pageOf('quality');
  await quality.goto(`/decision/${lot.id}`);
  await expect(quality.getByText('REJECTED', { exact: true })).toBeVisible();
  await expect(quality.getByText(/3 major nonconforming units in 6 of 80, rejection number 3/).first()).toBeVisible();
  await quality.getByRole('button', { name: 'Reject lot' }).click();
  const signing = quality.getByRole('dialog');
  await signing.getByLabel('Your password').fill(DEMO_PASSWORD);
  await signing.getByRole('button', { name: 'Reject' }).click();
  const paper = quality.getByRole('link', { name: /NC-\d\d-\d{3}/ });
  await expect(paper).toBeVisible();
  const number = await paper.textContent();
  await paper.click();
  await expect(quality.getByText('engineering@hollowmere.example', { exact: true })).toBeVisible();

  const admin = await pageOf('admin');
  await expect(async () => {
    await admin.goto('/mail');
    await admin.getByText('Received', { exact: false }).first().click();
    await expect(admin.getByRole('link', { name: `Lot ${lot.number} rejected [${number?.trim()}]` })).toBeVisible({
      timeout: 1000,
    });
  }).toPass({ timeout: 20_000 });
  await admin.getByRole('link', { name: `Lot ${lot.number} rejected` }).click();
  const letter = admin.frameLocator('iframe').locator('body');
  await expect(letter).toContainText(lot.number);
  await expect(letter).toContainText('Ripple');
  await expect(letter).toContainText('2.55');
  await expect(letter).toContainText('max 2.40');
});
