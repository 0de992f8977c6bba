import { instrumentChecks } from '#db/schema/calibrations';
import { record } from '#server/audit/record';
import { type Caller } from '#server/caller';
import { type Context } from '#server/context';
import { dayOf, findInstrument } from '#server/instruments/instrument-queries';
import { Conflict } from '#server/problems';
import { type InstrumentCheck } from '#shared/contract/calibrations';
import { isWithinTolerance } from '#shared/measurement/within-tolerance';

/**
 * Records what an instrument showed of its reference; the last check of a day decides whether it may be used on it.
 *
 * @param observed in the SI base unit of the reference
 */
export function recordCheck({ db, clock }: Context, caller: Caller, id: number, observed: number): InstrumentCheck {
  return db.transaction((tx) => {
    const now = clock.now();
    const day = dayOf(now);
    const { assetNumber, dailyReference } = findInstrument(tx, id, day);
    if (!dailyReference)
      throw new Conflict('no-reference', `${assetNumber} has no reference that it is checked against.`);
    const { value: reference, tolerance } = dailyReference;
    const passed = isWithinTolerance(observed, reference, tolerance);
    const at = now.toISOString();
    const check = { day, observed, reference, tolerance, passed, at };
    const row = tx
      .insert(instrumentChecks)
      .values({ ...check, instrumentId: id, personId: caller.id })
      .returning({ id: instrumentChecks.id })
      .get();
    record(tx, { at: now, person: caller, action: 'checked', subject: 'instrument', subjectId: id, after: check });
    return { ...check, id: row.id, person: caller.name };
  });
}
