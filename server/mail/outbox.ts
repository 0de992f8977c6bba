import { type Database } from '#db/open-database';
import { type Clock } from '#server/clock';
import { type Logger } from 'pino';
import { countAttempts, type DueMessage, dueMessages, nextAttempt } from './due-messages';
import { type AttemptEnd, keepAttempt } from './keep-attempt';
import { MOST_ATTEMPTS, retryDelay } from './retry-delay';
import { type Delivery, type MailTransport } from './transport';

/** Sends what the outbox table holds. */
export interface Outbox {
  /** Says that a message was committed; it is sent soon. */
  wake(): void;
  /** Stops sending; what was on its way and did not end in time is sent again, under its Message-ID, at the next start. */
  close(): Promise<void>;
  /** Resolves when nothing is due and nothing is on its way. */
  idle(): Promise<void>;
}

export interface OutboxNeeds {
  db: Database;
  clock: Clock;
  log: Logger;
  transport: MailTransport;
  /** The sender of every message, as "Name <address>". */
  from: string;
}

/** Sessions with the mail server at one time. */
const MOST_AT_ONCE = 5;
/** Bounds of the pause between two looks at the table, in milliseconds. */
const SHORTEST_PAUSE = 1_000;
const LONGEST_PAUSE = 60_000;
/** How long closing waits for letters on their way, in milliseconds. */
const CLOSING_PATIENCE = 3_000;

class SendingOutbox implements Outbox {
  private readonly onTheirWay = new Map<number, Promise<void>>();
  /** Outcomes that could not be written yet; their messages are not sent again meanwhile. */
  private readonly unwritten = new Map<number, () => void>();
  /** Recipients who have a message already while others are tried again; lost at a stop, when all get it again. */
  private readonly taken = new Map<number, Set<string>>();
  private idlers: (() => void)[] = [];
  private pause: NodeJS.Timeout | undefined;
  private woken: NodeJS.Immediate | undefined;
  private closed = false;

  constructor(private readonly needs: OutboxNeeds) {
    this.wake();
  }

  wake(): void {
    if (this.closed) return;
    // Not at once: the caller may still be inside its transaction.
    this.woken ??= setImmediate(() => {
      this.woken = undefined;
      this.sendDue();
    });
  }

  idle(): Promise<void> {
    return new Promise((resolve) => {
      if (this.closed) {
        resolve();
        return;
      }
      this.idlers.push(resolve);
      this.wake();
    });
  }

  async close(): Promise<void> {
    this.closed = true;
    clearImmediate(this.woken);
    clearTimeout(this.pause);
    let patience: NodeJS.Timeout | undefined;
    await Promise.race([
      Promise.all(this.onTheirWay.values()),
      new Promise((resolve) => (patience = setTimeout(resolve, CLOSING_PATIENCE))),
    ]);
    clearTimeout(patience);
    this.onTheirWay.clear();
    this.needs.transport.close();
    this.tellIdlers();
  }

  private sendDue(): void {
    if (this.closed) return;
    try {
      this.writeUnwritten();
      this.startDue();
      if (this.onTheirWay.size === 0) this.tellIdlers();
      this.sleepUntil(nextAttempt(this.needs.db, this.busy()));
    } catch (error) {
      this.needs.log.error({ err: error }, 'the outbox cannot use the database');
      this.sleepUntil(undefined);
    }
  }

  private startDue(): void {
    const { db, clock } = this.needs;
    const free = MOST_AT_ONCE - this.onTheirWay.size;
    if (free === 0) return;
    for (const message of dueMessages(db, clock.now(), this.busy(), free)) {
      const sending = this.send(message).finally(() => {
        this.onTheirWay.delete(message.id);
        this.wake();
      });
      this.onTheirWay.set(message.id, sending);
    }
  }

  private async send(message: DueMessage): Promise<void> {
    const { transport, from } = this.needs;
    const had = this.taken.get(message.id) ?? new Set<string>();
    const waiting = message.recipients.filter((recipient) => !had.has(recipient));
    const letter = { ...message, from, to: message.recipients, date: new Date(message.queuedAt) };
    const delivery = await transport.send(letter, waiting);
    this.taken.set(message.id, new Set([...had, ...delivery.taken]));
    // Closing lets go of letters that take too long; the database may be closed by then.
    if (!this.onTheirWay.has(message.id)) return;
    this.unwritten.set(message.id, () => this.keep(message, delivery));
    this.writeUnwritten();
  }

  private keep(message: DueMessage, delivery: Delivery): void {
    const { db, clock, log } = this.needs;
    const now = clock.now();
    const end = this.endOf(message, delivery, countAttempts(db, message.id) + 1, now);
    keepAttempt(db, message.id, now, delivery.words, end);
    if (end.status !== 'queued') this.taken.delete(message.id);
    if (end.status !== 'sent')
      log.warn({ message: message.id, words: delivery.words, ...end }, 'a message was not sent');
  }

  private endOf(message: DueMessage, delivery: Delivery, attempts: number, now: Date): AttemptEnd {
    const had = this.taken.get(message.id);
    if (message.recipients.every((recipient) => had?.has(recipient))) return { status: 'sent' };
    if (!delivery.worthRetrying || attempts >= MOST_ATTEMPTS) return { status: 'failed' };
    return { status: 'queued', nextAttemptAt: new Date(now.getTime() + retryDelay(attempts, Math.random())) };
  }

  /** A disk that is full now may have room in a minute: an outcome is kept until it is written. */
  private writeUnwritten(): void {
    for (const [id, write] of this.unwritten) {
      try {
        write();
        this.unwritten.delete(id);
      } catch (error) {
        this.needs.log.error({ err: error, message: id }, 'the outcome of a message could not be written');
        return;
      }
    }
  }

  private busy(): number[] {
    return [...this.onTheirWay.keys(), ...this.unwritten.keys()];
  }

  private sleepUntil(instant: Date | undefined): void {
    clearTimeout(this.pause);
    const wait = instant ? instant.getTime() - this.needs.clock.now().getTime() : LONGEST_PAUSE;
    this.pause = setTimeout(() => this.wake(), Math.min(Math.max(wait, SHORTEST_PAUSE), LONGEST_PAUSE));
    this.pause.unref();
  }

  private tellIdlers(): void {
    for (const tell of this.idlers.splice(0)) tell();
  }
}

/** Starts to send: what is due now, what is queued later, and what an earlier run left behind. */
export function startOutbox(needs: OutboxNeeds): Outbox {
  return new SendingOutbox(needs);
}
