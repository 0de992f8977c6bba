import { openDatabase, type Database } from '#db/open-database';
import { receivedMessages } from '#db/schema/mail';
import { type Caller } from '#server/caller';
import { readEnvironment } from '#server/environment';
import { keepAttempt } from '#server/mail/keep-attempt';
import { mailRoutes } from '#server/mail/mail-routes';
import { queueMessage } from '#server/mail/queue-message';
import { problemHandler } from '#server/problem-handler';
import { type Role } from '#shared/contract/roles';
import express, { Router } from 'express';
import path from 'node:path';
import { pino } from 'pino';
import request from 'supertest';
import { beforeEach, describe, expect, it } from 'vitest';

const ROOT = path.resolve(import.meta.dirname, '../..');
const AT = new Date('2026-03-12T14:20:00.000Z');

let db: Database;
beforeEach(() => {
  db = openDatabase(':memory:', ROOT);
});

function siteFor(role: Role | undefined, settings: Record<string, string> = {}) {
  const caller: Caller = {
    id: 1,
    name: 'M. Aldoush',
    email: 'm@hollowmere.example',
    stampNumber: null,
    roles: role ? [role] : [],
    sessionId: 's',
  };
  const router = Router();
  mailRoutes(router, { db, environment: readEnvironment(settings, ROOT) });
  const app = express();
  app.use((asked, _answer, next) => {
    if (role) asked.caller = caller;
    next();
  });
  return request(app.use(router).use(problemHandler(pino({ level: 'silent' }))));
}

const queue = (subject: string) =>
  queueMessage(db, { event: 'lot-rejected', to: ['a@omdal.example'], subject, html: '<b>h</b>', text: 't', at: AT });

const receive = (subject: string) =>
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
    const first = await siteFor('admin').get('/api/mail?limit=2').expect(200);
    expect(first.body.items.map((item: { subject: string }) => item.subject)).toEqual(['three', 'two']);
    const second = await siteFor('admin').get(`/api/mail?limit=2&after=${first.body.next}`).expect(200);
    expect(second.body).toMatchObject({ items: [{ subject: 'one', attempts: 0, status: 'queued' }], next: null });
  });

  it('shows a message with each attempt and what the server said', async () => {
    const id = queue('one');
    keepAttempt(db, id, AT, '451 later', { status: 'queued', nextAttemptAt: new Date('2026-03-12T14:21:00.000Z') });
    keepAttempt(db, id, AT, '250 taken', { status: 'sent' });
    const { body } = await siteFor('auditor').get(`/api/mail/${id}`).expect(200);
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
    const missing = await siteFor('admin').get('/api/mail/7').expect(404);
    expect(missing.body.code).toBe('not-found');
    const lost = await siteFor('admin').get('/api/mail?after=yesterday').expect(400);
    expect(lost.body.errors).toMatchObject([{ path: ['after'] }]);
  });

  it('is for auditors and admins', async () => {
    await siteFor('quality').get('/api/mail').expect(403);
    await siteFor(undefined).get('/api/received-mail').expect(401);
  });
});

describe('what the local mail server received', () => {
  it('is listed and read while no other server is configured', async () => {
    receive('Lot rejected');
    const { body } = await siteFor('admin').get('/api/received-mail').expect(200);
    expect(body).toMatchObject({ fake: true, next: null, items: [{ subject: 'Lot rejected' }] });
    const read = await siteFor('admin').get(`/api/received-mail/${body.items[0].id}`).expect(200);
    expect(read.body).toMatchObject({ from: 'q@hollowmere.example', to: ['a@omdal.example'], text: 't' });
  });

  it('is not shown when mail goes to a real server', async () => {
    receive('Lot rejected');
    const real = siteFor('admin', { SMTP_URL: 'smtp://mail.hollowmere.example' });
    const { body } = await real.get('/api/received-mail').expect(200);
    expect(body).toEqual({ fake: false, items: [], next: null });
  });
});
