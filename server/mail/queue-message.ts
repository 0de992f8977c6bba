import { type Db } from '#db/open-database';
import { messages } from '#db/schema/mail';
import { randomUUID } from 'node:crypto';
import { hostname } from 'node:os';

/** A message to be sent once its transaction is committed. */
export interface QueuedMessage {
  /** What it tells of, as "lot rejected". */
  event: string;
  nonconformanceId?: number;
  to: string[];
  subject: string;
  html: string;
  text: string;
  at: Date;
}

/** One address and nothing else: no display name, no list, no comment. */
const ADDRESS = /^[^\s<>(),;:"@\\]+@[^\s<>(),;:"@\\]+$/u;

/** Whether a text would leave its header line, or break the line in a mail program. */
const hasControlCharacter = (text: string) => /\p{Cc}/u.test(text);

function demandSendable(message: QueuedMessage): void {
  if (message.to.length === 0) throw new Error('to: a message needs at least one recipient.');
  for (const address of message.to) {
    if (hasControlCharacter(address) || !ADDRESS.test(address))
      throw new Error(`to: ${JSON.stringify(address)} is not a single e-mail address.`);
  }
  if (message.subject.trim() === '') throw new Error('subject: a message needs a subject.');
  if (hasControlCharacter(message.subject))
    throw new Error(`subject: ${JSON.stringify(message.subject)} is not a single line of text.`);
}

/** All attempts to send a message bear this one id, so a mail program shows a message that came twice once. */
function freshMessageId(): string {
  const host = hostname().replaceAll(/[^A-Za-z0-9.-]/g, '') || 'localhost';
  return `<${randomUUID()}@${host}>`;
}

/**
 * Writes a message to the outbox inside the transaction of its cause; it goes out when that is committed.
 *
 * @returns the id of the message
 * @throws {Error} naming the recipient or subject that cannot be sent
 */
export function queueMessage(db: Db, message: QueuedMessage): number {
  demandSendable(message);
  const at = message.at.toISOString();
  const { id } = db
    .insert(messages)
    .values({
      messageId: freshMessageId(),
      event: message.event,
      nonconformanceId: message.nonconformanceId,
      recipients: [...new Set(message.to)],
      subject: message.subject,
      html: message.html,
      text: message.text,
      status: 'queued',
      queuedAt: at,
      nextAttemptAt: at,
    })
    .returning({ id: messages.id })
    .get();
  return id;
}
