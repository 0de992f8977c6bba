import { type Db } from '#db/open-database';
import { messageAttempts, messages } from '#db/schema/mail';
import { and, asc, count, eq, lte, notInArray } from 'drizzle-orm';

export type DueMessage = typeof messages.$inferSelect;

/** Messages whose time has come, oldest first, without those already being sent. */
export function dueMessages(db: Db, now: Date, besides: readonly number[], most: number): DueMessage[] {
  return db
    .select()
    .from(messages)
    .where(
      and(
        eq(messages.status, 'queued'),
        lte(messages.nextAttemptAt, now.toISOString()),
        notInArray(messages.id, [...besides]),
      ),
    )
    .orderBy(asc(messages.nextAttemptAt), asc(messages.id))
    .limit(most)
    .all();
}

/** When the next waiting message is to be tried, or undefined when none waits. */
export function nextAttempt(db: Db, besides: readonly number[]): Date | undefined {
  const next = db
    .select({ at: messages.nextAttemptAt })
    .from(messages)
    .where(and(eq(messages.status, 'queued'), notInArray(messages.id, [...besides])))
    .orderBy(asc(messages.nextAttemptAt))
    .limit(1)
    .get();
  return next?.at ? new Date(next.at) : undefined;
}

/** How many attempts a message has had. */
export function countAttempts(db: Db, message: number): number {
  const row = db.select({ had: count() }).from(messageAttempts).where(eq(messageAttempts.messageId, message)).get();
  return row?.had ?? 0;
}
