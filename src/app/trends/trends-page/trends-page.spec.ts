import { type YieldRow } from '#shared/contract/yields';
import { openPage, problem } from '../../../testing/open-page';
import { TrendsPage } from './trends-page';

const row = (key: string, changes: Partial<YieldRow> = {}): YieldRow => ({
  key,
  title: key,
  note: '',
  lotsDecided: 3,
  lotsAccepted: 2,
  lotsRejected: 1,
  unitsInspected: 240,
  unitsConforming: 236,
  unitsReleased: 2400,
  ...changes,
});
const none = row('', { lotsDecided: 0, lotsAccepted: 0, lotsRejected: 0, unitsInspected: 0, unitsConforming: 0 });
const empty = { months: [], suppliers: [], parts: [], total: none };

describe('TrendsPage', () => {
  it('shows every share with its counts', async () => {
    const page = await openPage(TrendsPage, ['quality']);
    expect(page.text()).toContain('The table of yields is loading.');
    await page.answer('/api/yields', { months: [row('2026-03')], suppliers: [], parts: [], total: row('total') });
    expect(page.text()).toMatch(/2 of 3 lots accepted/);
    expect(page.text()).toMatch(/236 of 240 inspected units conforming/);
    expect(page.element.querySelector('qr-lots-by-month svg')?.getAttribute('aria-label')).toBe(
      '2026-03: 2 of 3 lots accepted',
    );
  });

  it('says so when nothing is decided yet, or nothing fits the filters', async () => {
    const page = await openPage(TrendsPage, ['quality']);
    await page.answer('/api/yields', empty);
    expect(page.text()).toContain('No lots are decided yet.');
  });

  it('takes the period from the address and leaves out what is no date', async () => {
    const page = await openPage(TrendsPage, ['quality'], { from: '2026-01-01', to: 'soon' });
    await page.answer('/api/yields?from=2026-01-01', empty);
    expect(page.text()).toContain('No lots were decided here.');
  });

  it('says what failed and tries again', async () => {
    const page = await openPage(TrendsPage, ['quality']);
    await page.answer('/api/yields', problem(503, 'The database is busy.'), 503);
    await page.press('Try again');
    await page.answer('/api/yields', empty);
    expect(page.text()).toContain('No lots are decided yet.');
  });
});
