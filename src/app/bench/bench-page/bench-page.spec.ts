import { provideHttpClient, withInterceptors } from '@angular/common/http';
import { HttpTestingController, provideHttpClientTesting } from '@angular/common/http/testing';
import { inputBinding, signal } from '@angular/core';
import { type ComponentFixture, TestBed } from '@angular/core/testing';
import { provideRouter } from '@angular/router';
import { Subject } from 'rxjs';
import { type Bench, type ReadingBody } from '#shared/contract/bench';
import { type Role } from '#shared/contract/roles';
import { LiveCounts } from '../../data/live-counts';
import { problemInterceptor } from '../../data/problem-interceptor';
import { Session } from '../../session/session';
import { materialDefaults } from '../../ui/material-defaults';
import { benchReply, readingOf } from '../testing/bench-reply';
import { BenchPage } from './bench-page';

const URL = '/api/lots/12/bench';

describe('the bench page', () => {
  let fixture: ComponentFixture<BenchPage>;
  let http: HttpTestingController;
  let page: HTMLElement;
  const lotChanges = new Subject<number | null>();

  function open(role: Role = 'inspector'): void {
    const me = signal({ id: 7, name: 'I. Sandvær', roles: [role] });
    const holds = (...roles: Role[]) => roles.includes(role);
    const mayCall = ({ who }: { who: Role[] }) => who.includes(role);
    TestBed.configureTestingModule({
      providers: [
        provideHttpClient(withInterceptors([problemInterceptor])),
        provideHttpClientTesting(),
        provideRouter([]),
        materialDefaults,
        { provide: Session, useValue: { me, holds, mayCall } },
        { provide: LiveCounts, useValue: { lotChanges } },
      ],
    });
    http = TestBed.inject(HttpTestingController);
    fixture = TestBed.createComponent(BenchPage, { bindings: [inputBinding('id', () => '12')] });
    page = fixture.nativeElement as HTMLElement;
    TestBed.tick();
  }

  async function load(bench: Bench = benchReply()): Promise<void> {
    http.expectOne(URL).flush(bench);
    await fixture.whenStable();
  }

  async function refuse(status: number, title: string): Promise<void> {
    http.expectOne(URL).flush({ type: 'urn:x', title, status, code: 'x' }, { status, statusText: 'No' });
    await fixture.whenStable();
  }

  function cell(): HTMLElement {
    return page.querySelector<HTMLElement>('qr-grid-row.current .focused') ?? page;
  }

  async function press(key: string, on: Element = cell(), held: KeyboardEventInit = {}): Promise<void> {
    on.dispatchEvent(new KeyboardEvent('keydown', { key, bubbles: true, cancelable: true, ...held }));
    await fixture.whenStable();
  }

  async function typeInto(field: string, text: string): Promise<HTMLInputElement> {
    const input = page.querySelector<HTMLInputElement>(field) ?? document.createElement('input');
    input.value = text;
    input.dispatchEvent(new Event('input', { bubbles: true }));
    await fixture.whenStable();
    return input;
  }

  function kept(): ReadingBody[] {
    return http.match(({ method }) => method === 'PUT').map(({ request }) => request.body as ReadingBody);
  }

  const focusOn = (unit: number, column: string) => {
    const place = page.querySelector(`qr-grid-row:nth-of-type(${unit}) [data-column="${column}"]`);
    place?.dispatchEvent(new MouseEvent('mousedown', { bubbles: true }));
    return fixture.whenStable();
  };
  const panel = () => page.querySelector('qr-reading-panel')?.textContent ?? '';

  beforeEach(() => localStorage.clear());

  it('shows that it is loading, then the sample', async () => {
    open();
    expect(page.querySelector('qr-loading-rows')).not.toBeNull();
    await load();
    expect(page.querySelectorAll('qr-grid-row')).toHaveLength(5);
    expect(page.textContent).toContain('L-26-0431');
  });

  it('says in the server’s words why it did not load, and tries again', async () => {
    open();
    await refuse(500, 'The database is busy.');
    expect(page.textContent).toContain('The database is busy.');
    page.querySelector<HTMLButtonElement>('qr-problem-note button')?.click();
    TestBed.tick();
    await load();
    expect(page.querySelectorAll('qr-grid-row')).toHaveLength(5);
  });

  it('says who may when the person may not', async () => {
    open('receiving');
    await refuse(403, 'The bench is for inspectors.');
    expect(page.querySelector('qr-no-permission')).not.toBeNull();
  });

  it('shows the sample without fields to those who only read', async () => {
    open('auditor');
    await load();
    expect(page.querySelector('qr-read-only-note')).not.toBeNull();
    await press('p');
    expect(page.querySelector('qr-attribute-entry')).toBeNull();
    expect(kept()).toHaveLength(0);
  });

  it('starts at the first reading that is missing', async () => {
    open();
    await load(benchReply({ readings: [readingOf(1, 'marking', true), readingOf(2, 'marking', true)] }));
    expect(panel()).toContain('Unit 3, marking');
  });

  it('passes an attribute with one key and goes down to the next unit', async () => {
    open();
    await load();
    await press('p');
    expect(kept()[0]).toMatchObject({ unit: 1, entry: { kind: 'attribute', pass: true, reason: '' } });
    expect(panel()).toContain('Unit 2, marking');
  });

  it('fails an attribute with F and the number of the reason', async () => {
    open();
    await load();
    await press('f');
    expect(kept()).toHaveLength(0);
    await press('2');
    expect(kept()[0]).toMatchObject({ entry: { kind: 'attribute', pass: false, reason: 'Missing' } });
  });

  it('judges a reading as it is typed, computed characteristics too, and keeps it with Enter', async () => {
    open();
    await load(benchReply({ readings: [readingOf(1, 'no_load', 17.1)] }));
    await focusOn(1, 'loaded');
    const field = await typeInto('qr-direct-entry input', '12');
    expect(panel()).toContain('Conforming');
    expect(page.querySelector('qr-grid-row [data-column="regulation"]')?.textContent).toContain('42.5');
    await press('Enter', field);
    expect(kept()[0]).toMatchObject({ unit: 1, characteristicKey: 'loaded', instrumentId: 5 });
    expect(panel()).toContain('Unit 2, loaded voltage');
  });

  it('keeps a nonconforming reading only with the second Enter, and then stops', async () => {
    open();
    await load();
    await focusOn(1, 'no_load');
    const field = await typeInto('qr-direct-entry input', '19.5');
    await press('Enter', field);
    expect(kept()).toHaveLength(0);
    expect(panel()).toContain('It reaches the rejection number. Enter again keeps it.');
    expect(page.querySelector('qr-running-verdict')?.textContent).toContain('CONTINUE');
    await press('Enter', field);
    expect(kept()).toHaveLength(1);
    expect(page.querySelector('qr-running-verdict')?.textContent).toContain('STOP');
  });

  it('says STOP when it opens a lot whose rejection number is reached', async () => {
    open();
    const conforming = ['no_load', 'loaded'].map((key) => readingOf(1, key, 12));
    await load(benchReply({ readings: [...conforming, readingOf(1, 'marking', true), readingOf(1, 'ripple', 2.9)] }));
    expect(page.querySelector('qr-running-verdict')?.textContent).toContain('STOP');
  });

  it('takes a scope reading as divisions times volts per division times probe, and remembers the scale', async () => {
    open();
    await load();
    await focusOn(1, 'ripple');
    const fields = [...page.querySelectorAll<HTMLInputElement>('qr-scope-reader input[type=text]')];
    for (const [index, text] of ['3.7', '0.5', '1'].entries()) {
      const field = fields[index];
      if (field === undefined) continue;
      field.value = text;
      field.dispatchEvent(new Event('input', { bubbles: true }));
      await fixture.whenStable();
    }
    expect(panel()).toContain('1.85');
    await press('Enter', fields[0]);
    expect(kept()[0]?.entry).toEqual({
      kind: 'scope',
      scope: { form: 'whole', divisions: 3.7, voltsPerDivision: 0.5, probeFactor: 1, coupling: 'ac' },
      typed: { divisions: '3.7', voltsPerDivision: '0.5', probeFactor: '1' },
    });
    expect(panel()).toContain('Unit 2, ripple');
    const next = [...page.querySelectorAll<HTMLInputElement>('qr-scope-reader input[type=text]')];
    expect(next.map(({ value }) => value)).toEqual(['', '0.5', '1']);
  });

  it('keeps the caution in view while the focus is on a characteristic that has one', async () => {
    open();
    await load();
    expect(panel()).not.toContain('Mains inside.');
    await focusOn(1, 'loaded');
    expect(panel()).toContain('Mains inside.');
    expect(panel()).toContain('take precedence over this program');
  });

  it('does not leave a reading half typed', async () => {
    open();
    await load();
    await focusOn(1, 'no_load');
    await typeInto('qr-direct-entry input', '17');
    await focusOn(3, 'loaded');
    expect(panel()).toContain('Unit 1, no-load voltage');
    expect(panel()).toContain('not kept yet');
    expect(fixture.componentInstance.hasUnsaved()).toBe(true);
  });

  it('asks why before a kept reading is typed over', async () => {
    open();
    await load(benchReply({ readings: [readingOf(1, 'no_load', 17.1)] }));
    await focusOn(1, 'no_load');
    const clock = vi.spyOn(performance, 'now').mockReturnValue(1000);
    await press('1');
    expect(document.querySelector('qr-repeat-dialog')?.textContent).toContain('17.10');
    const dialog = document.querySelector('qr-repeat-dialog') ?? page;
    await press('7', dialog);
    await press('3', dialog);
    expect(dialog.querySelector('input:checked')).toBeNull();
    clock.mockReturnValue(1400);
    await press('2', dialog);
    clock.mockRestore();
    document.querySelector<HTMLButtonElement>('qr-repeat-dialog button[type=submit]')?.click();
    await fixture.whenStable();
    await vi.waitFor(() => expect(panel()).toContain('Repeat 1 of 2: wrong range or scale'));
    const field = await typeInto('qr-direct-entry input', '17.3');
    await press('Enter', field);
    expect(kept()[0]).toMatchObject({ repeat: { reason: 'wrong-range', note: '' } });
  });

  it('takes the last kept reading back with Ctrl and Z', async () => {
    open();
    await load();
    await press('p');
    const [keeping] = http.match(({ method }) => method === 'PUT');
    const id = keeping?.request.url.split('/').at(-1) ?? '';
    keeping?.flush({
      reading: { ...readingOf(1, 'marking', true), id },
      verdict: 'conforming',
      unitVerdict: 'not judged',
      stop: false,
      lotReason: '',
    });
    await fixture.whenStable();
    await press('z', cell(), { ctrlKey: true });
    http.expectOne(`/api/lots/12/readings/${id}/withdrawal`);
    expect(page.querySelector('qr-grid-row [data-column="marking"]')?.textContent?.trim()).toBe('');
  });

  it('refuses to submit while readings are missing, and goes to the first of them', async () => {
    open();
    await load(benchReply({ readings: [readingOf(1, 'marking', true)] }));
    await focusOn(4, 'ripple');
    const submit = [...page.querySelectorAll('button')].find((button) => button.textContent?.includes('Submit'));
    submit?.click();
    await fixture.whenStable();
    expect(panel()).toContain('19 readings are missing. This is the first.');
    expect(panel()).toContain('Unit 2, marking');
  });
});
