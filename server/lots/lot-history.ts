import { type Db } from '#db/open-database';
import { auditEntries } from '#db/schema/audit';
import { messages } from '#db/schema/mail';
import { nonconformances } from '#db/schema/nonconformances';
import { type Lot } from '#shared/contract/lots';
import { and, desc, eq } from 'drizzle-orm';

type HistoryLine = Lot['history'][number];

/** Actions on a lot as they stand in the audit trail, with what its history says of them. */
export const LOT_ACTIONS = {
  booked: { what: 'Lot booked in', tone: 'plain' },
  corrected: { what: 'Booking corrected', tone: 'plain' },
  cancelled: { what: 'Lot cancelled', tone: 'plain' },
  drawn: { what: 'Sample drawn', tone: 'plain' },
  started: { what: 'Measuring started', tone: 'plain' },
  stopped: { what: 'Rejection number reached', tone: 'rejected' },
  imported: { what: 'Rack file imported', tone: 'plain' },
  submitted: { what: 'Submitted for decision', tone: 'plain' },
  reopened: { what: 'Sent back to the bench', tone: 'plain' },
  accepted: { what: 'Lot released', tone: 'accepted' },
  rejected: { what: 'Lot rejected', tone: 'rejected' },
  held: { what: 'Held by quality', tone: 'hold' },
  'hold-ended': { what: 'Hold ended', tone: 'plain' },
} as const satisfies Record<string, { what: string; tone: HistoryLine['tone'] }>;
export type LotAction = keyof typeof LOT_ACTIONS;

function isLotAction(action: string): action is LotAction {
  return Object.hasOwn(LOT_ACTIONS, action);
}

/** Every lot action is recorded with a `note` in its `after`: the sentence that the history shows. */
function noteOf(after: string | null): string | null {
  const content: unknown = after === null ? null : JSON.parse(after);
  if (typeof content !== 'object' || content === null || !('note' in content)) return null;
  return typeof content.note === 'string' && content.note !== '' ? content.note : null;
}

function noticesOf(db: Db, lotId: number): HistoryLine[] {
  return db
    .select({ sentAt: messages.sentAt, to: messages.recipients })
    .from(messages)
    .innerJoin(nonconformances, eq(nonconformances.id, messages.nonconformanceId))
    .where(and(eq(nonconformances.lotId, lotId), eq(messages.status, 'sent')))
    .all()
    .flatMap(({ sentAt, to }) =>
      sentAt === null
        ? []
        : [{ at: sentAt, person: 'Quietrail', what: 'Notice sent', detail: to.join(', '), tone: 'plain' as const }],
    );
}

/** What happened to a lot, newest first. */
export function historyOf(db: Db, lotId: number): HistoryLine[] {
  const entries = db
    .select()
    .from(auditEntries)
    .where(and(eq(auditEntries.subject, 'lot'), eq(auditEntries.subjectId, String(lotId))))
    .orderBy(desc(auditEntries.id))
    .all();
  const lines = entries.flatMap(({ at, actor, action, after }) => {
    if (!isLotAction(action)) return [];
    const { what, tone } = LOT_ACTIONS[action];
    return [{ at, person: actor, what, detail: noteOf(after), tone }];
  });
  // Sorting is stable: entries of one instant keep the order of the trail.
  return [...noticesOf(db, lotId), ...lines].sort((a, b) => (a.at < b.at ? 1 : a.at > b.at ? -1 : 0));
}
