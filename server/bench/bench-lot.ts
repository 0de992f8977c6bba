import { type Db } from '#db/open-database';
import { findLot, type LotRow } from '#server/lots/lot-rows';
import { Conflict } from '#server/problems';

/** A lot whose readings may be taken now. @throws {Conflict} for a lot that is not at the bench */
export function lotAtBench(db: Db, id: number): LotRow {
  const { lot } = findLot(db, id);
  if (lot.status === 'drawn' || lot.status === 'measuring') return lot;
  const why = {
    arrived: 'its sample is not drawn yet',
    submitted: 'it is submitted for decision',
    released: 'it is released',
    'on-hold': 'it is on hold',
    cancelled: 'it is cancelled',
  }[lot.status];
  throw new Conflict('lot-not-at-bench', `Lot ${lot.number} is not at the bench: ${why}.`);
}
