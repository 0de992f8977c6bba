import { provideHttpClient, withInterceptors } from '@angular/common/http';
import { HttpTestingController, provideHttpClientTesting } from '@angular/common/http/testing';
import { inputBinding, signal } from '@angular/core';
import { type ComponentFixture, TestBed } from '@angular/core/testing';
import { By } from '@angular/platform-browser';
import { provideRouter, Router } from '@angular/router';
import { type RackPreview } from '#shared/contract/bench';
import { problemInterceptor } from '../../data/problem-interceptor';
import { Session } from '../../session/session';
import { materialDefaults } from '../../ui/material-defaults';
import { benchReply } from '../testing/bench-reply';
import { FileDrop } from './file-drop';
import { RackFilePage } from './rack-file-page';

const PREVIEW = '/api/lots/12/rack-file/preview';
const SOUND: RackPreview = {
  fileName: 'rack.csv',
  rows: 5,
  columns: [
    { header: 'unit', characteristicKey: null },
    { header: 'no_load', characteristicKey: 'no_load' },
  ],
  readings: 5,
  faults: [],
  nonconformingUnits: [{ unit: 2, failed: ['no_load'] }],
  groups: [{ class: 'major', found: 1, acceptance: 0, rejection: 1 }],
  verdict: 'rejected',
  reason: 'Rejected: 1 major nonconforming unit in 5, rejection number 1.',
};

describe('the rack file page', () => {
  let fixture: ComponentFixture<RackFilePage>;
  let http: HttpTestingController;
  let page: HTMLElement;

  beforeEach(async () => {
    localStorage.clear();
    TestBed.configureTestingModule({
      providers: [
        provideHttpClient(withInterceptors([problemInterceptor])),
        provideHttpClientTesting(),
        provideRouter([]),
        materialDefaults,
        { provide: Session, useValue: { me: signal(null), holds: () => true } },
      ],
    });
    http = TestBed.inject(HttpTestingController);
    fixture = TestBed.createComponent(RackFilePage, { bindings: [inputBinding('id', () => '12')] });
    page = fixture.nativeElement as HTMLElement;
    TestBed.tick();
    http.expectOne('/api/lots/12/bench').flush(benchReply());
    await fixture.whenStable();
  });

  async function pick(): Promise<void> {
    const drop = fixture.debugElement.query(By.directive(FileDrop)).componentInstance as FileDrop;
    drop.picked.emit({ name: 'rack.csv', text: 'unit,no_load\n1,17.2' });
    await fixture.whenStable();
  }

  async function preview(reply: RackPreview): Promise<void> {
    http.expectOne(PREVIEW).flush(reply);
    await fixture.whenStable();
  }

  function button(word: string): HTMLButtonElement {
    const found = [...page.querySelectorAll('button')].find(({ textContent }) => textContent?.trim() === word);
    if (found === undefined) throw new Error(`There is no button ${word}.`);
    return found;
  }

  it('says which columns the file has to have; computed ones stay out', () => {
    const heads = [...page.querySelectorAll('qr-expected-columns tbody td:first-child')].map(
      (cell) => cell.textContent,
    );
    expect(heads).toEqual(['unit', 'marking', 'no_load', 'loaded', 'ripple']);
  });

  it('shows what the file would bring, with the only instrument in calibration named', async () => {
    await pick();
    expect((http.match(PREVIEW)[0]?.request.body as { instrumentIds: number[] }).instrumentIds).toEqual([5]);
  });

  it('shows the verdict the file leads to, imports it and goes back to the bench', async () => {
    const going = vi.spyOn(TestBed.inject(Router), 'navigate').mockResolvedValue(true);
    await pick();
    await preview(SOUND);
    expect(page.textContent).toContain('2 (No-load voltage)');
    expect(page.textContent).toContain('Rejected: 1 major nonconforming unit in 5');
    button('Import').click();
    http.expectOne('/api/lots/12/rack-file').flush(SOUND, { status: 201, statusText: 'Created' });
    await fixture.whenStable();
    expect(going).toHaveBeenCalledWith(['/bench', 12]);
  });

  it('names every fault with line, column and reason, and imports nothing', async () => {
    await pick();
    await preview({ ...SOUND, faults: [{ line: 3, column: 'no_load', message: '“x1”: type a number.' }] });
    const cells = [...page.querySelectorAll('qr-rack-faults tbody td')].map((cell) => cell.textContent);
    expect(cells).toEqual(['3', 'no_load', '“x1”: type a number.']);
    button('Import').click();
    http.expectNone('/api/lots/12/rack-file');
  });

  it('says in the server’s words why a file was refused', async () => {
    await pick();
    const stated = { type: 'urn:x', title: 'The lot is submitted.', status: 409, code: 'lot-not-at-bench' };
    http.expectOne(PREVIEW).flush(stated, { status: 409, statusText: 'Conflict' });
    await fixture.whenStable();
    expect(page.textContent).toContain('The lot is submitted.');
  });
});
