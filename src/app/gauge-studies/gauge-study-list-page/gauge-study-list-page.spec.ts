import { openPage, problem } from '../../../testing/open-page';
import { CLOSED_STUDY, OPEN_STUDY } from '../../../testing/study-samples';
import { GaugeStudyListPage } from './gauge-study-list-page';

const URL = '/api/gauge-studies';

describe('GaugeStudyListPage', () => {
  it('says that it is loading, then lists studies with what is entered and what the gauge takes', async () => {
    const page = await openPage(GaugeStudyListPage, ['engineering']);
    expect(page.text()).toContain('The list of gauge studies is loading.');
    await page.answer(URL, { items: [OPEN_STUDY, { ...CLOSED_STUDY, id: 5 }], next: null });
    expect(page.text()).toContain('7 of 8 readings');
    expect(page.text()).toMatch(/Closed 5\.0\s%/);
    expect(page.text()).not.toContain('Begin study');
  });

  it('offers the first study to whoever may begin one', async () => {
    const page = await openPage(GaugeStudyListPage, ['quality']);
    await page.answer(URL, { items: [], next: null });
    expect(page.element.querySelector('qr-empty-state')?.textContent).toContain('Begin study');
  });

  it('says what failed and tries again', async () => {
    const page = await openPage(GaugeStudyListPage, ['quality']);
    await page.answer(URL, problem(503, 'The database is busy.'), 503);
    await page.press('Try again');
    await page.answer(URL, { items: [OPEN_STUDY], next: null });
    expect(page.text()).toContain('GS-26-004');
  });

  it('explains a refusal', async () => {
    const page = await openPage(GaugeStudyListPage, ['quality']);
    await page.answer(URL, problem(403, 'Your roles do not allow this.'), 403);
    expect(page.text()).toContain('Your roles do not allow this.');
  });
});
