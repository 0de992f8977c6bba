import { type Db } from '#db/open-database';
import { messageAttempts, messages } from '#db/schema/mail';
import { eq } from 'drizzle-orm';

/** The end of one attempt: sent, to be tried again at an instant, or given up. */
export type AttemptEnd = { status: 'sent' } | { status: 'queued'; nextAttemptAt: Date } | { status: 'failed' };

const LONGEST_DETAIL = 1000;

/** Writes an attempt down and moves its message on, both or neither. */
export function keepAttempt(db: Db, messageId: number, at: Date, words: string, end: AttemptEnd): void {
  const moment = at.toISOString();
  db.transaction((tx) => {
    tx.insert(messageAttempts)
      .values({
        messageId,
        at: moment,
        outcome: end.status === 'sent' ? 'sent' : 'failed',
        detail: words.slice(0, LONGEST_DETAIL),
      })
      .run();
    tx.update(messages)
      .set({
        status: end.status,
        sentAt: end.status === 'sent' ? moment : null,
        nextAttemptAt: end.status === 'queued' ? end.nextAttemptAt.toISOString() : null,
      })
      .where(eq(messages.id, messageId))
      .run();
  });
}
