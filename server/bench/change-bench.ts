import { lots, sampleUnits } from '#db/schema/lots';
import { readings } from '#db/schema/readings';
import { record } from '#server/audit/record';
import { hasRole, type Caller } from '#server/caller';
import { type Context } from '#server/context';
import { findLot } from '#server/lots/lot-rows';
import { recordLot } from '#server/lots/record-lot';
import { Conflict, Forbidden, holdVersion, NotFound } from '#server/problems';
import { formatNumber } from '#shared/quantities/format-number';
import { type UnitVerdict } from '#shared/verdict/sample-verdict';
import { and, eq } from 'drizzle-orm';
import { lotAtBench } from './bench-lot';
import { countingReadings, type LotRules, unitOf, type UnitRows } from '#server/judging/lot-judging';
import { judgeSampleOf } from '#server/judging/sample-judging';
import { type RunningVerdicts } from '#server/judging/running-verdicts';
import { DONE, onUnit } from './on-unit';

/** Takes back the reading that counts in its cell; it stays on record as withdrawn. */
export function withdrawReading(
  context: Context,
  verdicts: RunningVerdicts,
  caller: Caller,
  lotId: number,
  readingId: string,
) {
  return onUnit(context, verdicts, lotId, (tx, at) => {
    const found = tx
      .select({ reading: readings, unit: sampleUnits.unit })
      .from(readings)
      .innerJoin(sampleUnits, eq(sampleUnits.id, readings.unitId))
      .where(and(eq(readings.id, readingId), eq(readings.lotId, lotId)))
      .get();
    if (!found) throw new NotFound('This reading');
    const { reading, unit } = found;
    if (reading.takenById !== caller.id && !hasRole(caller, 'quality'))
      throw new Forbidden('A reading is taken back by the person who took it, or by quality.', 'not-your-reading');
    const counting = countingReadings(unitOf(tx, lotId, unit)?.readings ?? []).get(reading.characteristicId);
    if (counting?.id !== readingId)
      throw new Conflict('reading-does-not-count', 'This reading is withdrawn or was repeated already.');
    tx.update(readings)
      .set({ withdrawnAt: at.toISOString(), withdrawnById: caller.id })
      .where(eq(readings.id, readingId))
      .run();
    record(tx, {
      at,
      person: caller,
      action: 'withdrawn',
      subject: 'reading',
      subjectId: readingId,
      before: { value: reading.value, pass: reading.pass },
    });
    return unit;
  });
}

/** Sets a unit aside as undecided, with a reason, or takes it back. */
export function setUnitAside(
  context: Context,
  verdicts: RunningVerdicts,
  caller: Caller,
  lotId: number,
  unit: number,
  reason: string | null,
) {
  return onUnit(context, verdicts, lotId, (tx, at) => {
    const rows = unitOf(tx, lotId, unit);
    if (!rows) throw new NotFound('This unit');
    tx.update(sampleUnits).set({ setAsideReason: reason }).where(eq(sampleUnits.id, rows.unit.id)).run();
    record(tx, {
      at,
      person: caller,
      action: reason === null ? 'taken back' : 'set aside',
      subject: 'unit',
      subjectId: `${lotId}/${unit}`,
      before: { setAside: rows.unit.setAsideReason },
      after: { setAside: reason },
    });
    return unit;
  });
}

/** Readings still to be taken; what is computed from them is not counted beside them. */
function readingsMissing(units: readonly UnitVerdict[], characteristics: LotRules['characteristics']): number {
  const computed = new Set(
    characteristics.flatMap(({ content }) => (content.kind === 'computed' ? [content.key] : [])),
  );
  return units.reduce((sum, { missing }) => sum + missing.filter((key) => !computed.has(key)).length, 0);
}

/** A reading far from what the part can give is never taken in silently: somebody confirms or repeats it first. */
function holdAnswered(units: readonly UnitRows[]): void {
  const open = units.filter(({ readings: rows }) =>
    [...countingReadings(rows).values()].some(({ question }) => question?.given.answer === 'open'),
  );
  if (open.length === 0) return;
  const named = open.slice(0, 5).map(({ unit }) => unit.unit);
  throw new Conflict(
    'questions-open',
    `Readings of a rack are far from what the part can give and wait for an answer: ${open.length === 1 ? 'unit' : 'units'} ${named.join(', ')}${open.length > 5 ? ' and others' : ''}. Confirm or repeat them.`,
  );
}

/** Submits a lot for decision: everything required is judged, or a rejection number is reached. */
export function submitLot(context: Context, verdicts: RunningVerdicts, caller: Caller, id: number, version: number) {
  const at = context.clock.now();
  context.db.transaction((tx) => {
    const lot = lotAtBench(tx, id);
    holdVersion(`Lot ${lot.number}`, lot.version, version);
    const { verdict, rules, units } = judgeSampleOf(tx, lot);
    holdAnswered(units);
    const settled = judgeSampleOf(tx, lot, { submitting: true }).verdict.lot;
    // A verdict may hang on a reading that is missing beyond its own group; without it nobody could sign.
    if ((!verdict.lot.stop && !verdict.lot.complete) || settled.verdict === 'continue') {
      const missing = readingsMissing(verdict.units, rules.characteristics);
      throw new Conflict(
        'readings-missing',
        `${formatNumber(missing, 0)} ${missing === 1 ? 'reading is' : 'readings are'} still missing.`,
      );
    }
    tx.update(lots)
      .set({ status: 'submitted', submittedAt: at.toISOString(), submittedById: caller.id, version: lot.version + 1 })
      .where(eq(lots.id, id))
      .run();
    const shows = settled.verdict === 'accepted' ? 'The sample is acceptable' : 'The sample is to be rejected';
    const after = { verdict: settled.verdict, reason: settled.reason };
    recordLot(tx, { at, person: caller, action: 'submitted', lotId: id, note: shows, after });
  });
  verdicts.drop(id);
  return DONE;
}

/** Sends a submitted lot back to the bench. */
export function reopenLot(context: Context, caller: Caller, id: number, version: number, reason: string) {
  const at = context.clock.now();
  context.db.transaction((tx) => {
    const { lot } = findLot(tx, id);
    holdVersion(`Lot ${lot.number}`, lot.version, version);
    if (lot.status !== 'submitted')
      throw new Conflict('lot-not-submitted', `Lot ${lot.number} is not waiting for a decision.`);
    tx.update(lots)
      .set({ status: 'measuring', submittedAt: null, submittedById: null, version: lot.version + 1 })
      .where(eq(lots.id, id))
      .run();
    recordLot(tx, { at, person: caller, action: 'reopened', lotId: id, note: reason });
  });
  return DONE;
}
