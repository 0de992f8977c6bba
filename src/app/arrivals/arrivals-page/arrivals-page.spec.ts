import { lotHead, lotOf } from '../../../testing/lot-samples';
import { openPage, problem } from '../../../testing/open-page';
import { ArrivalsPage } from './arrivals-page';

const QUEUE = '/api/lots?station=arrivals&limit=200';
const two = { items: [lotHead(), lotHead({ id: 13, number: 'L-26-0013', countedQuantity: 1196 })], next: null };

describe('ArrivalsPage', () => {
  it('says that the queue is loading, then shows figures, queue and the first lot', async () => {
    const page = await openPage(ArrivalsPage, ['inspector']);
    expect(page.text()).toContain('The queue is loading.');
    await page.answer(QUEUE, two);
    expect(page.text()).toMatch(/2 lots waiting/);
    expect(page.text()).toMatch(/160 units to sample/);
    expect(page.text()).toContain('Count differs by 4');
    await page.answer('/api/lots/12', lotOf());
    expect(page.element.querySelector('qr-arrival-panel')?.textContent).toContain('Start inspection');
    expect(page.text()).not.toContain('Receive lot');
  });

  it('lets receiving correct and cancel, and leaves the draw to the bench', async () => {
    const page = await openPage(ArrivalsPage, ['receiving']);
    await page.answer(QUEUE, two);
    await page.answer('/api/lots/12', lotOf());
    const panel = page.element.querySelector('qr-arrival-panel')?.textContent ?? '';
    expect(panel).toContain('Correct');
    expect(panel).toContain('Cancel lot');
    expect(panel).not.toContain('Start inspection');
  });

  it('says that a part without a plan cannot be sampled', async () => {
    const page = await openPage(ArrivalsPage, ['inspector']);
    await page.answer(QUEUE, { items: [lotHead({ sampleSize: null })], next: null });
    await page.answer('/api/lots/12', lotOf({ sampling: null, sampleSize: null }));
    expect(page.text()).toContain('WA-12-500 has no plan in force.');
  });

  it('offers to receive a lot when none waits', async () => {
    const page = await openPage(ArrivalsPage, ['receiving']);
    await page.answer(QUEUE, { items: [], next: null });
    expect(page.element.querySelector('qr-empty-state')?.textContent).toContain('Receive lot');
  });

  it('says what failed and tries again', async () => {
    const page = await openPage(ArrivalsPage, ['receiving']);
    await page.answer(QUEUE, problem(503, 'The database is busy.'), 503);
    expect(page.text()).toContain('The queue did not load.');
    await page.press('Try again');
    await page.answer(QUEUE, { items: [], next: null });
    expect(page.text()).toContain('No lots are waiting.');
  });
});
