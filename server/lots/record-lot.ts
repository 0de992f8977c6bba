import { type Db } from '#db/open-database';
import { record } from '#server/audit/record';
import { type LotAction } from './lot-history';

/** Writes an action on a lot into the audit trail; `note` is the sentence its history shows. */
export function recordLot(
  db: Db,
  change: {
    at: Date;
    person: { id: number; name: string } | null;
    /** Who acted when it was no person. */
    actor?: string;
    action: LotAction;
    lotId: number;
    note: string;
    before?: unknown;
    after?: Record<string, unknown>;
  },
): void {
  const { lotId, note, after, ...rest } = change;
  record(db, { ...rest, subject: 'lot', subjectId: lotId, after: { ...after, note } });
}
