import { openPage, problem } from '../../../testing/open-page';
import { rackReply } from '../testing/rack-reply';
import { RackListPage } from './rack-list-page';

describe('RackListPage', () => {
  it('says that it is loading, then lists racks with their parts and the tokens that are accepted', async () => {
    const page = await openPage(RackListPage, ['admin']);
    expect(page.text()).toContain('The list of racks is loading.');
    const part = (number: string) => ({ id: Number(number), number: `HC-${number}`, name: '' });
    const many = rackReply({ id: 3, name: 'South bay', tokens: [], parts: ['1', '2', '3', '4', '5'].map(part) });
    await page.answer('/api/racks', { items: [rackReply(), many] });
    expect(page.element.querySelector('tbody a')?.getAttribute('href')).toBe('/2');
    const cells = [...page.element.querySelectorAll('tbody tr')].map((row) =>
      [...row.querySelectorAll('td')].map((cell) => cell.textContent?.trim()),
    );
    expect(cells[0]?.slice(0, 4)).toEqual(['North bay', 'Test room', 'WA-12-500', '1']);
    expect(cells[1]?.slice(2, 5)).toEqual(['HC-1, HC-2, HC-3, and 2 more', '0', 'never']);
  });

  it('offers the first rack to an administrator, and to no reader', async () => {
    const page = await openPage(RackListPage, ['admin']);
    await page.answer('/api/racks', { items: [] });
    expect(page.element.querySelector('qr-empty-state')?.textContent).toContain('Add rack');
  });

  it('offers nothing to a reader', async () => {
    const page = await openPage(RackListPage, ['auditor']);
    await page.answer('/api/racks', { items: [] });
    expect(page.text()).not.toContain('Add rack');
  });

  it('says what failed, and explains a refusal', async () => {
    const page = await openPage(RackListPage, ['quality']);
    await page.answer('/api/racks', problem(503, 'The database is busy.'), 503);
    expect(page.text()).toContain('The list of racks did not load.');
    await page.press('Try again');
    await page.answer('/api/racks', problem(403, 'Your roles do not allow this.'), 403);
    expect(page.text()).toContain('Your roles do not allow this.');
  });
});
