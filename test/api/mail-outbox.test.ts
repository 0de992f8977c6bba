import { openDatabase, type Database } from '#db/open-database';
import { messageAttempts, messages, receivedMessages } from '#db/schema/mail';
import { startOutbox, type Outbox } from '#server/mail/outbox';
import { queueMessage } from '#server/mail/queue-message';
import { retryDelay } from '#server/mail/retry-delay';
import { startSmtpFake, type SmtpFake } from '#server/mail/smtp-fake';
import { smtpTransport, type MailTransport } from '#server/mail/transport';
import { once } from 'node:events';
import { createServer, type AddressInfo, type Server } from 'node:net';
import path from 'node:path';
import { pino } from 'pino';
import { SMTPServer } from 'smtp-server';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';

const ROOT = path.resolve(import.meta.dirname, '../..');
const FROM = 'Quietrail <quietrail@hollowmere.example>';
const log = pino({ level: 'silent' });

let db: Database;
let now: Date;
const clock = { now: () => now };
const endings: (() => Promise<void> | void)[] = [];

beforeEach(() => {
  db = openDatabase(':memory:', ROOT);
  now = new Date('2026-03-12T14:20:00.000Z');
});
afterEach(async () => {
  for (const end of endings.splice(0).reverse()) await end();
});

async function fake(): Promise<SmtpFake> {
  const started = await startSmtpFake({ db, clock, log });
  endings.push(() => started.close());
  return started;
}

function outbox(transport: MailTransport): Outbox {
  const started = startOutbox({ db, clock, log, transport, from: FROM });
  endings.push(() => started.close());
  return started;
}

/** A mail server that refuses recipients as told; it keeps what it takes in memory. */
async function pickyServer(refusals: Record<string, { code: number; words: string }>) {
  const envelopes: string[][] = [];
  const server = new SMTPServer({
    disabledCommands: ['AUTH', 'STARTTLS'],
    disableReverseLookup: true,
    closeTimeout: 100,
    onRcptTo({ address }, _session, callback) {
      const refusal = refusals[address];
      callback(refusal ? Object.assign(new Error(refusal.words), { responseCode: refusal.code }) : null);
    },
    onData(stream, session, callback) {
      envelopes.push(session.envelope.rcptTo.map((recipient) => recipient.address));
      stream.resume().on('end', () => callback(null, 'taken'));
    },
  });
  const listener = server.listen(0, '127.0.0.1');
  await once(listener, 'listening');
  endings.push(() => new Promise((resolve) => server.close(() => resolve())));
  return { url: `smtp://127.0.0.1:${(listener.address() as AddressInfo).port}`, envelopes };
}

function queue(more: Partial<Parameters<typeof queueMessage>[1]> = {}): number {
  return queueMessage(db, {
    event: 'lot-rejected',
    to: ['engineering@hollowmere.example'],
    subject: 'Lot L-26-0412 rejected [NC-26-031]',
    html: '<p>Rejected: 4 units of 125 &gt; limit, µF and Ω</p>',
    text: 'Rejected: 4 units of 125, µF and Ω',
    at: now,
    ...more,
  });
}

const messageRow = () => db.select().from(messages).get();
const attempts = () => db.select().from(messageAttempts).all();
const received = () => db.select().from(receivedMessages).all();

