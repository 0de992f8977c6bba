import { lots } from '#db/schema/lots';
import { type Caller } from '#server/caller';
import { type Context } from '#server/context';
import { readLot } from '#server/lots/lot-queries';
import { findLot } from '#server/lots/lot-rows';
import { recordLot } from '#server/lots/record-lot';
import { Conflict, holdVersion } from '#server/problems';
import { type Lot } from '#shared/contract/lots';
import { eq } from 'drizzle-orm';
import { judgedLot } from './assess-lot';
import { submittedLot } from './decide-lot';
import { holdPassword } from './hold-password';

/** Holds an acceptable lot: no verdict is signed, the lot waits on hold with the reason. */
export async function holdLot(
  context: Context,
  caller: Caller,
  id: number,
  version: number,
  { password, reason }: { password: string; reason: string },
): Promise<Lot> {
  await holdPassword(context, caller, password);
  return context.db.transaction((tx) => {
    const lot = submittedLot(tx, id, version);
    if (judgedLot(tx, lot).verdict.lot.verdict !== 'accepted')
      throw new Conflict('verdict-changed', 'Only an acceptable lot is held; this one is to be rejected.');
    tx.update(lots)
      .set({ status: 'on-hold', holdReason: reason, version: lot.version + 1 })
      .where(eq(lots.id, id))
      .run();
    recordLot(tx, { at: context.clock.now(), person: caller, action: 'held', lotId: id, note: reason });
    return readLot(tx, id);
  });
}

/** Ends such a hold: the lot waits for its decision again. */
export function liftHold(context: Context, caller: Caller, id: number, version: number, reason: string) {
  context.db.transaction((tx) => {
    const { lot } = findLot(tx, id);
    holdVersion(`Lot ${lot.number}`, lot.version, version);
    if (lot.status !== 'on-hold' || lot.verdict !== null)
      throw new Conflict('not-held', `Lot ${lot.number} is not held by quality although acceptable.`);
    tx.update(lots)
      .set({ status: 'submitted', holdReason: null, version: lot.version + 1 })
      .where(eq(lots.id, id))
      .run();
    recordLot(tx, { at: context.clock.now(), person: caller, action: 'hold-ended', lotId: id, note: reason });
  });
  return { done: true } as const;
}
