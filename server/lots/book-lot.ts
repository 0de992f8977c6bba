import { type Db } from '#db/open-database';
import { lots } from '#db/schema/lots';
import { parts } from '#db/schema/parts';
import { suppliers } from '#db/schema/suppliers';
import { type Caller } from '#server/caller';
import { type Context } from '#server/context';
import { nextNumber } from '#server/numbers/next-number';
import { Conflict, holdVersion, Refused } from '#server/problems';
import { type Lot, type LotBody } from '#shared/contract/lots';
import { type Fault } from '#shared/contract/problem';
import { formatNumber } from '#shared/quantities/format-number';
import { eq } from 'drizzle-orm';
import { readLot } from './lot-queries';
import { findLot } from './lot-rows';
import { recordLot } from './record-lot';

/** A lot names an active part and an active supplier; a correction may keep one that was retired meanwhile. */
function holdReferences(db: Db, body: LotBody, kept?: { partId: number; supplierId: number }): void {
  const faults: Fault[] = [];
  const part = db.select({ active: parts.active }).from(parts).where(eq(parts.id, body.partId)).get();
  if (!part?.active && body.partId !== kept?.partId)
    faults.push({ path: ['partId'], message: 'Choose a part that is in use.' });
  const supplier = db
    .select({ active: suppliers.active })
    .from(suppliers)
    .where(eq(suppliers.id, body.supplierId))
    .get();
  if (!supplier?.active && body.supplierId !== kept?.supplierId)
    faults.push({ path: ['supplierId'], message: 'Choose a supplier that is in use.' });
  if (faults.length > 0) throw new Refused('lot-refused', 'The lot cannot be booked in like this.', faults);
}

/** Books a delivered lot in; it stands at arrivals from now on. */
export function bookLot(context: Context, caller: Caller, body: LotBody): Lot {
  const at = context.clock.now();
  return context.db.transaction((tx) => {
    holdReferences(tx, body);
    const number = nextNumber(tx, 'L', at.getUTCFullYear());
    const { id } = tx
      .insert(lots)
      .values({ ...body, number, status: 'arrived', arrivedAt: at.toISOString(), bookedById: caller.id })
      .returning({ id: lots.id })
      .get();
    const note = `${formatNumber(body.countedQuantity, 0)} counted, ${formatNumber(body.statedQuantity, 0)} stated`;
    recordLot(tx, { at, person: caller, action: 'booked', lotId: id, note, after: { number, ...body } });
    return readLot(tx, id);
  });
}

function arrivedLot(db: Db, id: number, version: number) {
  const { lot } = findLot(db, id);
  holdVersion(`Lot ${lot.number}`, lot.version, version);
  if (lot.status !== 'arrived')
    throw new Conflict(
      'lot-drawn-already',
      `Lot ${lot.number} can no longer be changed: its sample is drawn or it is cancelled.`,
    );
  return lot;
}

/** Corrects a lot before its sample is drawn. */
export function correctLot(context: Context, caller: Caller, id: number, version: number, body: LotBody): Lot {
  return context.db.transaction((tx) => {
    const lot = arrivedLot(tx, id, version);
    holdReferences(tx, body, lot);
    tx.update(lots)
      .set({ ...body, version: lot.version + 1 })
      .where(eq(lots.id, id))
      .run();
    const before = Object.fromEntries(Object.keys(body).map((key) => [key, lot[key as keyof LotBody]]));
    recordLot(tx, {
      at: context.clock.now(),
      person: caller,
      action: 'corrected',
      lotId: id,
      note: '',
      before,
      after: { ...body },
    });
    return readLot(tx, id);
  });
}

/** Cancels a lot before its sample is drawn. */
export function cancelLot(context: Context, caller: Caller, id: number, version: number, reason: string): Lot {
  return context.db.transaction((tx) => {
    const lot = arrivedLot(tx, id, version);
    tx.update(lots)
      .set({ status: 'cancelled', cancelReason: reason, version: lot.version + 1 })
      .where(eq(lots.id, id))
      .run();
    recordLot(tx, { at: context.clock.now(), person: caller, action: 'cancelled', lotId: id, note: reason });
    return readLot(tx, id);
  });
}
