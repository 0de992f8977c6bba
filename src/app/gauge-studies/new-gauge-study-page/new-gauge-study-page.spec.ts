import { type GaugeStudyBody } from '#shared/contract/gauge-studies';
import { type Instrument } from '#shared/contract/instruments';
import { type OpenPage, openPage, problem } from '../../../testing/open-page';
import { NewGaugeStudyPage } from './new-gauge-study-page';

const METER: Instrument = {
  id: 3,
  version: 1,
  assetNumber: 'DM-11',
  kind: 'multimeter',
  description: 'Bench multimeter',
  serialNumber: '',
  place: '',
  status: 'in-service',
  dailyReference: null,
  calibrationDue: '2026-09-30',
  ranges: [],
  dailyCheck: 'not-asked',
  openReview: null,
  usable: true,
  daysLeft: 90,
};

/** The page with everything filled in but the persons. */
async function filled(): Promise<OpenPage<NewGaugeStudyPage>> {
  const page = await openPage(NewGaugeStudyPage, ['quality']);
  await page.answer('/api/instruments', { items: [METER] });
  page.element.querySelector<HTMLElement>('[formControlName=instrumentId]')?.click();
  await page.fixture.whenStable();
  document.querySelector<HTMLElement>('mat-option')?.click();
  await page.fixture.whenStable();
  await page.type('Study', 'Ripple');
  await page.type('Quantity', 'Ripple');
  return page;
}

describe('NewGaugeStudyPage', () => {
  it('says beside the fields what is missing, and sends nothing', async () => {
    const page = await openPage(NewGaugeStudyPage, ['quality']);
    await page.answer('/api/instruments', problem(503, 'Busy.'), 503);
    expect(page.text()).toContain('The list of instruments did not load');
    await page.press('Begin study');
    expect(page.text()).toContain('Choose an instrument.');
    page.http.verify();
  });

  it('begins a study with a place for every reading', async () => {
    const page = await filled();
    await page.type('Persons', 'Ann\n\n Bo \n');
    await page.press('Begin study');
    const { request } = page.http.expectOne('/api/gauge-studies');
    const body = request.body as GaugeStudyBody;
    expect(body).toMatchObject({ instrumentId: 3, persons: ['Ann', 'Bo'], trials: 3 });
    expect(body.values).toHaveLength(10);
    expect(body.values[9]).toEqual([
      [null, null, null],
      [null, null, null],
    ]);
  });

  it('refuses two persons of one name', async () => {
    const page = await filled();
    await page.type('Persons', 'Ann\nAnn');
    await page.press('Begin study');
    expect(page.text()).toContain('Each name once.');
    page.http.verify();
  });
});
