import { type Db } from '#db/open-database';
import { parts } from '#db/schema/parts';
import { conditionsOf } from '#server/bench/lot-conditions';
import { rulesOf } from '#server/judging/lot-judging';
import { type LotRow } from '#server/lots/lot-rows';
import { eq } from 'drizzle-orm';
import { type MeasuredPart } from './wave-task';

/** The plan's limit of the difference of alternate peaks in volts; null where it has none. */
function alternateLimit(db: Db, lot: LotRow): number | null {
  for (const { content } of rulesOf(db, lot).characteristics)
    if (content.kind === 'computed' && content.formula.key === 'alternate-peak-difference') return content.upperLimit;
  return null;
}

/** What a lot's part is, and the mains it was measured at: as noted of the lot, else the part's own. */
export function measuredPart(db: Db, lot: LotRow): MeasuredPart {
  const row = db.select().from(parts).where(eq(parts.id, lot.partId)).get();
  if (!row) throw new Error(`Lot ${lot.number} is of no part.`);
  const { topology, ratedVolts, lineHertz, expected } = row;
  return {
    topology,
    ratedVolts,
    lineHertz: conditionsOf(db, lot.id)?.mainsHertz ?? lineHertz,
    expectedRipple: expected?.ripple ?? null,
    alternateLimit: alternateLimit(db, lot),
  };
}
