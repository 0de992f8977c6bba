import { type HarnessLoader } from '@angular/cdk/testing';
import { TestbedHarnessEnvironment } from '@angular/cdk/testing/testbed';
import { provideHttpClient, withInterceptors } from '@angular/common/http';
import { HttpTestingController, provideHttpClientTesting } from '@angular/common/http/testing';
import { inputBinding, signal } from '@angular/core';
import { type ComponentFixture, TestBed } from '@angular/core/testing';
import { MatSelectHarness } from '@angular/material/select/testing';
import { By } from '@angular/platform-browser';
import { provideRouter, Router } from '@angular/router';
import { type RackPreview } from '#shared/contract/bench';
import { problemInterceptor } from '../../data/problem-interceptor';
import { Session } from '../../session/session';
import { materialDefaults } from '../../ui/material-defaults';
import { benchReply } from '../testing/bench-reply';
import { FileDrop } from '../../ui/file-drop';
import { RackFilePage } from './rack-file-page';

const PREVIEW = '/api/lots/12/rack-file/preview';
const SOUND: RackPreview = {
  fileName: 'rack.csv',
  rows: 5,
  columns: [
    { header: 'unit', characteristicKey: null, samples: ['1'] },
    { header: 'no_load', characteristicKey: 'no_load', samples: ['17.2'] },
  ],
  readings: 5,
  faults: [],
  questions: [],
  nonconformingUnits: [{ unit: 2, failed: ['no_load'] }],
  groups: [{ class: 'major', found: 1, acceptance: 0, rejection: 1 }],
  verdict: 'rejected',
  reason: 'Rejected: 1 major nonconforming unit in 5, rejection number 1.',
};

/** What the server is asked about a file. */
interface Asked {
  rackId: number | null;
  mapping: Record<string, string | null>;
}

describe('the rack file page', () => {
  let fixture: ComponentFixture<RackFilePage>;
  let http: HttpTestingController;
  let page: HTMLElement;
  let loader: HarnessLoader;

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
    loader = TestbedHarnessEnvironment.loader(fixture);
    TestBed.tick();
    const racks = [{ id: 3, name: 'North bay', mapping: { V1: 'no_load', Op: null } }];
    http.expectOne('/api/lots/12/bench').flush(benchReply({ racks }));
    await fixture.whenStable();
  });

  async function pick(): Promise<void> {
    const drop = fixture.debugElement.query(By.directive(FileDrop)).componentInstance as FileDrop;
    const text = 'unit,no_load\n1,17.2';
    // The files of the test's browser do not know how to give their text.
    const file = Object.assign(new File([text], 'rack.csv'), { text: () => Promise.resolve(text) });
    drop.picked.emit(file);
    await fixture.whenStable();
  }

  /** Answers the open question; what the headings mean by themselves is then asked with. */
  async function answer(reply: RackPreview): Promise<Asked> {
    const request = http.expectOne(PREVIEW);
    request.flush(reply);
    await fixture.whenStable();
    return request.request.body as Asked;
  }

  async function preview(reply: RackPreview): Promise<Asked> {
    await answer(reply);
    return answer(reply);
  }

  async function choose(label: string, option: string): Promise<void> {
    const select = await loader.getHarness(MatSelectHarness.with({ selector: `[aria-label="${label}"]` }));
    await select.clickOptions({ text: option });
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

  it('asks with what the headings say by themselves', async () => {
    await pick();
    expect((await answer(SOUND)).mapping).toEqual({});
    expect((await answer(SOUND)).mapping).toEqual({ unit: 'unit', no_load: 'no_load' });
    const heads = [...page.querySelectorAll('qr-rack-columns td.heading')].map((cell) => cell.textContent);
    expect(heads).toEqual(['unit', 'no_load']);
    expect(page.querySelector('qr-rack-columns')?.textContent).toContain('17.2');
  });

  it('says beside a column that it is not known, and takes what the person says of it', async () => {
    const columns = [...SOUND.columns, { header: 'V9', characteristicKey: null, samples: ['12.1', '12.0'] }];
    const faults = [{ line: 1, column: 'V9', message: 'The plan has no characteristic V9.' }];
    await pick();
    await preview({ ...SOUND, columns, faults });
    expect(page.querySelector('qr-rack-columns')?.textContent).toContain('Say what this column holds, or skip it.');
    expect(page.querySelector('qr-rack-faults')).toBeNull();
    expect(button('Import').getAttribute('aria-disabled')).toBe('true');
    await choose('What V9 holds', 'Loaded voltage, in V');
    const { mapping } = await answer({ ...SOUND, columns });
    expect(mapping).toEqual({ unit: 'unit', no_load: 'no_load', V9: 'loaded' });
    await choose('What V9 holds', 'Nothing wanted: skip it');
    expect((await answer({ ...SOUND, columns })).mapping).toMatchObject({ V9: null });
    expect(button('Import').getAttribute('aria-disabled')).not.toBe('true');
  });

  it('takes what was remembered with the rack', async () => {
    const columns = ['unit', 'V1', 'Op'].map((header) => ({ header, characteristicKey: null, samples: ['1'] }));
    await pick();
    await preview({ ...SOUND, columns });
    const rack = await loader.getHarness(MatSelectHarness.with({ ancestor: 'qr-rack-choice' }));
    await rack.clickOptions({ text: 'North bay' });
    const asked = await answer({ ...SOUND, columns });
    expect(asked).toMatchObject({ rackId: 3, mapping: { unit: 'unit', V1: 'no_load', Op: null } });
    button('Import').click();
    const sent = http.expectOne('/api/lots/12/rack-file').request.body as Asked;
    expect(sent).toEqual(asked);
  });

  it('lists the readings that will wait for an answer', async () => {
    await pick();
    const sentence = 'Ten times more than this part can give.';
    const questions = [{ unit: 2, characteristicKey: 'ripple', value: 18.4, sentence }];
    await preview({ ...SOUND, questions });
    const cells = [...page.querySelectorAll('qr-rack-questions tbody td')].map((cell) =>
      cell.textContent?.replaceAll(/\s/g, ' '),
    );
    expect(cells).toEqual(['2', 'Ripple', '18.40 V p-p', sentence]);
    expect(button('Import').getAttribute('aria-disabled')).not.toBe('true');
  });

  it('says in the server’s words why a file was refused', async () => {
    await pick();
    const stated = { type: 'urn:x', title: 'The lot is submitted.', status: 409, code: 'lot-not-at-bench' };
    http.expectOne(PREVIEW).flush(stated, { status: 409, statusText: 'Conflict' });
    await fixture.whenStable();
    expect(page.textContent).toContain('The lot is submitted.');
  });
});
