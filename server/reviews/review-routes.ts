import { type Context } from '#server/context';
import { findLot } from '#server/lots/lot-rows';
import { serve } from '#server/serve';
import * as contract from '#shared/contract/calibrations';
import { type Router } from 'express';
import { assessLot, closeReview } from './assess-review';
import { lotInDoubt } from './lot-in-doubt';
import { findReview, listReviews, readingsInDoubt } from './review-view';

export function reviewRoutes(router: Router, context: Context): void {
  const { db } = context;
  serve(router, contract.listReviews, () => ({ items: listReviews(db) }));
  serve(router, contract.readReview, ({ params }) => findReview(db, params.id));
  serve(router, contract.listDoubtfulReadings, ({ params }) => ({ items: readingsInDoubt(db, params.id, params.lot) }));
  serve(router, contract.listLotDoubts, ({ params }) => ({ items: lotInDoubt(db, findLot(db, params.id).lot.id) }));
  serve(router, contract.assessReviewLot, ({ caller, params, version, body }) =>
    assessLot(context, caller, { id: params.id, version, lotId: params.lot }, body),
  );
  serve(router, contract.closeReview, ({ caller, params, version, body }) =>
    closeReview(context, caller, { id: params.id, version }, body.conclusion),
  );
}
