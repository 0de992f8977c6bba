import { type HttpInterceptorFn, HttpResponse, provideHttpClient, withInterceptors } from '@angular/common/http';
import { HttpTestingController, provideHttpClientTesting, type TestRequest } from '@angular/common/http/testing';
import { inputBinding, signal } from '@angular/core';
import { type ComponentFixture, TestBed } from '@angular/core/testing';
import { provideRouter } from '@angular/router';
import { of, Subject } from 'rxjs';
import { type Bench, type Kept, type Reading, type ReadingBody } from '#shared/contract/bench';
import { type Role } from '#shared/contract/roles';
import { LiveCounts } from '../../data/live-counts';
import { problemInterceptor } from '../../data/problem-interceptor';
import { Session } from '../../session/session';
import { materialDefaults } from '../../ui/material-defaults';
import { BenchPage } from '../bench-page/bench-page';
import { benchReply, readingOf } from './bench-reply';

const LOT = '/api/lots/12';

/** No waveform was captured of the lot; what the bench asks of them is answered at once. */
const noWaveforms: HttpInterceptorFn = (request, next) =>
  request.url === `${LOT}/waveforms` ? of(new HttpResponse({ body: { items: [] } })) : next(request);

/** The bench page of lot 12 with its real children, and the hands of a person at its keys. */
export class BenchUnderTest {
  readonly http: HttpTestingController;
  readonly fixture: ComponentFixture<BenchPage>;
  readonly page: HTMLElement;
  /** What the server says has changed. */
  readonly lotChanges = new Subject<number | null>();

  constructor(role: Role = 'inspector') {
    const me = signal({ id: 7, name: 'I. Sandvær', roles: [role] });
    const holds = (...roles: Role[]) => roles.includes(role);
    const mayCall = ({ who }: { who: Role[] }) => who.includes(role);
    TestBed.configureTestingModule({
      providers: [
        provideHttpClient(withInterceptors([problemInterceptor, noWaveforms])),
        provideHttpClientTesting(),
        provideRouter([]),
        materialDefaults,
        { provide: Session, useValue: { me, holds, mayCall } },
        { provide: LiveCounts, useValue: { lotChanges: this.lotChanges } },
      ],
    });
    this.http = TestBed.inject(HttpTestingController);
    this.fixture = TestBed.createComponent(BenchPage, { bindings: [inputBinding('id', () => '12')] });
    this.page = this.fixture.nativeElement as HTMLElement;
    TestBed.tick();
  }

  /** The bench of a lot, open. */
  static async open(bench: Partial<Bench> = {}, role: Role = 'inspector'): Promise<BenchUnderTest> {
    const opened = new BenchUnderTest(role);
    await opened.load(benchReply(bench));
    return opened;
  }

  async load(bench: Bench = benchReply()): Promise<void> {
    this.http.expectOne(`${LOT}/bench`).flush(bench);
    await this.fixture.whenStable();
  }

  async refuse(status: number, title: string): Promise<void> {
    refuseWith(this.http.expectOne(`${LOT}/bench`), status, 'x', title);
    await this.fixture.whenStable();
  }

  cell(): HTMLElement {
    return this.page.querySelector<HTMLElement>('qr-grid-row.current .focused') ?? this.page;
  }

  async press(key: string, on: Element = this.cell(), held: KeyboardEventInit = {}): Promise<void> {
    on.dispatchEvent(new KeyboardEvent('keydown', { key, bubbles: true, cancelable: true, ...held }));
    await this.fixture.whenStable();
  }

  async typeInto(field: string, ...texts: string[]): Promise<HTMLInputElement> {
    const fields = [...this.page.querySelectorAll<HTMLInputElement>(field)];
    for (const [index, text] of texts.entries()) {
      const box = fields[index];
      if (box === undefined) throw new Error(`There is no field ${field}.`);
      box.value = text;
      box.dispatchEvent(new Event('input', { bubbles: true }));
      await this.fixture.whenStable();
    }
    const [first] = fields;
    if (first === undefined) throw new Error(`There is no field ${field}.`);
    return first;
  }

  async click(text: string, within: ParentNode = this.page): Promise<void> {
    const button = [...within.querySelectorAll('button')].find((each) => each.textContent?.includes(text));
    if (button === undefined) throw new Error(`There is no button ${text}.`);
    button.click();
    await this.fixture.whenStable();
  }

  async focusOn(unit: number, column: string): Promise<void> {
    const place = this.page.querySelector(`qr-grid-row:nth-of-type(${unit}) [data-column="${column}"]`);
    place?.dispatchEvent(new MouseEvent('mousedown', { bubbles: true }));
    await this.fixture.whenStable();
  }

  cellText(unit: number, column: string): string {
    const cell = this.page.querySelector(`qr-grid-row:nth-of-type(${unit}) [data-column="${column}"]`);
    return cell?.textContent?.trim() ?? '';
  }

  panel(): string {
    return plain(this.page.querySelector('qr-reading-panel')?.textContent);
  }

  /** A dialog once it is loaded and drawn. */
  async dialog(selector: string): Promise<HTMLElement> {
    const dialog = await vi.waitFor(() => {
      const found = document.querySelector<HTMLElement>(selector);
      if (found === null) throw new Error(`There is no ${selector} yet.`);
      return found;
    });
    await this.fixture.whenStable();
    return dialog;
  }

  /** Readings on their way to the server, the requests themselves. */
  sent(): TestRequest[] {
    return this.http.match(({ method, url }) => method === 'PUT' && url.includes('/readings/'));
  }

  /** The bodies of readings on their way to the server. */
  kept(): ReadingBody[] {
    return this.sent().map(({ request }) => request.body as ReadingBody);
  }

  /** The server refuses a reading, upon which the page reads the lot again. */
  async refuseReading(
    request: TestRequest | undefined,
    refusal: { status: number; code: string; title: string },
    bench: Bench = benchReply(),
  ): Promise<void> {
    if (request === undefined) throw new Error('No reading was sent.');
    refuseWith(request, refusal.status, refusal.code, refusal.title);
    const again = await vi.waitFor(() => this.http.expectOne(`${LOT}/bench`));
    again.flush(bench);
    await this.fixture.whenStable();
  }

  /** Somebody else did something at the lot; the page asks what. */
  async change(readings: readonly Reading[], bench: Bench = benchReply()): Promise<void> {
    this.lotChanges.next(12);
    const { lot, version, conditions } = bench;
    const asked = this.http.expectOne(({ url }) => url === `${LOT}/bench/changes`);
    asked.flush({ cursor: '2026-03-12T14:30:00.000Z', lot, version, conditions, readings, units: [] });
    await this.fixture.whenStable();
  }
}

/** The server's acknowledgement of a reading. */
export function acknowledgement(request: TestRequest, worth: number | boolean): Kept {
  const body = request.request.body as ReadingBody;
  const id = request.request.url.split('/').at(-1) ?? '';
  const reading = { ...readingOf(body.unit, body.characteristicKey, worth), id, entry: body.entry };
  return { reading, verdict: 'conforming', unitVerdict: 'not judged', stop: false, lotReason: '' };
}

function refuseWith(request: TestRequest, status: number, code: string, title: string): void {
  request.flush({ type: 'urn:x', title, status, code }, { status, statusText: 'No' });
}

/** Text with its spaces as they are typed. */
export function plain(text: string | null | undefined): string {
  return (text ?? '').replace(/\s+/g, ' ').trim();
}
