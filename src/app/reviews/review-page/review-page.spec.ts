import { openPage, problem } from '../../../testing/open-page';
import { affectedLot, reviewReply } from '../testing/review-reply';
import { ReviewPage } from './review-page';

async function openReview(role: 'quality' | 'auditor', review = reviewReply()) {
  const page = await openPage(ReviewPage, [role], { id: 5 });
  await page.answer('/api/reviews/5', review);
  return page;
}

function chooseEffect(element: HTMLElement, title: string): Promise<void> {
  element.querySelector<HTMLElement>('qr-lot-assessment .mat-mdc-select-trigger')?.click();
  return vi.waitFor(() => {
    const options = [...document.querySelectorAll<HTMLElement>('mat-option')];
    const option = options.find((each) => each.textContent?.trim() === title);
    if (!option) throw new Error(`There is no option ${title}.`);
    option.click();
  });
}

describe('ReviewPage', () => {
  afterEach(() => document.querySelectorAll('.cdk-overlay-container').forEach((overlay) => overlay.remove()));

  it('shows every lot and certificate that rests on the instrument, to a reader as text', async () => {
    const page = await openReview('auditor');
    expect(page.text()).toContain('2 lots, 24 readings, 2 certificates rest on it');
    expect(page.text()).toContain('2025-09-30 to 2026-03-10');
    expect(page.text()).toContain('2 so near a limit that the error found could have turned their verdicts.');
    expect(page.text()).toContain('No effect on the verdict Far from every limit. Assessed by M. Aldoush');
    expect(page.text()).toContain('Reviews are assessed and closed by quality.');
    expect(page.element.querySelector('form')).toBeNull();
  });

  it('says so where everything is in doubt, and where nothing is known of how near readings lie', async () => {
    const page = await openReview(
      'auditor',
      reviewReply({ doubtFrom: null, affected: [affectedLot(1, { nearLimit: null })] }),
    );
    expect(page.text()).toContain('all up to 2026-03-10');
    expect(page.text()).toContain('No good calibration is known before');
    expect(page.text()).toContain('How near they lie to limits is not known');
  });

  it('takes what is said of a lot, and lets the review be closed then', async () => {
    const page = await openReview('quality');
    const close = () =>
      [...page.element.querySelectorAll('button')].find((button) => button.textContent?.trim() === 'Close review');
    expect(close()?.getAttribute('aria-disabled')).toBe('true');
    expect(page.text()).toContain('One lot is not assessed yet.');
    await chooseEffect(page.element, 'Measure again');
    await page.fixture.whenStable();
    expect(page.fixture.componentInstance.hasUnsaved()).toBe(true);
    await page.press('Save');
    expect(page.text()).toContain('Say in a few words what is done about it.');
    await page.type('Note', 'Kept samples, with DM-12.');
    await page.press('Save');
    const request = page.http.expectOne('/api/reviews/5/lots/1');
    expect(request.request.headers.get('If-Match')).toBe('"3"');
    expect(request.request.body).toEqual({ effect: 'measure-again', note: 'Kept samples, with DM-12.' });
    const said = affectedLot(1, {
      effect: 'measure-again',
      note: 'Kept samples, with DM-12.',
      assessedBy: 'M. Aldoush',
    });
    const [, second] = reviewReply().affected;
    request.flush(reviewReply({ version: 4, assessed: 2, affected: [said, ...(second ? [second] : [])] }));
    await page.fixture.whenStable();
    expect(page.fixture.componentInstance.hasUnsaved()).toBe(false);
    expect(close()?.getAttribute('aria-disabled')).not.toBe('true');
  });

  it('shows what is said of a lot as text until it is to be changed', async () => {
    const page = await openReview('quality');
    expect(page.element.querySelectorAll('qr-lot-assessment form')).toHaveLength(1);
    await page.press('Change');
    expect(page.element.querySelectorAll('qr-lot-assessment form')).toHaveLength(2);
    await page.press('Cancel');
    expect(page.element.querySelectorAll('qr-lot-assessment form')).toHaveLength(1);
    expect(page.fixture.componentInstance.hasUnsaved()).toBe(false);
  });

  it('reads the review again where somebody else worked on it, and keeps what was typed', async () => {
    const page = await openReview('quality');
    await chooseEffect(page.element, 'Recall the lot');
    await page.type('Note', 'Back from the line.');
    await page.press('Save');
    await page.answer('/api/reviews/5/lots/1', problem(412, 'The review was changed.'), 412);
    await page.answer('/api/reviews/5', reviewReply({ version: 7 }));
    expect(page.text()).toContain('It is read again; what you typed stays.');
    expect(page.element.querySelector<HTMLInputElement>('qr-lot-assessment input')?.value).toBe('Back from the line.');
    await page.press('Save');
    const request = page.http.expectOne('/api/reviews/5/lots/1');
    expect(request.request.headers.get('If-Match')).toBe('"7"');
  });

  it('is final once closed', async () => {
    const closed = {
      closedAt: '2026-03-20T10:00:00.000Z',
      closedBy: 'R. Okonvei',
      conclusion: 'Nothing was released wrongly.',
    };
    const page = await openReview('quality', reviewReply({ ...closed, assessed: 2 }));
    expect(page.text()).toContain('Nothing was released wrongly.');
    expect(page.text()).toContain('by R. Okonvei. It changes no more.');
    expect(page.element.querySelector('form')).toBeNull();
  });
});