describe('what may be queued', () => {
  it('gives every message an id of its own and makes it due at once', () => {
    queue();
    queue();
    const [first, second] = db.select().from(messages).all();
    expect(first?.messageId).toMatch(/^<[0-9a-f-]{36}@[A-Za-z0-9.-]+>$/);
    expect(first?.messageId).not.toBe(second?.messageId);
    expect(first).toMatchObject({ status: 'queued', queuedAt: now.toISOString(), nextAttemptAt: now.toISOString() });
  });

  it('is undone with the transaction it belongs to', () => {
    expect(() =>
      db.transaction((tx) => {
        queueMessage(tx, { event: 'e', to: ['a@omdal.example'], subject: 's', html: '', text: '', at: now });
        throw new Error('the decision failed');
      }),
    ).toThrow('the decision failed');
    expect(messageRow()).toBeUndefined();
  });

  it.each([
    ['a second header in the subject', { subject: 'Lot rejected\r\nBcc: thief@elsewhere.example' }, /subject/],
    ['an empty subject', { subject: ' ' }, /subject/],
    ['a second header in an address', { to: ['a@omdal.example\nBcc: thief@elsewhere.example'] }, /to: "a@omdal/],
    ['two addresses in one', { to: ['a@omdal.example,b@omdal.example'] }, /to: /],
    ['an address with a name', { to: ['Anna <a@omdal.example>'] }, /to: /],
    ['no recipient', { to: [] }, /to: /],
  ])('refuses %s', (_what, wrong, named) => {
    expect(() => queue(wrong)).toThrow(named);
    expect(messageRow()).toBeUndefined();
  });

  it('writes to a person once who is listed twice', () => {
    queue({ to: ['a@omdal.example', 'a@omdal.example'] });
    expect(messageRow()?.recipients).toEqual(['a@omdal.example']);
  });
});

describe('sending', () => {
  it('delivers a queued message once, with its id and both bodies', async () => {
    const box = outbox(smtpTransport((await fake()).url));
    queue({ to: ['engineering@hollowmere.example', 'design@hollowmere.example'] });
    await box.idle();
    expect(received()).toHaveLength(1);
    expect(received()[0]).toMatchObject({
      messageId: messageRow()?.messageId,
      recipients: ['engineering@hollowmere.example', 'design@hollowmere.example'],
      subject: 'Lot L-26-0412 rejected [NC-26-031]',
      receivedAt: now.toISOString(),
    });
    expect(received()[0]?.sender).toContain('quietrail@hollowmere.example');
    expect(received()[0]?.html.trim()).toBe('<p>Rejected: 4 units of 125 &gt; limit, µF and Ω</p>');
    expect(received()[0]?.text.trim()).toBe('Rejected: 4 units of 125, µF and Ω');
    expect(messageRow()).toMatchObject({ status: 'sent', sentAt: now.toISOString(), nextAttemptAt: null });
    expect(attempts()).toMatchObject([{ outcome: 'sent' }]);
  });

  it('sends many messages, each once', async () => {
    const box = outbox(smtpTransport((await fake()).url));
    for (let nth = 1; nth <= 23; nth++) queue({ subject: `Lot ${nth}` });
    await box.idle();
    expect(new Set(received().map((message) => message.subject)).size).toBe(23);
    expect(received()).toHaveLength(23);
  });

  it('sends at the start what an earlier run left queued', async () => {
    queue();
    const box = outbox(smtpTransport((await fake()).url));
    await box.idle();
    expect(received()).toHaveLength(1);
  });

  it('delivers once when the server was down and came back', async () => {
    const gone = await pickyServer({});
    for (const end of endings.splice(0)) await end();
    const transport = smtpTransport(gone.url);
    const down = outbox(transport);
    queue();
    await down.idle();
    expect(messageRow()).toMatchObject({ status: 'queued', sentAt: null });
    expect(attempts()).toMatchObject([{ outcome: 'failed' }]);
    expect(attempts()[0]?.detail).toContain('ECONNREFUSED');
    await down.close();

    now = new Date(messageRow()?.nextAttemptAt ?? '');
    const up = outbox(smtpTransport((await fake()).url));
    await up.idle();
    expect(received().map((message) => message.messageId)).toEqual([messageRow()?.messageId]);
    expect(messageRow()?.status).toBe('sent');
    expect(attempts().map((attempt) => attempt.outcome)).toEqual(['failed', 'sent']);
  });

  it('does not try again before the pause is over', async () => {
    const picky = await pickyServer({ 'engineering@hollowmere.example': { code: 451, words: 'greylisted' } });
    const box = outbox(smtpTransport(picky.url));
    queue();
    await box.idle();
    await box.idle();
    expect(attempts()).toHaveLength(1);
    expect(messageRow()?.status).toBe('queued');
    const pause = new Date(messageRow()?.nextAttemptAt ?? '').getTime() - now.getTime();
    expect(pause).toBeGreaterThanOrEqual(60_000);
    expect(pause).toBeLessThanOrEqual(75_000);
  });

  it('fails at once, with the words of the server, when the recipient is refused for good', async () => {
    const picky = await pickyServer({
      'engineering@hollowmere.example': { code: 550, words: 'no mailbox of this name' },
    });
    const box = outbox(smtpTransport(picky.url));
    queue();
    await box.idle();
    expect(messageRow()).toMatchObject({ status: 'failed', nextAttemptAt: null, sentAt: null });
    expect(attempts()).toMatchObject([{ outcome: 'failed' }]);
    expect(attempts()[0]?.detail).toContain('550 no mailbox of this name');
  });

  it('tries again only for the recipients who have not got it', async () => {
    const refusals: Record<string, { code: number; words: string }> = {
      'design@hollowmere.example': { code: 451, words: 'come back later' },
    };
    const picky = await pickyServer(refusals);
    const box = outbox(smtpTransport(picky.url));
    queue({ to: ['engineering@hollowmere.example', 'design@hollowmere.example'] });
    await box.idle();
    expect(messageRow()?.status).toBe('queued');
    expect(attempts()[0]?.detail).toContain('design@hollowmere.example: 451 come back later');

    delete refusals['design@hollowmere.example'];
    now = new Date(messageRow()?.nextAttemptAt ?? '');
    await box.idle();
    expect(picky.envelopes).toEqual([['engineering@hollowmere.example'], ['design@hollowmere.example']]);
    expect(messageRow()?.status).toBe('sent');
  });

  it('says who got it and who did not when one of two is refused for good', async () => {
    const picky = await pickyServer({ 'design@hollowmere.example': { code: 550, words: 'left the company' } });
    const box = outbox(smtpTransport(picky.url));
    queue({ to: ['engineering@hollowmere.example', 'design@hollowmere.example'] });
    await box.idle();
    expect(messageRow()?.status).toBe('failed');
    expect(attempts()[0]?.detail).toBe(
      'Taken for engineering@hollowmere.example. Refused for design@hollowmere.example: 550 left the company',
    );
  });

  it('gives up after twelve attempts', async () => {
    const picky = await pickyServer({ 'engineering@hollowmere.example': { code: 451, words: 'not now' } });
    const box = outbox(smtpTransport(picky.url));
    queue();
    await box.idle();
    while (messageRow()?.status === 'queued') {
      now = new Date(messageRow()?.nextAttemptAt ?? '');
      await box.idle();
    }
    expect(attempts()).toHaveLength(12);
    expect(messageRow()?.status).toBe('failed');
  });

  it('lets go of a server that takes the call and says nothing', async () => {
    const silent: Server = createServer((socket) => socket.on('error', () => socket.destroy())).listen(0, '127.0.0.1');
    await once(silent, 'listening');
    endings.push(() => new Promise((resolve) => silent.close(() => resolve())));
    const box = outbox(smtpTransport(`smtp://127.0.0.1:${(silent.address() as AddressInfo).port}`, 150));
    queue();
    await box.idle();
    expect(messageRow()?.status).toBe('queued');
    expect(attempts()).toMatchObject([{ outcome: 'failed' }]);
  });

  it('sends no message again while the database cannot take its outcome, and keeps the outcome later', async () => {
    const box = outbox(smtpTransport((await fake()).url));
    db.$client.exec('ALTER TABLE message_attempts RENAME TO message_attempts_away');
    queue();
    await box.idle();
    await box.idle();
    expect(received()).toHaveLength(1);
    expect(messageRow()?.status).toBe('queued');
    db.$client.exec('ALTER TABLE message_attempts_away RENAME TO message_attempts');
    await box.idle();
    expect(received()).toHaveLength(1);
    expect(messageRow()?.status).toBe('sent');
  });
});

describe('the pause between attempts', () => {
  it('doubles from a minute to four hours', () => {
    const minutes = [1, 2, 3, 7, 8, 9, 10, 12].map((failures) => retryDelay(failures, 0) / 60_000);
    expect(minutes).toEqual([1, 2, 4, 64, 128, 192, 192, 192]);
    expect(retryDelay(12, 1)).toBe(240 * 60_000);
    expect(retryDelay(1, 1)).toBe(75_000);
  });
});
