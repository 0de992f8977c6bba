import { provideHttpClient } from '@angular/common/http';
import { HttpTestingController, provideHttpClientTesting } from '@angular/common/http/testing';
import { TestBed } from '@angular/core/testing';
import { type Counts } from '#shared/contract/counts';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { LiveCounts } from './live-counts';

const COUNTS: Counts = {
  arrivals: 3,
  bench: 1,
  decision: 0,
  released: 4,
  onHold: 0,
  at: '2026-03-12T10:00:00.000Z',
};

/** The connection as the browser would make it; the spec plays the server. */
class PlayedSource extends EventTarget {
  static opened: PlayedSource[] = [];
  onopen: (() => void) | null = null;
  onerror: (() => void) | null = null;

  constructor(readonly address: string) {
    super();
    PlayedSource.opened.push(this);
  }

  close(): void {
    this.onopen = null;
  }

  says(event: string, data: unknown): void {
    this.dispatchEvent(new MessageEvent(event, { data: JSON.stringify(data) }));
  }
}

describe('the live counts', () => {
  let http: HttpTestingController;
  let live: LiveCounts;
  let changes: (number | null)[];

  beforeEach(async () => {
    PlayedSource.opened = [];
    vi.stubGlobal('EventSource', PlayedSource);
    vi.useFakeTimers({ toFake: ['setTimeout', 'clearTimeout'] });
    TestBed.configureTestingModule({ providers: [LiveCounts, provideHttpClient(), provideHttpClientTesting()] });
    http = TestBed.inject(HttpTestingController);
    live = TestBed.inject(LiveCounts);
    changes = [];
    live.lotChanges.subscribe((lotId) => changes.push(lotId));
    live.follow();
    http.expectOne('/api/counts').flush(COUNTS);
    await vi.waitFor(() => expect(PlayedSource.opened).toHaveLength(1));
  });
  afterEach(() => {
    TestBed.resetTestingModule();
    vi.useRealTimers();
    vi.unstubAllGlobals();
  });

  const newest = () => PlayedSource.opened.at(-1) as PlayedSource;

  it('follow what the server says', () => {
    newest().says('counts', { ...COUNTS, arrivals: 5 });
    expect(live.counts()?.arrivals).toBe(5);
  });

  it('pass on which lots somebody changes', () => {
    newest().says('lot', { lotId: 7 });
    newest().says('lot', 'nonsense');
    newest().says('lot', { lotId: 9 });
    expect(changes).toEqual([7, 9]);
  });

  it('say once after a gap that any lot may have changed', async () => {
    newest().onerror?.();
    await vi.advanceTimersByTimeAsync(3_000);
    http.expectOne('/api/counts').flush(COUNTS);
    await vi.waitFor(() => expect(PlayedSource.opened).toHaveLength(2));
    expect(changes).toEqual([]);
    newest().says('counts', COUNTS);
    newest().says('counts', COUNTS);
    expect(changes).toEqual([null]);
  });
});
