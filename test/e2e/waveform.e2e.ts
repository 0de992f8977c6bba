import { readFileSync } from 'node:fs';
import path from 'node:path';
import { type Page } from '@playwright/test';
import { type WaveformHead } from '#shared/contract/waveforms';
import { lotAtBench } from './support/lot-at-bench';
import { goToCharacteristic } from './support/measuring';
import { ADAPTER_PLAN, plannedPart } from './support/planned-part';
import { expect, test } from './support/site';

/** Ripple is the fourth characteristic of the adapter's plan. */
const RIPPLE = 3;
const RIPPLES = path.join(import.meta.dirname, '..', 'reference', 'data', 'ripple');

const ripple = (name: string) => ({
  name: `${name}.csv`,
  mimeType: 'text/csv',
  buffer: readFileSync(path.join(RIPPLES, `${name}.csv`)),
});
const text = (name: string, content: string) => ({ name, mimeType: 'text/csv', buffer: Buffer.from(content) });

/** Lets a file fall onto the drop zone, as from the desktop. */
async function drop(page: Page, file: { name: string; buffer: Buffer }): Promise<void> {
  const transfer = await page.evaluateHandle(
    ({ name, content }) => {
      const dropped = new DataTransfer();
      dropped.items.add(new File([content], name, { type: 'text/csv' }));
      return dropped;
    },
    { name: file.name, content: file.buffer.toString() },
  );
  const zone = page.getByText('Drop the oscilloscope’s CSV file here').locator('..');
  await zone.dispatchEvent('dragover', { dataTransfer: transfer });
  await zone.dispatchEvent('drop', { dataTransfer: transfer });
}

