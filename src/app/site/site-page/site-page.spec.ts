import { openPage } from '../../../testing/open-page';
import { SitePage } from './site-page';

const SITE = {
  name: 'Hollowmere Controls',
  department: 'Incoming inspection',
  address: '',
  engineeringList: ['engineering@hollowmere.example'],
  waitingTargetHours: 8,
  approveOwnPlans: false,
  releaseOwnReadings: false,
  dailyChecks: true,
  version: 1,
};

describe('SitePage', () => {
  it('shows the auditor the settings as text', async () => {
    const page = await openPage(SitePage, ['auditor']);
    await page.answer('/api/site', SITE);
    expect(page.text()).toContain('Plan approved by another person required');
    expect(page.element.querySelector('form')).toBeNull();
  });

  it('puts a wrong address under the list, and a target that is too long under its field', async () => {
    const page = await openPage(SitePage, ['admin']);
    await page.answer('/api/site', SITE);
    await page.type('Engineering list', 'nobody');
    await page.type('A lot should wait at most', '300');
    await page.press('Save settings');
    const errors = [...page.element.querySelectorAll('mat-error')].map((error) => error.textContent?.trim());
    expect(errors).toEqual(['This is not an e-mail address.', 'At most 240 hours.']);
    page.http.verify();
  });

  it('says under the target that it is no number, and sends nothing', async () => {
    const page = await openPage(SitePage, ['admin']);
    await page.answer('/api/site', SITE);
    await page.type('A lot should wait at most', 'long');
    await page.press('Save settings');
    expect(page.element.querySelector('mat-error')?.textContent).toContain('Type a number');
    page.http.verify();
  });

  it('takes hours as people write them, and loses no setting', async () => {
    const page = await openPage(SitePage, ['admin']);
    await page.answer('/api/site', SITE);
    await page.type('A lot should wait at most', '6.5');
    await page.press('Save settings');
    const { body } = page.http.expectOne('/api/site').request;
    expect(body).toMatchObject({ waitingTargetHours: 6.5, dailyChecks: true });
  });
});
