/** What the owner of a shared stream is told. */
export interface StreamListener {
  message(event: string, data: string): void;
  /** The connection is gone; the stream goes on trying. */
  lost(): void;
  /** Runs before each connection is opened, in the tab that opens it. */
  before(): Promise<void>;
}

type Relayed = { kind: 'message'; event: string; data: string } | { kind: 'lost' };

/** Names the lock of the tab that holds the connection, and the channel by which it passes on what comes. */
const SHARED_NAME = 'quietrail.events';
const RETRY = 3_000;
const LONGEST_RETRY = 60_000;

/**
 * One stream of server-sent events for all tabs of a browser. The tabs elect one by a lock; it holds the connection and
 * passes on what comes. When it closes, the next takes over. Without locks or channels each tab connects for itself.
 */
export class SharedStream {
  private readonly channel: BroadcastChannel | undefined;
  private readonly closing = new AbortController();
  private source: EventSource | undefined;
  private wait = RETRY;

  constructor(
    private readonly address: string,
    private readonly events: readonly string[],
    private readonly listener: StreamListener,
  ) {
    if (typeof EventSource === 'undefined') return;
    if ('locks' in navigator && typeof BroadcastChannel !== 'undefined') {
      this.channel = new BroadcastChannel(SHARED_NAME);
      this.channel.onmessage = ({ data }: MessageEvent<Relayed>) => this.hear(data);
      this.standForElection();
    }
    void this.start();
  }

  close(): void {
    this.closing.abort();
    this.source?.close();
    this.channel?.close();
  }

  private standForElection(): void {
    const held = navigator.locks.request(SHARED_NAME, { signal: this.closing.signal }, () => this.lead());
    // A request that is withdrawn because the tab closes is no fault.
    held.catch(() => undefined);
  }

  /** Holds the connection, and with it the lock, until the stream is closed. */
  private async lead(): Promise<void> {
    // What came between the last tab's end and this one's beginning nobody heard.
    this.pass({ kind: 'lost' });
    this.connect();
    await new Promise<void>((resolve) => this.closing.signal.addEventListener('abort', () => resolve()));
  }

  /** The first state is read in every tab; only tabs without an election connect here. */
  private async start(): Promise<void> {
    await this.listener.before();
    if (this.channel === undefined) this.connect();
  }

  private connect(): void {
    if (this.closing.signal.aborted) return;
    const source = new EventSource(this.address);
    this.source = source;
    source.onopen = () => (this.wait = RETRY);
    for (const event of this.events)
      source.addEventListener(event, ({ data }: MessageEvent<string>) => this.pass({ kind: 'message', event, data }));
    source.onerror = () => {
      source.close();
      this.pass({ kind: 'lost' });
      setTimeout(() => void this.reconnect(), this.wait);
      this.wait = Math.min(this.wait * 2, LONGEST_RETRY);
    };
  }

  private async reconnect(): Promise<void> {
    if (this.closing.signal.aborted) return;
    await this.listener.before();
    this.connect();
  }

  private pass(relayed: Relayed): void {
    this.hear(relayed);
    this.channel?.postMessage(relayed);
  }

  private hear(relayed: Relayed): void {
    if (this.closing.signal.aborted) return;
    if (relayed.kind === 'message') this.listener.message(relayed.event, relayed.data);
    else this.listener.lost();
  }
}
