import { type Db } from '#db/open-database';
import { messageAttempts, messages, receivedMessages } from '#db/schema/mail';
import { type Page, pageAfter, type PageQuery } from '#server/page-after';
import { NotFound } from '#server/problems';
import { type Message, type MessageHead, type Received } from '#shared/contract/mail';
import { asc, count, desc, eq, inArray, lt } from 'drizzle-orm';

const head = {
  id: messages.id,
  messageId: messages.messageId,
  event: messages.event,
  to: messages.recipients,
  subject: messages.subject,
  status: messages.status,
  queuedAt: messages.queuedAt,
  sentAt: messages.sentAt,
};

function attemptCounts(db: Db, ids: number[]): Map<number, number> {
  const counts = db
    .select({ id: messageAttempts.messageId, attempts: count() })
    .from(messageAttempts)
    .where(inArray(messageAttempts.messageId, ids))
    .groupBy(messageAttempts.messageId)
    .all();
  return new Map(counts.map(({ id, attempts }) => [id, attempts]));
}

/** The outbox, newest first. */
export function messagePage(db: Db, query: PageQuery): Page<MessageHead> {
  const page = pageAfter(query, (before, limit) =>
    db
      .select(head)
      .from(messages)
      .where(before === undefined ? undefined : lt(messages.id, before))
      .orderBy(desc(messages.id))
      .limit(limit)
      .all(),
  );
  const attempts = attemptCounts(
    db,
    page.items.map(({ id }) => id),
  );
  return { ...page, items: page.items.map((row) => ({ ...row, attempts: attempts.get(row.id) ?? 0 })) };
}

/** @throws {NotFound} when there is no such message */
export function findMessage(db: Db, id: number): Message {
  const found = db
    .select({ ...head, text: messages.text, html: messages.html, nextAttemptAt: messages.nextAttemptAt })
    .from(messages)
    .where(eq(messages.id, id))
    .get();
  if (!found) throw new NotFound('This message');
  const tries = db
    .select({ at: messageAttempts.at, outcome: messageAttempts.outcome, detail: messageAttempts.detail })
    .from(messageAttempts)
    .where(eq(messageAttempts.messageId, id))
    .orderBy(asc(messageAttempts.id))
    .all();
  return { ...found, tries, attempts: tries.length };
}

const receivedHead = {
  id: receivedMessages.id,
  messageId: receivedMessages.messageId,
  from: receivedMessages.sender,
  to: receivedMessages.recipients,
  subject: receivedMessages.subject,
  receivedAt: receivedMessages.receivedAt,
};

/** What the local mail server received, newest first. */
export function receivedPage(db: Db, query: PageQuery): Page<Omit<Received, 'text' | 'html'>> {
  return pageAfter(query, (before, limit) =>
    db
      .select(receivedHead)
      .from(receivedMessages)
      .where(before === undefined ? undefined : lt(receivedMessages.id, before))
      .orderBy(desc(receivedMessages.id))
      .limit(limit)
      .all(),
  );
}

/** @throws {NotFound} when there is no such message */
export function findReceived(db: Db, id: number): Received {
  const found = db
    .select({ ...receivedHead, text: receivedMessages.text, html: receivedMessages.html })
    .from(receivedMessages)
    .where(eq(receivedMessages.id, id))
    .get();
  if (!found) throw new NotFound('This received message');
  return found;
}
