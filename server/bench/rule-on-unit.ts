import { type Db } from '#db/open-database';
import { sampleUnits } from '#db/schema/lots';
import { record } from '#server/audit/record';
import { type Caller } from '#server/caller';
import { type Context } from '#server/context';
import { judgedReadings, unitOf, type LotRules, type UnitRows } from '#server/judging/lot-judging';
import { type RunningVerdicts } from '#server/judging/running-verdicts';
import { Conflict, NotFound } from '#server/problems';
import { judgeUnit } from '#shared/verdict/judge-unit';
import { eq } from 'drizzle-orm';
import { onUnit } from './on-unit';

type Ruling = 'conforming' | 'nonconforming';

/** A ruling settles doubt. It makes no failed reading good, and no missing one. */
function holdUndecided(db: Db, rules: LotRules, rows: UnitRows, ruling: Ruling): void {
  const { unit } = rows.unit;
  const judged = judgeUnit(rules.rules, { ...judgedReadings(db, rows, rules), ruling: null });
  if (judged.verdict === 'nonconforming')
    throw new Conflict('unit-failed', `Unit ${unit} fails; a ruling cannot change that. Repeat the measurement.`);
  if (judged.verdict !== 'undecided')
    throw new Conflict('unit-not-undecided', `Unit ${unit} is not undecided; there is nothing to rule on.`);
  const ruled = judgeUnit(rules.rules, { ...judgedReadings(db, rows, rules), ruling });
  if (ruling === 'conforming' && ruled.verdict !== 'conforming')
    throw new Conflict('readings-missing', `Unit ${unit} has readings missing; they are never taken for passed.`);
}

/** Quality's ruling on an undecided unit, with its reason; null takes it back. */
export function ruleOnUnit(
  context: Context,
  verdicts: RunningVerdicts,
  caller: Caller,
  place: { lotId: number; unit: number },
  { ruling, reason }: { ruling: Ruling | null; reason: string },
) {
  return onUnit(context, verdicts, place.lotId, (tx: Db, at, { rules }) => {
    const rows = unitOf(tx, place.lotId, place.unit);
    if (!rows) throw new NotFound('This unit');
    if (ruling !== null) holdUndecided(tx, rules, rows, ruling);
    tx.update(sampleUnits)
      .set(
        ruling === null
          ? { ruling, rulingReason: null, ruledById: null, ruledAt: null }
          : { ruling, rulingReason: reason, ruledById: caller.id, ruledAt: at.toISOString() },
      )
      .where(eq(sampleUnits.id, rows.unit.id))
      .run();
    record(tx, {
      at,
      person: caller,
      action: ruling === null ? 'ruling taken back' : 'ruled on',
      subject: 'unit',
      subjectId: `${place.lotId}/${place.unit}`,
      before: { ruling: rows.unit.ruling, reason: rows.unit.rulingReason },
      after: { ruling, reason },
    });
    return place.unit;
  });
}
