import { type Db } from '#db/open-database';
import { record } from '#server/audit/record';
import { type LotAction } from './lot-history';

/** Writes an action on a lot into the audit trail; `note` is the sentence its history shows. */
export function recordLot(
  db: Db,
  change: {
    at: Date;
    person: { id: number; name: string } | null;
    action: LotAction;
    lotId: number;
    note: string;
    before?: unknown;
    after?: Record<string, unknown>;
  },
): void {
  const { at, person, action, lotId, note, before, after } = change;
  record(db, { at, person, action, subject: 'lot', subjectId: lotId, before, after: { ...after, note } });
}
