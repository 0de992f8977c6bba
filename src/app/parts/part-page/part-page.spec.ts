import { vi } from 'vitest';
import { openPage } from '../../../testing/open-page';
import { PartPage } from './part-page';

const MODEL = {
  topology: 'bridge',
  lineVolts: 230,
  lineHertz: 50,
  ratedVolts: 12,
  ratedAmperes: 0.5,
  secondaryPeakVolts: 18.2,
  sourceOhms: 2.6,
  diodeDropVolts: 0.85,
  filterFarads: 0.0022,
  filterTolerance: 0.2,
  filterEsrOhms: null,
};
const ADAPTER = {
  id: 1,
  version: 2,
  number: 'WA-12-500',
  name: 'Wall adapter 12 V, 500 mA',
  form: 'wall-adapter',
  model: MODEL,
  active: true,
  expected: null,
  plan: null,
};

async function openPart(role: 'quality' | 'inspector', model: object = MODEL) {
  const page = await openPage(PartPage, [role], { id: 1 });
  await page.answer('/api/parts/1', { ...ADAPTER, model });
  return page;
}

describe('PartPage', () => {
  it('shows a reader the model with units, the capacitor in microfarads', async () => {
    const page = await openPart('inspector');
    expect(page.text()).toContain('2\u202f200\u00a0µF ± 20\u00a0%'.replace(/\s+/g, ' '));
    expect(page.text()).toContain('Parts are kept by quality.');
  });

  it('offers to write the plan of a part that has none', async () => {
    const page = await openPart('quality');
    expect(page.element.querySelector('a[href="/plans/new?part=1"]')?.textContent).toContain('Write its plan');
  });

  it('never sends a quantity it did not understand as none', async () => {
    const page = await openPart('quality');
    await page.type('Capacitor ESR', 'small');
    await page.press('Save part');
    expect(page.text()).toContain('Mend what is marked first.');
    page.http.verify();
  });

  it('sends quantities in SI base units', async () => {
    const page = await openPart('quality');
    await page.type('Filter capacitance', '4700');
    await page.type('Capacitor ESR', '60m');
    await page.press('Save part');
    const { body } = page.http.expectOne('/api/parts/1').request;
    expect(body).toMatchObject({ model: { filterFarads: 0.0047, filterEsrOhms: 0.06, filterTolerance: 0.2 } });
  });

  it('asks nothing of a rectifier of a switch-mode supply', async () => {
    const page = await openPart('quality', { ...MODEL, topology: 'switch-mode', filterFarads: null });
    expect(page.text()).not.toContain('Secondary peak');
    await page.press('Save part');
    const { body } = page.http.expectOne('/api/parts/1').request;
    expect(body).toMatchObject({ model: { secondaryPeakVolts: null, sourceOhms: null, diodeDropVolts: null } });
  });

  it('says what it ought to give, beside the textbook', async () => {
    const page = await openPart('inspector');
    await vi.waitFor(async () => {
      await page.fixture.whenStable();
      expect(page.text()).toContain('Ripple, peak to peak');
    });
    expect(page.text()).toContain('Too high: the formula charges in an instant');
  });

  it('says why it says nothing of a switch-mode supply', async () => {
    const page = await openPart('inspector', { ...MODEL, topology: 'switch-mode', filterFarads: null });
    await vi.waitFor(async () => {
      await page.fixture.whenStable();
      expect(page.text()).toContain('does not follow from its mains side');
    });
  });
});
