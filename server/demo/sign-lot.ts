import { DEMO_PASSWORD } from '#db/demo/sign-ins';
import { type Caller } from '#server/caller';
import { type Context } from '#server/context';
import { judgedLot } from '#server/decision/assess-lot';
import { decideLot } from '#server/decision/decide-lot';
import { holdLot } from '#server/decision/hold-lot';
import { findLot } from '#server/lots/lot-rows';

type Verdict = 'accepted' | 'rejected';

/**
 * Signs what the sample of a submitted lot shows, or holds the lot with a reason although it is acceptable.
 *
 * @returns the verdict of the sample
 */
export async function signLot(
  context: Context,
  signer: Caller,
  id: number,
  holdReason: string | null,
): Promise<Verdict> {
  const { lot } = findLot(context.db, id);
  const verdict = judgedLot(context.db, lot).verdict.lot.verdict === 'rejected' ? 'rejected' : 'accepted';
  const password = DEMO_PASSWORD;
  if (holdReason !== null && verdict === 'accepted')
    await holdLot(context, signer, id, lot.version, { password, reason: holdReason });
  else await decideLot(context, signer, id, lot.version, { verdict, password, note: '' });
  return verdict;
}
