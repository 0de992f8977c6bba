import * as z from 'zod';
import { byId, endpoint } from './endpoint';
import { id, moment } from './fields';
import { pageOf, pageQuery } from './page';

const READERS = ['auditor', 'admin'] as const;

const messageHead = z.object({
  id,
  messageId: z.string(),
  event: z.string(),
  to: z.array(z.string()),
  subject: z.string(),
  status: z.enum(['queued', 'sent', 'failed']),
  queuedAt: moment,
  sentAt: moment.nullable(),
  attempts: z.int(),
});
export const message = messageHead.extend({
  text: z.string(),
  html: z.string(),
  nextAttemptAt: moment.nullable(),
  tries: z.array(z.object({ at: moment, outcome: z.enum(['sent', 'failed']), detail: z.string() })),
});
export type Message = z.infer<typeof message>;
export type MessageHead = z.infer<typeof messageHead>;

export const listMessages = endpoint({
  method: 'GET',
  path: '/api/mail',
  who: READERS,
  summary: 'The outbox, newest first.',
  query: pageQuery,
  reply: pageOf(messageHead),
});
export const readMessage = endpoint({
  method: 'GET',
  path: '/api/mail/:id',
  who: READERS,
  summary: 'One message with each attempt to send it.',
  params: byId,
  reply: message,
});

/** A message as the local SMTP fake received it. */
export const received = z.object({
  id,
  messageId: z.string(),
  from: z.string(),
  to: z.array(z.string()),
  subject: z.string(),
  receivedAt: moment,
  text: z.string(),
  html: z.string(),
});
export type Received = z.infer<typeof received>;

export const listReceived = endpoint({
  method: 'GET',
  path: '/api/received-mail',
  who: READERS,
  summary: 'What the local SMTP fake has received, newest first; empty when a real server is configured.',
  query: pageQuery,
  reply: pageOf(received.omit({ text: true, html: true })).extend({ fake: z.boolean() }),
});
export const readReceived = endpoint({
  method: 'GET',
  path: '/api/received-mail/:id',
  who: READERS,
  summary: 'One received message.',
  params: byId,
  reply: received,
});
