import { type Lot } from '#shared/contract/lots';
import { type Instrument } from '#shared/contract/instruments';
import { lotAtBench } from './support/lot-at-bench';
import { ADAPTER_PLAN, plannedPart } from './support/planned-part';
import { expect, test } from './support/site';

/** The smallest file that begins as a PDF does. */
const CERTIFICATE = { name: 'WL-77310.pdf', mimeType: 'application/pdf', buffer: Buffer.from('%PDF-1.7\n%%EOF\n') };
const yesterday = () => new Date(Date.now() - 86_400_000).toISOString().slice(0, 10);

test('an instrument past its date is refused; one found out of tolerance is withdrawn, and what rests on it is reviewed', async ({
  pageOf,
  api,
}) => {
  const quality = await api('quality');
  const inspector = await api('inspector');
  const part = await plannedPart(quality, await api('quality2'), ADAPTER_PLAN);
  const lot: Lot = await lotAtBench(await api('receiving'), inspector, { partId: part.id, quantity: 40 });
  const listed = ((await (await quality.get('/api/instruments')).json()) as { items: Instrument[] }).items;
  const named = (assetNumber: string) => listed.find((one) => one.assetNumber === assetNumber)?.id ?? 0;
  const keep = (instrumentId: number, unit: number) =>
    inspector.put(`/api/lots/${lot.id}/readings/${crypto.randomUUID()}`, {
      data: {
        unit,
        characteristicKey: 'v_no_load',
        entry: { kind: 'direct', text: '14.9', decimalComma: false },
        instrumentId,
        rangeId: null,
        question: null,
        note: '',
        repeat: null,
        takenAt: new Date().toISOString(),
      },
    });

  // The meter is new to the site; a reading is taken with it the day it is bought, before it goes to the laboratory.
  const added = await quality.post('/api/instruments', {
    data: {
      assetNumber: 'DM-77',
      kind: 'multimeter',
      description: 'Bench multimeter, 5½ digits',
      serialNumber: '',
      place: 'Bench 1',
      status: 'in-service',
      dailyReference: null,
      calibrationDue: '2030-01-31',
      ranges: [],
    },
  });
  expect(added.status(), await added.text()).toBe(201);
  const meter = (await added.json()) as Instrument;
  const kept = await keep(meter.id, 1);
  expect(kept.status(), await kept.text()).toBe(200);

  // The demo's second oscilloscope is past its date: the bench does not offer it, and the server refuses it.
  const refused = await keep(named('OS-02'), 2);
  expect(refused.status()).toBe(422);
  expect(await refused.text()).toContain('past its calibration date');

  const page = await pageOf('quality');
  await page.goto(`/instruments/${meter.id}`);
  await page.getByRole('link', { name: 'Record a calibration' }).first().click();
  await page.getByLabel('Calibrated on').fill(yesterday());
  await page.getByLabel('Next calibration due').fill('2030-01-31');
  await page.getByLabel('Laboratory').fill('Weir Lane Calibration');
  await page.getByLabel('Certificate number').fill('WL-77310');
  await page.getByLabel('As found').click();
  await page.getByRole('option', { name: 'Out of tolerance' }).click();
  await page.getByRole('button', { name: 'Add point' }).click();
  const point = page.getByRole('group', { name: 'Point 1' });
  await point.getByRole('textbox', { name: 'Point' }).fill('DC 10 V');
  await point.getByLabel('Reference').fill('10');
  await point.getByLabel('As found').fill('10.8');
  await point.getByLabel('Allowed ±').fill('0.002');
  await page.getByLabel('Certificate of the calibration').setInputFiles(CERTIFICATE);
  await page.getByRole('button', { name: 'Record calibration' }).click();

  // Withdrawn, with the review of what rests on it.
  await expect(page.getByText(/found out of tolerance/).first()).toBeVisible();
  await page.goto(`/instruments/${meter.id}`);
  await expect(page.getByText('WL-77310', { exact: true })).toBeVisible();
  await expect(page.getByRole('link', { name: 'WL-77310.pdf' })).toBeVisible();
  await page.getByRole('link', { name: /^review IR-/ }).click();
  await expect(page.getByText(lot.number)).toBeVisible();
  const afterwards = await keep(meter.id, 2);
  expect(afterwards.status()).toBe(422);
  expect(await afterwards.text()).toContain('DM-77 is withdrawn.');

  // Every reading is listed; each lot is assessed before the review can be closed.
  await page.getByRole('button', { name: `Show the readings of lot ${lot.number}` }).click();
  await expect(page.getByText(/14\.90\sV/)).toBeVisible();
  await expect(page.getByRole('button', { name: 'Close review' })).toBeDisabled();
  const assessment = page.getByRole('form', { name: `Assessment of lot ${lot.number}` });
  await assessment.getByLabel('The doubt means').click();
  await page.getByRole('option', { name: 'Measure again' }).click();
  await assessment.getByRole('button', { name: 'Save' }).click();
  await expect(assessment.getByText('Say in a few words what is done about it.')).toBeVisible();
  await assessment.getByLabel('Note').fill('Unit 1 is measured again on DM-11.');
  await assessment.getByRole('button', { name: 'Save' }).click();
  await expect(page.getByText('Assessed by M. Aldoush')).toBeVisible();
  await page.getByLabel('What the review found').fill('One reading, measured again.');
  await page.getByRole('button', { name: 'Close review' }).click();
  await page.getByRole('dialog').getByRole('button', { name: 'Close review' }).click();
  await expect(page.getByText('One reading, measured again.')).toBeVisible();

  // Closed, it lets the instrument come back.
  const now = (await (await quality.get(`/api/instruments/${meter.id}`)).json()) as Instrument;
  expect(now).toMatchObject({ status: 'withdrawn', openReview: null });
});
