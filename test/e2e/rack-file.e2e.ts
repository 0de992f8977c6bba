import { referenceLot } from '../support/reference-lot';
import { lotAtBench } from './support/lot-at-bench';
import { plannedPart } from './support/planned-part';
import { expect, test } from './support/site';

// Readings of an independent circuit simulator, with what must be decided of them.
for (const name of ['lot-good', 'lot-low-capacitance', 'lot-bad-tap'] as const) {
  test(`a rack file of ${name} is shown, imported and judged as stated`, async ({ pageOf, api }) => {
    const reference = referenceLot(name);
    const part = await plannedPart(await api('quality'), await api('quality2'), reference.plan);
    const lot = await lotAtBench(await api('receiving'), await api('inspector'), {
      partId: part.id,
      quantity: reference.lotSize,
    });
    const page = await pageOf('inspector');
    await page.goto(`/bench/${lot.id}`);
    await page.getByRole('link', { name: 'Rack file' }).click();
    const file = { name: `${name}.csv`, mimeType: 'text/csv', buffer: Buffer.from(reference.csv) };
    await page.getByLabel('Rack file').setInputFiles(file);

    const preview = page.getByRole('region', { name: '4 What it brings' });
    await expect(preview).toContainText(`${reference.sampleSize} rows`);
    const failing = Object.entries(reference.unitsFailing).map(
      ([unit, keys]) => `${unit} (${keys.join(', ').replaceAll('_', ' ')})`,
    );
    await expect(preview).toContainText(failing.join('; ') || 'none');
    for (const nonconformityClass of ['major', 'minor'] as const) {
      const [acceptance, rejection] = reference.acRe[nonconformityClass];
      const found = reference.nonconformingUnits[nonconformityClass];
      await expect(preview).toContainText(`${nonconformityClass} ${found} (Ac ${acceptance}, Re ${rejection})`);
    }
    await expect(preview).toContainText(reference.verdict === 'accept' ? /Accepted/ : /Rejected/);
    await page.getByRole('button', { name: 'Import' }).click();
    await page.waitForURL(new RegExp(`/bench/${lot.id}$`));
    await expect(page.getByText(`${reference.sampleSize} of ${reference.sampleSize} judged`)).toBeVisible();

    await page.goto(`/lots/${lot.id}`);
    const found = page.getByRole('table').filter({ hasText: 'AQL' }).first();
    for (const [nonconformityClass, count] of Object.entries(reference.nonconformingUnits))
      await expect(found.getByRole('row', { name: new RegExp(nonconformityClass, 'i') })).toContainText(
        new RegExp(`${reference.acRe[nonconformityClass as 'major' | 'minor'].join('\\s*')}\\s*${count}`),
      );
  });
}

test('a rack file with bad rows shows each with line and reason, and brings nothing in', async ({ pageOf, api }) => {
  const reference = referenceLot('lot-good');
  const part = await plannedPart(await api('quality'), await api('quality2'), reference.plan);
  const lot = await lotAtBench(await api('receiving'), await api('inspector'), { partId: part.id, quantity: 1000 });
  const page = await pageOf('inspector');
  await page.goto(`/bench/${lot.id}/rack-file`);
  const text = 'unit,v_no_load,v_loaded\n1,14.8,12.2\n2,fourteen,12.2\n81,14.8,12.2\n';
  await page
    .getByLabel('Rack file')
    .setInputFiles({ name: 'rack.csv', mimeType: 'text/csv', buffer: Buffer.from(text) });
  const faults = page.getByRole('region', { name: 'Faults of the file' });
  await expect(faults.getByRole('row', { name: /^3 v_no_load/ })).toBeVisible();
  await expect(faults.getByRole('row', { name: /^4 unit Unit 81 is not in the sample of 80\./ })).toBeVisible();
  await expect(page.getByRole('button', { name: 'Import' })).toBeDisabled();
  await page.goto(`/bench/${lot.id}`);
  await expect(page.getByText('0 of 80 judged')).toBeVisible();
});
