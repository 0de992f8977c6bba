import { openPage, problem } from '../../../testing/open-page';
import { SupplierListPage } from './supplier-list-page';

const KESTRIN = {
  id: 2,
  version: 1,
  code: 'KES',
  name: 'Kestrin Power',
  address: '',
  contactName: '',
  contactEmail: null,
  active: true,
  lots: 19,
  lotsDecided: 14,
  lotsAccepted: 12,
};

describe('SupplierListPage', () => {
  it('says that it is loading, then lists suppliers with their lots', async () => {
    const page = await openPage(SupplierListPage, ['quality']);
    expect(page.text()).toContain('The list of suppliers is loading.');
    await page.answer('/api/suppliers', { items: [KESTRIN] });
    expect(page.text()).toContain('Kestrin Power');
    expect(page.element.querySelector('tbody a')?.getAttribute('href')).toBe('/2');
    expect(page.text()).toMatch(/19 14 12/);
  });

  it('offers to add the first supplier to whoever may, and to nobody else', async () => {
    const page = await openPage(SupplierListPage, ['receiving']);
    await page.answer('/api/suppliers', { items: [] });
    expect(page.element.querySelector('qr-empty-state')?.textContent).toContain('Add supplier');
  });

  it('offers nothing to a reader', async () => {
    const page = await openPage(SupplierListPage, ['inspector']);
    await page.answer('/api/suppliers', { items: [] });
    expect(page.text()).not.toContain('Add supplier');
  });

  it('says what failed and tries again', async () => {
    const page = await openPage(SupplierListPage, ['quality']);
    await page.answer('/api/suppliers', problem(503, 'The database is busy.'), 503);
    expect(page.text()).toContain('The list of suppliers did not load.');
    await page.press('Try again');
    await page.answer('/api/suppliers', { items: [KESTRIN] });
    expect(page.text()).toContain('Kestrin Power');
  });

  it('explains a refusal', async () => {
    const page = await openPage(SupplierListPage, ['quality']);
    await page.answer('/api/suppliers', problem(403, 'Your roles do not allow this.'), 403);
    expect(page.text()).toContain('Your roles do not allow this.');
  });
});
