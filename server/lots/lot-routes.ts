import { type Context } from '#server/context';
import { nonconformanceOf } from '#server/nonconformances/nonconformance-queries';
import { Conflict } from '#server/problems';
import { serve } from '#server/serve';
import * as contract from '#shared/contract/lots';
import { type Router } from 'express';
import { bookLot, cancelLot, correctLot } from './book-lot';
import { drawSample } from './draw-sample';
import { listLots } from './lot-list';
import { pullList, readLot } from './lot-queries';
import { provisionalSampling } from './lot-sampling-queries';

export function lotRoutes(router: Router, context: Context): void {
  const { db } = context;
  serve(router, contract.listLots, ({ query }) => listLots(db, query));
  serve(router, contract.bookLot, ({ caller, body }) => bookLot(context, caller, body));
  serve(router, contract.readLot, ({ caller, params }) => ({
    ...readLot(db, params.id),
    nonconformance: nonconformanceOf(db, caller, params.id),
  }));
  serve(router, contract.correctLot, ({ caller, params, version, body }) =>
    correctLot(context, caller, params.id, version, body),
  );
  serve(router, contract.cancelLot, ({ caller, params, version, body }) =>
    cancelLot(context, caller, params.id, version, body.reason),
  );
  serve(router, contract.previewSampling, ({ query }) => {
    const sampling = provisionalSampling(db, query.partId, query.lotSize);
    if (!sampling) throw new Conflict('no-effective-plan', 'The part has no effective plan.');
    return sampling;
  });
  serve(router, contract.drawSample, ({ caller, params, version }) => drawSample(context, caller, params.id, version));
  serve(router, contract.readPullList, ({ params }) => pullList(db, params.id));
}
