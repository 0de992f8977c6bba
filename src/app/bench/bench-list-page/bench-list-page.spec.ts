import { provideHttpClient, withInterceptors } from '@angular/common/http';
import { HttpTestingController, provideHttpClientTesting } from '@angular/common/http/testing';
import { signal } from '@angular/core';
import { type ComponentFixture, TestBed } from '@angular/core/testing';
import { provideRouter } from '@angular/router';
import { type LotHead } from '#shared/contract/lots';
import { type Role } from '#shared/contract/roles';
import { problemInterceptor } from '../../data/problem-interceptor';
import { Session } from '../../session/session';
import { benchReply } from '../testing/bench-reply';
import { BenchListPage } from './bench-list-page';

const URL = '/api/lots?station=bench';

describe('the list of the bench', () => {
  let fixture: ComponentFixture<BenchListPage>;
  let http: HttpTestingController;
  let page: HTMLElement;

  function open(role: Role = 'inspector'): void {
    const me = signal({ id: 7, name: 'I. Sandvær', roles: [role] });
    const holds = (...roles: Role[]) => roles.includes(role);
    TestBed.configureTestingModule({
      providers: [
        provideHttpClient(withInterceptors([problemInterceptor])),
        provideHttpClientTesting(),
        provideRouter([]),
        { provide: Session, useValue: { me, holds, mayCall: ({ who }: { who: Role[] }) => holds(...who) } },
      ],
    });
    http = TestBed.inject(HttpTestingController);
    fixture = TestBed.createComponent(BenchListPage);
    page = fixture.nativeElement as HTMLElement;
    TestBed.tick();
  }

  async function load(items: LotHead[]): Promise<void> {
    http.expectOne(URL).flush({ items, next: null });
    await fixture.whenStable();
  }

  beforeEach(() => localStorage.clear());

  it('says what to do when nothing is there', async () => {
    open();
    expect(page.querySelector('qr-loading-rows')).not.toBeNull();
    await load([]);
    expect(page.textContent).toContain('Nothing on the bench.');
  });

  it('offers to start a drawn lot and to continue a lot under way, and marks the one to stop', async () => {
    open();
    const { lot } = benchReply();
    await load([
      { ...lot, status: 'drawn' },
      { ...lot, id: 13, number: 'L-26-0432', unitsJudged: 3, stopped: true },
    ]);
    const rows = [...page.querySelectorAll('tbody tr')].map((row) => row.textContent ?? '');
    expect(rows[0]).toContain('Start');
    expect(rows[0]).toContain('Not started');
    expect(rows[1]).toContain('3 of 5');
    expect(rows[1]).toContain('Stop');
    expect(rows[1]).toContain('Continue');
  });

  it('offers only a look to those who do not measure', async () => {
    open('auditor');
    await load([benchReply().lot]);
    expect(page.querySelector('tbody tr')?.textContent).toContain('Look');
  });

  it('says in the server’s words why it did not load', async () => {
    open();
    const stated = { type: 'urn:x', title: 'The database is busy.', status: 500, code: 'x' };
    http.expectOne(URL).flush(stated, { status: 500, statusText: 'Error' });
    await fixture.whenStable();
    expect(page.textContent).toContain('The database is busy.');
  });

  it('says who may when the person may not', async () => {
    open('receiving');
    const stated = { type: 'urn:x', title: 'Not for receiving.', status: 403, code: 'x' };
    http.expectOne(URL).flush(stated, { status: 403, statusText: 'Forbidden' });
    await fixture.whenStable();
    expect(page.querySelector('qr-no-permission')).not.toBeNull();
  });
});
