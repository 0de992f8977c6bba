import { lotGroups, lots, sampleUnits } from '#db/schema/lots';
import { type Caller } from '#server/caller';
import { type Context } from '#server/context';
import { Conflict, holdVersion } from '#server/problems';
import { type Lot } from '#shared/contract/lots';
import { formatNumber } from '#shared/quantities/format-number';
import { drawPositions } from '#shared/sampling/draw-positions';
import { eq } from 'drizzle-orm';
import { randomInt } from 'node:crypto';
import { readLot } from './lot-queries';
import { findLot } from './lot-rows';
import { samplingNow } from './lot-sampling-queries';
import { recordLot } from './record-lot';

/** Seeds are whole numbers of 31 bits: easy to write down and to type again. */
const SEEDS = 2 ** 31 - 1;

/**
 * Draws the sample of a lot: from here on its plan revision, severity, groups (n, Ac, Re) and unit positions are fixed.
 *
 * @param seed of the draw; recorded, so that the positions can be drawn again by an auditor
 */
export function drawSample(
  context: Context,
  caller: Caller,
  id: number,
  version: number,
  seed: number = randomInt(1, SEEDS),
): Lot {
  const at = context.clock.now();
  return context.db.transaction((tx) => {
    const { lot } = findLot(tx, id);
    holdVersion(`Lot ${lot.number}`, lot.version, version);
    if (lot.status !== 'arrived')
      throw new Conflict(
        'lot-drawn-already',
        `The sample of lot ${lot.number} is drawn already, or the lot is cancelled.`,
      );
    const sampling = samplingNow(tx, lot.partId, lot.countedQuantity);
    if (!sampling)
      throw new Conflict('no-effective-plan', 'The part has no effective plan; quality makes one effective.');
    const { revision, severity, sampleSize, groups } = sampling;
    const { countedQuantity: lotSize, cartons } = lot;
    const drawn = drawPositions({ lotSize, sampleSize, cartons, seed });
    tx.insert(lotGroups)
      .values(groups.map((group, position) => ({ lotId: id, position, group })))
      .run();
    tx.insert(sampleUnits)
      .values(drawn.map((unit) => ({ lotId: id, ...unit })))
      .run();
    tx.update(lots)
      .set({
        status: 'drawn',
        revisionId: revision.id,
        severity,
        sampleSize,
        seed,
        drawnAt: at.toISOString(),
        drawnById: caller.id,
        version: lot.version + 1,
      })
      .where(eq(lots.id, id))
      .run();
    const note = `${formatNumber(sampleSize, 0)} of ${formatNumber(lotSize, 0)}, ${revision.planNumber} rev ${revision.revision}, ${severity}`;
    const after = { seed, sampleSize, revision: revision.id, severity, groups };
    recordLot(tx, { at, person: caller, action: 'drawn', lotId: id, note, after });
    return readLot(tx, id);
  });
}
