import { assessmentOf } from '../../../testing/lot-samples';
import { openPage, problem } from '../../../testing/open-page';
import { DecisionPage } from './decision-page';

const ADDRESS = '/api/lots/12/assessment';
const objection = 'You took all readings of this lot; somebody else of quality must release it.';

describe('DecisionPage', () => {
  it('offers to release, hold or send back what the sample accepts', async () => {
    const page = await openPage(DecisionPage, ['quality'], { id: 12 });
    expect(page.text()).toContain('The assessment is loading.');
    await page.answer(ADDRESS, assessmentOf('accepted', 1));
    const buttons = [...page.element.querySelectorAll('qr-signing-panel button')].map((each) =>
      each.textContent?.trim(),
    );
    expect(buttons).toEqual(['Release lot', 'Hold', 'Back to the bench']);
  });

  it('offers no release of what the sample rejects', async () => {
    const page = await openPage(DecisionPage, ['quality'], { id: 12 });
    await page.answer(ADDRESS, assessmentOf('rejected', 3));
    expect(page.text()).toContain('REJECTED');
    expect(page.text()).not.toContain('Release lot');
  });

  it('says why the person may not release their own readings', async () => {
    const page = await openPage(DecisionPage, ['quality'], { id: 12 });
    await page.answer(ADDRESS, assessmentOf('accepted', 0, { objection }));
    expect(page.text()).toContain(objection);
    const release = [...page.element.querySelectorAll('button')].find((each) => each.textContent?.includes('Release'));
    expect(release?.getAttribute('aria-disabled')).toBe('true');
  });

  it('lets an inspector read what the verdict rests on, and sign nothing', async () => {
    const page = await openPage(DecisionPage, ['inspector'], { id: 12 });
    await page.answer(ADDRESS, assessmentOf('accepted', 0));
    expect(page.text()).toContain('Quality signs the verdict.');
    expect(page.element.querySelector('qr-signing-panel button')).toBeNull();
  });

  it('says that there is nothing to decide about a lot that is not submitted', async () => {
    const page = await openPage(DecisionPage, ['quality'], { id: 12 });
    const shown = assessmentOf('continue', 0);
    await page.answer(ADDRESS, { ...shown, lot: { ...shown.lot, status: 'measuring' } });
    expect(page.text()).toContain('This lot does not wait for a decision.');
  });

  it('says what failed and tries again', async () => {
    const page = await openPage(DecisionPage, ['quality'], { id: 12 });
    await page.answer(ADDRESS, problem(503, 'The database is busy.'), 503);
    await page.press('Try again');
    await page.answer(ADDRESS, assessmentOf('accepted', 0));
    expect(page.text()).toContain('ACCEPTED');
  });
});
