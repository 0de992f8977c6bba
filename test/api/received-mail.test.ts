import { receivedMessages } from '#db/schema/mail';
import { keepAttempt } from '#server/mail/keep-attempt';
import { queueMessage } from '#server/mail/queue-message';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { testSite, type TestSite } from '../support/test-site';

const AT = new Date('2026-03-12T14:20:00.000Z');

let site: TestSite;
beforeEach(async () => {
  site = await testSite();
});
afterEach(() => site.close());

const queue = (subject: string) =>
  queueMessage(site.db, {
    event: 'lot-rejected',
    to: ['a@omdal.example'],
    subject,
    html: '<b>h</b>',
    text: 't',
    at: AT,
  });

const receive = (subject: string, { db }: TestSite = site) =>
  db
    .insert(receivedMessages)
    .values({
      messageId: '<1@here>',
      sender: 'q@hollowmere.example',
      recipients: ['a@omdal.example'],
      subject,
      html: '<b>h</b>',
      text: 't',
      receivedAt: AT.toISOString(),
    })
    .run();

describe('the outbox on the mail page', () => {
  it('lists messages newest first, page by page', async () => {
    for (const subject of ['one', 'two', 'three']) queue(subject);
    const first = await site.as('admin').get('/api/mail?limit=2').expect(200);
    expect(first.body.items.map((item: { subject: string }) => item.subject)).toEqual(['three', 'two']);
    const second = await site.as('admin').get(`/api/mail?limit=2&after=${first.body.next}`).expect(200);
    expect(second.body).toMatchObject({ items: [{ subject: 'one', attempts: 0, status: 'queued' }], next: null });
  });

  it('shows a message with each attempt and what the server said', async () => {
    const id = queue('one');
    const nextAttemptAt = new Date('2026-03-12T14:21:00.000Z');
    keepAttempt(site.db, id, AT, '451 later', { status: 'queued', nextAttemptAt });
    keepAttempt(site.db, id, AT, '250 taken', { status: 'sent' });
    const { body } = await site.as('auditor').get(`/api/mail/${id}`).expect(200);
    expect(body).toMatchObject({
      status: 'sent',
      attempts: 2,
      html: '<b>h</b>',
      nextAttemptAt: null,
      tries: [
        { outcome: 'failed', detail: '451 later' },
        { outcome: 'sent', detail: '250 taken' },
      ],
    });
  });

  it('does not know a message that is not there, nor a place that is none', async () => {
    const missing = await site.as('admin').get('/api/mail/7').expect(404);
    expect(missing.body.code).toBe('not-found');
    const lost = await site.as('admin').get('/api/mail?after=yesterday').expect(400);
    expect(lost.body.errors).toMatchObject([{ path: ['after'] }]);
  });
});

describe('what the local mail server received', () => {
  it('is listed and read while no other server is configured', async () => {
    receive('Lot rejected');
    const { body } = await site.as('admin').get('/api/received-mail').expect(200);
    expect(body).toMatchObject({ fake: true, next: null, items: [{ subject: 'Lot rejected' }] });
    const read = await site.as('admin').get(`/api/received-mail/${body.items[0].id}`).expect(200);
    expect(read.body).toMatchObject({ from: 'q@hollowmere.example', to: ['a@omdal.example'], text: 't' });
  });

  it('is not shown when mail goes to a real server', async () => {
    const real = await testSite({ smtpUrl: 'smtp://mail.hollowmere.example' });
    receive('Lot rejected', real);
    const { body } = await real.as('admin').get('/api/received-mail').expect(200);
    expect(body).toEqual({ fake: false, items: [], next: null });
    real.close();
  });
});
