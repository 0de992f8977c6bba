import { provideHttpClient, withInterceptors } from '@angular/common/http';
import { HttpTestingController, provideHttpClientTesting, type TestRequest } from '@angular/common/http/testing';
import { signal } from '@angular/core';
import { TestBed } from '@angular/core/testing';
import { type ReadingBody } from '#shared/contract/bench';
import { problemInterceptor } from '../../data/problem-interceptor';
import { Session } from '../../session/session';
import { readingOf } from '../testing/bench-reply';
import { type BenchAct } from './bench-act';
import { ReadingQueue } from './reading-queue';

const me = signal<{ id: number } | null>({ id: 7 });

function act(unit: number): BenchAct & { kind: 'reading' } {
  const body: ReadingBody = {
    unit,
    characteristicKey: 'no_load',
    entry: { kind: 'direct', text: '17.2', decimalComma: false },
    instrumentId: 5,
    rangeId: null,
    question: null,
    note: '',
    repeat: null,
    takenAt: '2026-03-12T14:20:00.000Z',
  };
  return { kind: 'reading', id: crypto.randomUUID(), lotId: 12, unit, body };
}

const settled = () => vi.advanceTimersByTimeAsync(0);
const problem = (status: number, title: string) => ({ type: 'urn:x', title, status, code: 'some-code' });

describe('readings on their way to the server', () => {
  let http: HttpTestingController;

  function queue(): ReadingQueue {
    TestBed.resetTestingModule();
    TestBed.configureTestingModule({
      providers: [
        provideHttpClient(withInterceptors([problemInterceptor])),
        provideHttpClientTesting(),
        { provide: Session, useValue: { me } },
      ],
    });
    http = TestBed.inject(HttpTestingController);
    const made = TestBed.inject(ReadingQueue);
    TestBed.tick();
    return made;
  }

  function sent({ id }: BenchAct): TestRequest {
    return http.expectOne({ method: 'PUT', url: `/api/lots/12/readings/${id}` });
  }

  async function acknowledge(sending: BenchAct): Promise<void> {
    sent(sending).flush({
      reading: { ...readingOf(sending.unit, 'no_load', 17.2), id: sending.id },
      verdict: 'conforming',
      unitVerdict: 'not judged',
      stop: false,
      lotReason: '',
    });
    await settled();
  }

  async function loseConnection(sending: BenchAct): Promise<void> {
    sent(sending).error(new ProgressEvent('error'));
    await settled();
  }

  beforeEach(() => {
    vi.useFakeTimers();
    localStorage.clear();
    me.set({ id: 7 });
  });

  afterEach(() => {
    http.verify();
    vi.useRealTimers();
  });

  it('are kept on the device until the server acknowledges them', async () => {
    const readings = queue();
    const first = act(1);
    readings.add(first);
    expect(readings.waiting()).toHaveLength(1);
    expect(localStorage).toHaveLength(1);
    await acknowledge(first);
    expect(readings.waiting()).toHaveLength(0);
    expect(localStorage).toHaveLength(0);
    expect(readings.savedAt()).not.toBeNull();
  });

  it('wait in their order while the server cannot be reached, and are sent once it can, under the ids they had', async () => {
    const readings = queue();
    const [first, second] = [act(1), act(2)];
    readings.add(first);
    readings.add(second);
    await loseConnection(first);
    expect(readings.waiting()).toHaveLength(2);
    expect(readings.failing()).toBe(true);

    await vi.advanceTimersByTimeAsync(1000);
    await loseConnection(first);
    await vi.advanceTimersByTimeAsync(1999);
    http.expectNone(() => true);
    await vi.advanceTimersByTimeAsync(1);
    await acknowledge(first);
    await acknowledge(second);
    expect(readings.waiting()).toHaveLength(0);
    expect(readings.failing()).toBe(false);
  });

  it('survive a reload of the page', async () => {
    const lost = act(3);
    queue().add(lost);
    await loseConnection(lost);

    const readings = queue();
    expect(readings.waiting().map((each) => each.act)).toEqual([lost]);
    await acknowledge(lost);
    expect(localStorage).toHaveLength(0);
  });

  it('are not sent twice at a time, however often sending is asked for', async () => {
    const readings = queue();
    const first = act(1);
    readings.add(first);
    readings.tryNow();
    readings.tryNow();
    await acknowledge(first);
    http.expectNone(() => true);
  });

  it('are shown with the server’s sentence when it refuses them, and are not dropped', async () => {
    const readings = queue();
    const outcomes: string[] = [];
    readings.settled.subscribe(({ outcome }) => outcomes.push(outcome));
    const [refused, next] = [act(1), act(2)];
    readings.add(refused);
    readings.add(next);
    const stated = problem(409, 'Unit 1 has this reading already.');
    sent(refused).flush(stated, { status: 409, statusText: 'Conflict' });
    await settled();
    await acknowledge(next);
    expect(outcomes).toEqual(['refused', 'acknowledged']);
    expect(readings.refused().map(({ refusal }) => refusal)).toEqual(['Unit 1 has this reading already.']);
    expect(localStorage).toHaveLength(1);
    readings.discard(refused.id);
    expect(localStorage).toHaveLength(0);
  });

  it('of other units go on when the server stumbles over one', async () => {
    const readings = queue();
    const [stumbling, later, other] = [act(1), act(1), act(2)];
    [stumbling, later, other].forEach((each) => readings.add(each));
    sent(stumbling).flush(problem(500, 'Something failed.'), { status: 500, statusText: 'Error' });
    await settled();
    await acknowledge(other);
    expect(readings.waiting().map((each) => each.act.id)).toEqual([stumbling.id, later.id]);
    await vi.advanceTimersByTimeAsync(1000);
    await acknowledge(stumbling);
    await acknowledge(later);
  });

  it('of another person wait until that person signs in', async () => {
    const theirs = act(1);
    queue().add(theirs);
    await loseConnection(theirs);

    me.set({ id: 8 });
    const readings = queue();
    await vi.advanceTimersByTimeAsync(60_000);
    http.expectNone(() => true);
    expect(readings.waiting()).toHaveLength(1);
    me.set({ id: 7 });
    TestBed.tick();
    await acknowledge(theirs);
  });

  it('are named as at risk when the browser cannot keep them', async () => {
    const full = vi.spyOn(Storage.prototype, 'setItem').mockImplementation(() => {
      throw new Error('full');
    });
    const readings = queue();
    const first = act(1);
    readings.add(first);
    expect(readings.atRisk()).toBe(true);
    await acknowledge(first);
    expect(readings.atRisk()).toBe(false);
    full.mockRestore();
  });
});
