import { openPage, problem } from '../../../testing/open-page';
import { calibrationReply, instrumentReply } from '../testing/instrument-reply';
import { InstrumentPage } from './instrument-page';

const HISTORY = {
  calibrations: [calibrationReply()],
  checks: [
    {
      id: 4,
      day: '2026-03-12',
      observed: 10.006,
      reference: 10,
      tolerance: 0.005,
      passed: false,
      at: '2026-03-12T07:40:00.000Z',
      person: 'T. Lindqvist',
    },
  ],
  reviews: [{ id: 5, number: 'IR-26-001', openedAt: '2026-03-12T08:00:00.000Z', closedAt: null }],
};

async function openInstrument(role: 'quality' | 'inspector' | 'auditor', instrument = instrumentReply()) {
  const page = await openPage(InstrumentPage, [role], { id: 3 });
  await page.answer('/api/instruments/3', instrument);
  await page.answer('/api/instruments/3/history', HISTORY);
  return page;
}

describe('InstrumentPage', () => {
  afterEach(() => document.querySelectorAll('.cdk-overlay-container').forEach((overlay) => overlay.remove()));

  it('says how accurate its ranges are and what its calibrations found', async () => {
    const page = await openInstrument('auditor');
    expect(page.text()).toContain('±(0.05 % of reading + 3 counts of 100 µV)');
    expect(page.text()).toContain('2 points, 1 beyond what is allowed');
    expect(page.text()).toContain('18.9960 V −4 mV');
    expect(page.text()).toContain('No certificate is attached.');
    expect(page.text()).toContain('IR-26-001');
    expect(page.text()).toContain('Instruments are kept by quality.');
    expect(page.element.querySelectorAll('form, button')).toHaveLength(0);
  });

  it('takes the check of the day from an inspector, who adds no ranges', async () => {
    const page = await openInstrument('inspector');
    expect(page.text()).not.toContain('Add range');
    await page.type('It shows', '10.002');
    await page.press('Record check');
    const request = page.http.expectOne('/api/instruments/3/checks');
    expect(request.request.body).toEqual({ observed: 10.002 });
    const check = { ...HISTORY.checks[0], id: 5, observed: 10.002, passed: true };
    request.flush(check, { status: 201, statusText: 'Created' });
    await vi.waitFor(() => page.http.expectOne('/api/instruments/3').flush(instrumentReply()));
    await page.answer('/api/instruments/3/history', { ...HISTORY, checks: [check, ...HISTORY.checks] });
    expect(page.text()).toContain('10.0020 V');
  });

  it('retires a range of the instrument as it stands by then', async () => {
    const page = await openInstrument('quality');
    await page.press('Retire');
    const buttons = [...document.querySelectorAll<HTMLElement>('mat-dialog-container button')];
    buttons.find((button) => button.textContent?.trim() === 'Retire range')?.click();
    await vi.waitFor(() => expect(document.querySelector('mat-dialog-container')).toBeNull());
    const [stored] = instrumentReply().ranges;
    const other = { ...stored, id: 9, name: 'DC 2 V', fullScale: 2 };
    await page.answer('/api/instruments/3', { ...instrumentReply({ version: 6 }), ranges: [stored, other] });
    const request = page.http.expectOne('/api/instruments/3');
    expect(request.request.method).toBe('PUT');
    expect(request.request.headers.get('If-Match')).toBe('"6"');
    expect((request.request.body as { ranges: object[] }).ranges).toEqual([other]);
  });

  it('says that it waits for its review', async () => {
    const openReview = { id: 5, number: 'IR-26-001' };
    const page = await openInstrument('quality', instrumentReply({ status: 'withdrawn', usable: false, openReview }));
    expect(page.text()).toContain('Cannot be chosen for a reading');
    expect(page.text()).toContain('It can come back into service once review IR-26-001 is closed.');
  });

  it('says what failed where it does not load', async () => {
    const page = await openPage(InstrumentPage, ['quality'], { id: 3 });
    await page.answer('/api/instruments/3', problem(404, 'This instrument does not exist.'), 404);
    expect(page.text()).toContain('This instrument does not exist.');
  });
});
