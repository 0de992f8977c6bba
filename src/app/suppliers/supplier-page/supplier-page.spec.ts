import { openPage, problem } from '../../../testing/open-page';
import { SupplierPage } from './supplier-page';

const KESTRIN = {
  id: 2,
  version: 4,
  code: 'KES',
  name: 'Kestrin Power',
  address: '',
  contactName: 'D. Hallgarth',
  contactEmail: null,
  active: true,
  lots: 19,
  lotsDecided: 14,
  lotsAccepted: 12,
};

async function openSupplier(role: 'quality' | 'inspector') {
  const page = await openPage(SupplierPage, [role], { id: 2 });
  await page.answer('/api/suppliers/2', KESTRIN);
  return page;
}

describe('SupplierPage', () => {
  it('shows a reader the values as text', async () => {
    const page = await openSupplier('inspector');
    expect(page.text()).toContain('Suppliers are kept by receiving and quality.');
    expect(page.element.querySelector('form')).toBeNull();
  });

  it('says beside the field what is missing, and sends nothing', async () => {
    const page = await openSupplier('quality');
    await page.type('Name', ' ');
    await page.press('Save supplier');
    expect(page.element.querySelector('mat-error')?.textContent).toContain('Fill this in.');
    page.http.verify();
  });

  it('puts what the server refuses beside the field', async () => {
    const page = await openSupplier('quality');
    await page.type('Code', 'BAL');
    await page.press('Save supplier');
    const refusal = problem(422, 'The supplier was not saved.', [{ path: ['code'], message: 'This code is taken.' }]);
    await page.answer('/api/suppliers/2', refusal, 422);
    expect(page.element.querySelector('mat-error')?.textContent).toContain('This code is taken.');
  });

  it('shows both values when somebody else saved first, and keeps what was typed', async () => {
    const page = await openSupplier('quality');
    await page.type('Contact person', 'B. Mine');
    await page.press('Save supplier');
    await page.answer('/api/suppliers/2', problem(412, 'Changed meanwhile.'), 412);
    await page.answer('/api/suppliers/2', { ...KESTRIN, version: 5, contactName: 'A. Other' });
    const note = page.element.querySelector('qr-conflict-note')?.textContent;
    expect(note).toContain('B. Mine');
    expect(note).toContain('A. Other');
    await page.press('Keep what I typed');
    await page.press('Save supplier');
    const request = page.http.expectOne('/api/suppliers/2');
    expect(request.request.headers.get('If-Match')).toBe('"5"');
    expect(request.request.body).toMatchObject({ contactName: 'B. Mine' });
  });
});
