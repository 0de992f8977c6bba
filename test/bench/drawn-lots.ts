import { planCharacteristics } from '#db/schema/plans';
import { type Caller } from '#server/caller';
import { type Context } from '#server/context';
import { bookLot } from '#server/lots/book-lot';
import { drawSample } from '#server/lots/draw-sample';
import { type RevisionBody } from '#shared/contract/plans';
import { eq } from 'drizzle-orm';
import { booking } from '../support/bench-fixtures';
import { buildInstrument, buildPart, buildPlan, buildSupplier } from '../support/builders';

/** What readings are taken of and with. */
export interface Planned {
  partId: number;
  supplierId: number;
  revisionId: number;
  instrumentId: number;
  /** Rows of the plan's characteristics. */
  characteristicIds: ReadonlyMap<string, number>;
}

/** A part with its effective plan, its supplier and the one instrument it needs. */
export function planned({ db }: Context, authorId: number, content: RevisionBody): Planned {
  const { id: partId } = buildPart(db);
  const { id: supplierId } = buildSupplier(db);
  const { id: instrumentId } = buildInstrument(db, { calibrationDue: '2999-12-31' });
  const { revisionId } = buildPlan(db, { partId, authorId, content });
  const rows = db.select().from(planCharacteristics).where(eq(planCharacteristics.revisionId, revisionId)).all();
  const characteristicIds = new Map(rows.map(({ key, id }) => [key, id]));
  return { partId, supplierId, revisionId, instrumentId, characteristicIds };
}

export interface DrawnLot {
  id: number;
  sampleSize: number;
}

/** Books lots in and draws their samples. */
export function drawnLots(
  context: Context,
  caller: Caller,
  references: { partId: number; supplierId: number },
  given: { lots: number; quantity: number },
): DrawnLot[] {
  return Array.from({ length: given.lots }, () => {
    const { id, version } = bookLot(context, caller, booking(references, given.quantity));
    const { sampling } = drawSample(context, caller, id, version);
    if (!sampling) throw new Error('A drawn lot has its sampling.');
    return { id, sampleSize: sampling.sampleSize };
  });
}
