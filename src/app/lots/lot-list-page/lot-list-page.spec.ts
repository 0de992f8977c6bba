import { lotHead } from '../../../testing/lot-samples';
import { openPage, problem } from '../../../testing/open-page';
import { LotListPage } from './lot-list-page';

const HELD = '/api/lots?station=on-hold';

describe('LotListPage', () => {
  it('tells rejected lots from held ones and leads to the next page', async () => {
    const page = await openPage(LotListPage, ['quality'], { station: 'on-hold' });
    expect(page.text()).toContain('The list of lots is loading.');
    const rejected = lotHead({ status: 'on-hold', verdict: 'rejected', decidedAt: '2026-03-12T10:00:00.000Z' });
    const held = lotHead({ id: 13, number: 'L-26-0013', status: 'on-hold' });
    await page.answer(HELD, { items: [rejected, held], next: 'cursor' });
    expect(page.text()).toContain('Rejected');
    expect(page.text()).toContain('Held, acceptable');
    expect(page.element.querySelector('qr-page-links a')?.getAttribute('href')).toContain('after=cursor');
  });

  it('says that no lot is on hold', async () => {
    const page = await openPage(LotListPage, ['quality'], { station: 'on-hold' });
    await page.answer(HELD, { items: [], next: null });
    expect(page.text()).toContain('No lots are on hold.');
  });

  it('tells an empty station from filters that nothing fits', async () => {
    const page = await openPage(LotListPage, ['quality'], { station: 'released', part: '3' });
    await page.answer('/api/lots?station=released&partId=3', { items: [], next: null });
    expect(page.text()).toContain('No lot fits these filters.');
  });

  it('says what failed and tries again', async () => {
    const page = await openPage(LotListPage, ['quality'], { station: 'on-hold' });
    await page.answer(HELD, problem(503, 'The database is busy.'), 503);
    await page.press('Try again');
    await page.answer(HELD, { items: [], next: null });
    expect(page.text()).toContain('No lots are on hold.');
  });
});