test('a waveform: dropped at its unit, drawn, its fault named, its ripple taken as the reading', async ({
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
  await panel.getByText('Take it from a waveform').click();

  // Wrong files are refused with their reason, and nothing of them is kept.
  const chooser = panel.getByLabel('Waveform file');
  await chooser.setInputFiles(text('letter.csv', 'Dear all,\nnothing here.\n'));
  await expect(panel.getByRole('alert')).toContainText('letter.csv is not kept. The file has no rows of numbers.');
  await chooser.setInputFiles(text('backwards.csv', 'time,volts\n0,1\n2,1\n1,1\n'));
  await expect(panel.getByRole('alert')).toContainText('Row 4: time goes backwards');
  await chooser.setInputFiles(text('gap.csv', 'time,volts\n0,1\n1,NaN\n2,1\n'));
  await expect(panel.getByRole('alert')).toContainText('Row 3: “NaN” stands where the voltage should be.');
  await chooser.setInputFiles(text('nothing.csv', ''));
  await expect(panel.getByRole('alert').filter({ hasText: 'nothing.csv is empty.' })).toBeVisible();

  // The unbalanced transformer is told from an open diode.
  await drop(inspector, ripple('o4_ct_unbal_50hz'));
  await expect(panel.getByRole('link', { name: 'Unequal halves' })).toBeVisible();
  await chooser.setInputFiles(ripple('o1_hw_50hz'));
  await expect(panel.getByRole('link', { name: 'One half does not conduct' })).toBeVisible();

  // One click takes its ripple as the reading, linked to the file.
  await panel.getByRole('button', { name: /Take 1\.455\sV p-p as the reading/ }).click();
  await expect(panel.getByRole('heading', { name: /^Unit 2/ })).toBeVisible();
  await expect(inspector.getByRole('status').filter({ hasText: /Saved \d/ })).toBeVisible();
  const heads = (await (await (await api('inspector')).get(`/api/lots/${lot.id}/waveforms`)).json()) as {
    items: WaveformHead[];
  };
  const taken = heads.items.find(({ fileName }) => fileName === 'o4_ct_unbal_50hz.csv');
  expect(taken?.readingIds).toHaveLength(1);
  await inspector.keyboard.press('ArrowUp');

  // Its page: the drawing, the figures, the finding, and the reading that rests on it.
  await panel.getByRole('link', { name: 'Unequal halves' }).click();
  await expect(inspector.getByRole('heading', { name: 'o4_ct_unbal_50hz.csv' })).toBeVisible();
  await expect(inspector.locator('qr-wave-chart canvas')).toBeVisible();
  await expect(inspector.getByText(/645\smV apart/)).toBeVisible();
  await expect(inspector.getByText('1 taken from it')).toBeVisible();
  await expect(inspector.getByRole('button', { name: 'Withdraw' })).toHaveCount(0);
  await inspector.getByRole('button', { name: 'Zoom in' }).press('+');
  await expect(inspector.getByRole('button', { name: 'Whole' })).toBeEnabled();
  await inspector.getByRole('button', { name: 'Show as table' }).first().click();
  await expect(inspector.getByRole('cell', { name: 'even' }).first()).toBeVisible();

  // The other one is of another unit: its peaks are put where they are seen, and it is withdrawn with a reason.
  await inspector.goBack();
  await expect(inspector.getByRole('grid')).toBeVisible();
  await goToCharacteristic(inspector, RIPPLE);
  await panel.getByRole('link', { name: 'One half does not conduct' }).click();
  await inspector.getByRole('button', { name: 'Move peaks' }).click();
  await inspector.getByRole('button', { name: 'Move the peak later' }).press('ArrowRight');
  await inspector.getByRole('button', { name: 'Save peaks' }).click();
  await expect(inspector.getByText('Moved by I. Sandvær')).toBeVisible();
  await inspector.getByRole('button', { name: 'Withdraw' }).click();
  await inspector.getByRole('dialog').getByRole('textbox').fill('Captured at the wrong unit.');
  await inspector.getByRole('dialog').getByRole('button', { name: 'Withdraw' }).click();
  await expect(inspector.getByText('Captured at the wrong unit.')).toBeVisible();
});

test('a million samples stay smooth while the view is moved', async ({ pageOf, api }) => {
  test.setTimeout(120_000);
  const part = await plannedPart(await api('quality'), await api('quality2'), ADAPTER_PLAN);
  const lot = await lotAtBench(await api('receiving'), await api('inspector'), { partId: part.id, quantity: 1200 });
  const rows = Array.from({ length: 1_000_000 }, (_, at) => {
    const phase = ((at * 2e-7 * 100) % 1) - 0.2;
    const volts = 15 + 0.4 * (phase < 0 ? Math.sin((phase + 0.2) * 2.5 * Math.PI) : 1 - phase / 0.8);
    return `${(at * 2e-7).toFixed(7)},${volts.toFixed(4)}`;
  });
  const inspector = await api('inspector');
  const id = crypto.randomUUID();
  const sent = await inspector.put(`/api/lots/${lot.id}/waveforms/${id}?fileName=long.csv&unit=1`, {
    headers: { 'content-type': 'text/csv' },
    data: Buffer.from(`time_s,volts\n${rows.join('\n')}`),
  });
  expect(sent.status(), await sent.text()).toBe(200);

  const page = await pageOf('inspector');
  await page.goto(`/waveforms/${id}`);
  await expect(page.locator('qr-wave-chart canvas')).toBeVisible();
  const bar = page.getByRole('button', { name: 'Zoom in' });
  await bar.focus();
  // Printed, not asserted: how long the page was kept busy by each step, over forty of them.
  const busy = await page.evaluate(async () => {
    const spans: number[] = [];
    const press = (key: string) =>
      document.activeElement?.dispatchEvent(new KeyboardEvent('keydown', { key, bubbles: true }));
    for (let step = 0; step < 40; step += 1) {
      const before = performance.now();
      press(step < 8 ? '+' : step < 24 ? 'ArrowRight' : step < 32 ? 'ArrowLeft' : '-');
      await new Promise((resolve) => requestAnimationFrame(() => requestAnimationFrame(resolve)));
      spans.push(performance.now() - before);
    }
    return spans.sort((one, other) => one - other);
  });
  const at = (share: number) => (busy[Math.floor(share * (busy.length - 1))] ?? 0).toFixed(0);
  process.stdout.write(`A million samples, two frames after a step: median ${at(0.5)} ms, worst ${at(1)} ms.\n`);
  await expect(page.getByRole('button', { name: 'Whole' })).toBeVisible();
});
