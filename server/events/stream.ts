import { type Database } from '#db/open-database';
import { type Counts, type LotChange } from '#shared/contract/counts';
import { type Response } from 'express';
import { type Clock } from '#server/clock';
import { countStations } from '#server/counts/count-queries';

const DEBOUNCE = 50;
const HEARTBEAT = 15_000;
const MOST_LISTENERS = 500;

interface Listener {
  response: Response;
  /** Whether the person may still listen: asked each time before they are told. */
  mayListen: () => boolean;
  /** The figures it was told last. */
  told: string;
}

/**
 * Sends the line's counts to everybody who looks at it, whenever they change and as a heartbeat, and says which lots
 * changed.
 */
export class Stream {
  private readonly listeners = new Set<Listener>();
  private readonly heartbeat: NodeJS.Timeout;
  private readonly changedLots = new Set<number>();
  private pending: NodeJS.Timeout | undefined;

  constructor(private readonly source: { db: Database; clock: Clock; heartbeat?: number }) {
    this.heartbeat = setInterval(() => this.beat(), source.heartbeat ?? HEARTBEAT);
    this.heartbeat.unref();
  }

  /** Whether one more listener is let in. */
  get hasRoom(): boolean {
    return this.listeners.size < MOST_LISTENERS;
  }

  /** Says that something was changed; many changes in a row are answered once. */
  announce(): void {
    if (this.pending || this.listeners.size === 0) return;
    this.pending = setTimeout(() => {
      this.pending = undefined;
      this.tellChanges();
    }, DEBOUNCE);
    this.pending.unref();
  }

  /** Says that something of a lot was changed; listeners hear its id and ask for what they may read of it. */
  announceLot(lotId: number): void {
    if (this.listeners.size === 0) return;
    this.changedLots.add(lotId);
    this.announce();
  }

  /** Adds a listener, who gets the counts at once; it leaves when its response closes. */
  listen(response: Response, mayListen: () => boolean): void {
    const listener = { response, mayListen, told: '' };
    response.once('close', () => this.listeners.delete(listener));
    response.writeHead(200, { 'content-type': 'text/event-stream', 'x-accel-buffering': 'no' });
    this.listeners.add(listener);
    response.write(countsMessage(listener, this.count()));
  }

  /** Ends every listener's response. */
  close(): void {
    clearInterval(this.heartbeat);
    clearTimeout(this.pending);
    for (const { response } of this.listeners) response.end();
    this.listeners.clear();
  }

  private count(): Counts {
    return countStations(this.source.db, this.source.clock.now());
  }

  private tellChanges(): void {
    const counts = this.count();
    const lots = [...this.changedLots].map((lotId) => message('lot', { lotId } satisfies LotChange)).join('');
    this.changedLots.clear();
    for (const listener of this.listeners) {
      const news = listener.told === figures(counts) ? '' : countsMessage(listener, counts);
      sendOrEnd(listener, news + lots);
    }
  }

  private beat(): void {
    if (this.listeners.size === 0) return;
    const counts = this.count();
    for (const listener of this.listeners) sendOrEnd(listener, countsMessage(listener, counts));
  }
}

function sendOrEnd({ response, mayListen }: Listener, text: string): void {
  if (text === '') return;
  if (mayListen()) response.write(text);
  else response.end();
}

function countsMessage(listener: Listener, counts: Counts): string {
  listener.told = figures(counts);
  return message('counts', counts);
}

function message(event: string, data: unknown): string {
  return `event: ${event}\ndata: ${JSON.stringify(data)}\n\n`;
}

/** The counts without their time, to be compared. */
function figures({ arrivals, bench, decision, released, onHold }: Counts): string {
  return [arrivals, bench, decision, released, onHold].join();
}
