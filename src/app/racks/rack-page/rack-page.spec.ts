import { openPage, problem } from '../../../testing/open-page';
import { rackReply } from '../testing/rack-reply';
import { RackPage } from './rack-page';

async function openRack(role: 'admin' | 'quality') {
  const page = await openPage(RackPage, [role], { id: 2 });
  await page.answer('/api/racks/2', rackReply());
  if (role === 'admin') await page.answer('/api/parts', { items: [] });
  return page;
}

const dialogText = () => document.querySelector('mat-dialog-container')?.textContent?.replace(/\s+/g, ' ') ?? '';

function pressInDialog(name: string): void {
  const buttons = [...document.querySelectorAll<HTMLElement>('mat-dialog-container button')];
  buttons.find((button) => button.textContent?.trim() === name)?.click();
}

describe('RackPage', () => {
  afterEach(() => document.querySelectorAll('.cdk-overlay-container').forEach((overlay) => overlay.remove()));

  it('shows a reader the rack and its tokens as text', async () => {
    const page = await openRack('quality');
    expect(page.text()).toContain('Racks are kept by administrators.');
    expect(page.text()).toContain('Vout [V]: v_loaded');
    expect(page.text()).toContain('qrk_a81x…');
    expect(page.text()).toContain('by T. Lindqvist');
    expect(page.element.querySelector('form')).toBeNull();
    expect(page.text()).not.toContain('Issue a token');
  });

  it('shows a new token once, and keeps what was typed meanwhile', async () => {
    const page = await openRack('admin');
    await page.type('Place', 'Room 4');
    await page.press('Issue a token');
    const token = `qrk_${'x'.repeat(43)}`;
    const { tokens } = rackReply();
    const more = tokens.slice(0, 1).map((live) => ({ ...live, id: 6, beginning: 'qrk_xxxx' }));
    const rack = rackReply({ tokens: [...more, ...tokens] });
    await page.answer('/api/racks/2/tokens', { token, rack }, 201);
    expect(document.querySelector<HTMLInputElement>('input.token')?.value).toBe(token);
    expect(dialogText()).toContain('It is not shown again.');
    pressInDialog('Done');
    await page.fixture.whenStable();
    expect(page.text()).toContain('qrk_xxxx…');
    expect(document.body.innerHTML).not.toContain(token);
    expect(page.fixture.componentInstance.hasUnsaved()).toBe(true);
  });

  it('revokes a token after asking', async () => {
    const page = await openRack('admin');
    await page.press('Revoke');
    expect(dialogText()).toContain('Revoke token qrk_a81x…?');
    pressInDialog('Revoke token');
    await vi.waitFor(() => expect(document.querySelector('mat-dialog-container')).toBeNull());
    await page.answer('/api/racks/2/tokens/5/revocation', { done: true });
    const revoked = { at: '2026-03-12T10:00:00.000Z', by: 'T. Lindqvist' };
    const tokens = rackReply().tokens.map((token) => ({ ...token, revoked }));
    await page.answer('/api/racks/2', rackReply({ tokens }));
    expect(page.element.querySelectorAll('qr-rack-tokens tbody button')).toHaveLength(0);
  });

  it('adds and removes columns of its files, and sends what they hold', async () => {
    const page = await openRack('admin');
    const rows = () => page.element.querySelectorAll('.column').length;
    expect(rows()).toBe(2);
    await page.press('Add column');
    expect(rows()).toBe(3);
    page.element.querySelector<HTMLElement>('[aria-label="Remove column Vout [V]"]')?.click();
    await page.fixture.whenStable();
    expect(rows()).toBe(2);
    await page.press('Save rack');
    expect(page.text()).toContain('A column has no heading.');
    const fields = [...page.element.querySelectorAll<HTMLInputElement>('.column input')];
    fields.slice(-2).forEach((field, index) => {
      field.value = ['DUT', 'unit'][index] ?? '';
      field.dispatchEvent(new Event('input'));
    });
    await page.press('Save rack');
    const request = page.http.expectOne('/api/racks/2');
    expect(request.request.headers.get('If-Match')).toBe('"4"');
    expect(request.request.body).toEqual({
      name: 'North bay',
      place: 'Test room',
      active: true,
      partIds: [7],
      mapping: { Operator: null, DUT: 'unit' },
    });
  });

  it('puts what the server refuses beside the field', async () => {
    const page = await openRack('admin');
    await page.type('Name', 'South bay');
    await page.press('Save rack');
    const refusal = problem(422, 'Another record has this already.', [
      { path: ['name'], message: 'This name is taken.' },
    ]);
    await page.answer('/api/racks/2', refusal, 422);
    expect(page.element.querySelector('mat-error')?.textContent).toContain('This name is taken.');
  });

  it('shows both values when an import taught the rack something meanwhile', async () => {
    const page = await openRack('admin');
    await page.type('Place', 'Room 4');
    await page.press('Save rack');
    await page.answer('/api/racks/2', problem(412, 'Changed meanwhile.'), 412);
    await page.answer('/api/racks/2', rackReply({ version: 5, mapping: { 'Vout [V]': 'v_no_load', Operator: null } }));
    const note = page.element.querySelector('qr-conflict-note')?.textContent;
    expect(note).toContain('Vout [V]: v_no_load');
    expect(note).toContain('Vout [V]: v_loaded');
  });
});
