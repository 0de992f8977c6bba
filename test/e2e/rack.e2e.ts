import { type Bench } from '#shared/contract/bench';
import { type RackLot } from '#shared/contract/racks';
import { type Characteristic } from '#shared/contract/plans';
import { type Page } from '@playwright/test';
import { lotAtBench } from './support/lot-at-bench';
import { ADAPTER, plannedPart } from './support/planned-part';
import { expect, test } from './support/site';

/** Looked at and metered; no instrument is asked for, so that any rack may send it. */
const CHARACTERISTICS: readonly Characteristic[] = ADAPTER.flatMap((each) =>
  each.key === 'polarity' || each.key === 'v_loaded' ? [{ ...each, instrumentKind: null } as Characteristic] : [],
);
const PLAN = {
  level: 'II',
  classAqls: [
    { class: 'critical', aql: '0.15' },
    { class: 'major', aql: '1.0' },
  ],
  characteristics: [...CHARACTERISTICS],
} as Parameters<typeof plannedPart>[2];

let racks = 0;

/** Adds a rack for one part on its page, and stays there. */
async function addRack(page: Page, partNumber: string): Promise<string> {
  racks += 1;
  const name = `Bay ${process.pid}-${racks}`;
  await page.goto('/racks');
  await page.getByRole('link', { name: 'Add rack' }).first().click();
  await page.getByRole('textbox', { name: 'Name' }).fill(name);
  await page.getByRole('combobox', { name: 'Parts' }).click();
  await page.getByRole('option', { name: partNumber }).click();
  await page.keyboard.press('Escape');
  await page.getByRole('button', { name: 'Add rack' }).click();
  await expect(page.getByRole('heading', { name })).toBeVisible();
  return name;
}

test('a rack gets a token, sends readings by itself, and is shut out again', async ({
  pageOf,
  api,
  playwright,
  server,
}) => {
  const part = await plannedPart(await api('quality'), await api('quality2'), PLAN);
  const lot = await lotAtBench(await api('receiving'), await api('inspector'), { partId: part.id, quantity: 20 });
  const page = await pageOf('admin');
  const name = await addRack(page, part.number);
  await page.getByRole('button', { name: 'Issue a token' }).click();
  const token = await page.getByRole('dialog').getByLabel('Token').inputValue();
  await page.getByRole('button', { name: 'Done' }).click();
  await expect(page.getByText(`${token.slice(0, 8)}…`)).toBeVisible();
  await expect(page.getByText(token)).toHaveCount(0);

  const rack = await playwright.request.newContext({
    baseURL: server.address,
    extraHTTPHeaders: { authorization: `Bearer ${token}` },
  });
  const told = (await (await rack.get(`/api/rack/lots/${lot.number}`)).json()) as RackLot;
  expect(told.wanted).toHaveLength(told.sampleSize);
  const readings = told.wanted.flatMap(({ unit }) => [
    {
      id: `${unit}/v`,
      unit,
      characteristicKey: 'v_loaded',
      value: 12.1,
      takenAt: new Date().toISOString(),
      instrument: null,
    },
    {
      id: `${unit}/p`,
      unit,
      characteristicKey: 'polarity',
      pass: true,
      takenAt: new Date().toISOString(),
      instrument: null,
    },
  ]);
  const path = `/api/rack/lots/${lot.number}/readings`;
  const kept = await rack.post(path, { data: { readings } });
  expect(await kept.json()).toMatchObject({ kept: readings.length, known: 0, verdict: 'accepted' });
  const again = await rack.post(path, { data: { readings } });
  expect(await again.json()).toMatchObject({ kept: 0, known: readings.length });
  const bench = (await (await (await api('inspector')).get(`/api/lots/${lot.id}/bench`)).json()) as Bench;
  expect(bench.readings).toHaveLength(readings.length);
  expect(bench.readings[0]).toMatchObject({ rack: name, takenBy: null });

  await page.getByRole('button', { name: `Revoke token ${token.slice(0, 8)}` }).click();
  await page.getByRole('dialog').getByRole('button', { name: 'Revoke token' }).click();
  await expect(page.getByText(/Revoked .* by /)).toBeVisible();
  expect((await rack.get(`/api/rack/lots/${lot.number}`)).status()).toBe(401);
  await rack.dispose();

  const auditor = await pageOf('auditor');
  await auditor.goto(`/audit?subject=reading-batch`);
  await expect(auditor.getByText(`Rack ${name}`).first()).toBeVisible();
});

test('what the columns of a rack’s file hold is said once', async ({ pageOf, api }) => {
  const part = await plannedPart(await api('quality'), await api('quality2'), PLAN);
  const lotOf = async () =>
    lotAtBench(await api('receiving'), await api('inspector'), { partId: part.id, quantity: 20 });
  const name = await addRack(await pageOf('admin'), part.number);
  const page = await pageOf('inspector');
  const open = async (lotId: number, samples: number) => {
    const rows = Array.from({ length: samples }, (_, index) => `${index + 1},12.1,pass,ines`);
    const text = ['DUT,Vo,Plug,By', ...rows].join('\n');
    await page.goto(`/bench/${lotId}/rack-file`);
    await page.getByRole('combobox', { name: 'Rack' }).click();
    await page.getByRole('option', { name }).click();
    const file = { name: 'bay.csv', mimeType: 'text/csv', buffer: Buffer.from(text) };
    await page.getByLabel('Rack file').setInputFiles(file);
    await expect(page.getByRole('region', { name: '3 Its columns' })).toContainText('12.1');
  };
  const importing = page.getByRole('button', { name: 'Import' });

  const first = await lotOf();
  await open(first.id, first.sampling?.sampleSize ?? 0);
  await expect(page.getByText('4 columns are not known yet.')).toBeVisible();
  await expect(importing).toBeDisabled();
  const holds = { DUT: 'Number of the unit', Vo: /^Loaded voltage/, Plug: /^Polarity/, By: /skip it$/ };
  for (const [header, meaning] of Object.entries(holds)) {
    await page.getByRole('combobox', { name: `What ${header} holds` }).press('Enter');
    await page.getByRole('option', { name: meaning }).click();
  }
  await expect(importing).toBeEnabled();
  await importing.click();
  await page.waitForURL(new RegExp(`/bench/${first.id}$`));

  const second = await lotOf();
  await open(second.id, second.sampling?.sampleSize ?? 0);
  await expect(page.getByText('not known yet')).toHaveCount(0);
  await expect(page.getByRole('region', { name: '4 What it brings' })).toContainText('Accepted');
  await importing.click();
  await page.waitForURL(new RegExp(`/bench/${second.id}$`));
});
