import { type Db } from '#db/open-database';
import { instrumentReviews, reviewLots } from '#db/schema/calibrations';
import { record } from '#server/audit/record';
import { type Caller } from '#server/caller';
import { type Context } from '#server/context';
import { Conflict, holdVersion, NotFound } from '#server/problems';
import { type assessReviewLot, type Review } from '#shared/contract/calibrations';
import { and, eq, isNull } from 'drizzle-orm';
import type * as z from 'zod';
import { findReview, findReviewRow, type ReviewRow } from './review-view';

interface Named {
  id: number;
  version: number;
}

/** The review as it stands, open and at the version named. */
function openReviewRow(db: Db, { id, version }: Named): ReviewRow {
  const row = findReviewRow(db, id);
  if (row.closedAt !== null) throw new Conflict('review-closed', `${row.number} is closed; it changes no more.`);
  holdVersion('The review', row.version, version);
  return row;
}

/** Says what the doubt means for one lot. */
export function assessLot(
  { db, clock }: Context,
  caller: Caller,
  named: Named & { lotId: number },
  { effect, note }: z.output<(typeof assessReviewLot)['body']>,
): Review {
  return db.transaction((tx) => {
    const at = clock.now();
    const row = openReviewRow(tx, named);
    const of = and(eq(reviewLots.reviewId, row.id), eq(reviewLots.lotId, named.lotId));
    const before = tx.select().from(reviewLots).where(of).get();
    if (!before) throw new NotFound('This lot of the review');
    tx.update(reviewLots).set({ effect, note, assessedById: caller.id, assessedAt: at.toISOString() }).where(of).run();
    tx.update(instrumentReviews)
      .set({ version: row.version + 1 })
      .where(eq(instrumentReviews.id, row.id))
      .run();
    record(tx, {
      at,
      person: caller,
      action: 'assessed',
      subject: 'review',
      subjectId: row.id,
      before: { lot: named.lotId, effect: before.effect, note: before.note },
      after: { lot: named.lotId, effect, note },
    });
    return findReview(tx, row.id);
  });
}

/** Closes a review of which every lot is assessed; its instrument may then come back into service. */
export function closeReview({ db, clock }: Context, caller: Caller, named: Named, conclusion: string): Review {
  return db.transaction((tx) => {
    const at = clock.now();
    const row = openReviewRow(tx, named);
    const left = tx
      .select({ lotId: reviewLots.lotId })
      .from(reviewLots)
      .where(and(eq(reviewLots.reviewId, row.id), isNull(reviewLots.effect)))
      .all().length;
    if (left > 0)
      throw new Conflict(
        'lots-not-assessed',
        `${left === 1 ? 'One lot is' : `${left} lots are`} not assessed yet; say of each what the doubt means for it.`,
      );
    const closed = { closedAt: at.toISOString(), closedById: caller.id, conclusion };
    tx.update(instrumentReviews)
      .set({ ...closed, version: row.version + 1 })
      .where(eq(instrumentReviews.id, row.id))
      .run();
    const change = { action: 'closed', subject: 'review', subjectId: row.id, after: { conclusion } };
    record(tx, { at, person: caller, ...change });
    return findReview(tx, row.id);
  });
}
