import { openPage } from '../../../testing/open-page';
import { NewPersonPage } from './new-person-page';

const FERROW = {
  id: 9,
  name: 'S. Ferrow',
  email: 's.ferrow@hollowmere.example',
  stampNumber: null,
  roles: ['inspector'],
  active: true,
  hasPassword: false,
  lastSignIn: null,
  version: 1,
};

describe('NewPersonPage', () => {
  it('asks for a role before anything is sent', async () => {
    const page = await openPage(NewPersonPage, ['admin']);
    await page.type('Name', 'S. Ferrow');
    await page.type('E-mail', 's.ferrow@hollowmere.example');
    await page.press('Add person');
    expect(page.text()).toContain('Give at least one role.');
    page.http.verify();
  });

  it('shows the one-time link once the account is there', async () => {
    const page = await openPage(NewPersonPage, ['admin']);
    await page.type('Name', 'S. Ferrow');
    await page.type('E-mail', 's.ferrow@hollowmere.example');
    page.element.querySelectorAll<HTMLInputElement>('input[type=checkbox]')[1]?.click();
    await page.press('Add person');
    const link = 'http://127.0.0.1:3000/link#abcdefghijklmnopqrstuvwx';
    await page.answer('/api/people', { person: FERROW, link, expires: '2026-03-15T14:20:00.000Z' }, 201);
    expect(page.text()).toContain('is not shown again');
    expect(page.element.querySelector<HTMLInputElement>('qr-one-time-link input')?.value).toBe(link);
    expect(page.fixture.componentInstance.hasUnsaved()).toBe(false);
  });
});
