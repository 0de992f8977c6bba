import { type Db } from '#db/open-database';
import { gaugeStudies } from '#db/schema/gauge-studies';
import { instruments } from '#db/schema/instruments';
import { record } from '#server/audit/record';
import { type Caller } from '#server/caller';
import { type Context } from '#server/context';
import { nextNumber } from '#server/numbers/next-number';
import { Conflict, holdVersion, Refused } from '#server/problems';
import { type GaugeStudy, type GaugeStudyBody } from '#shared/contract/gauge-studies';
import { eq } from 'drizzle-orm';
import { findStudyRow, readGaugeStudy, type StudyRow } from './gauge-study-queries';
import { countsOf } from './study-view';

/** What an act on a study that is there names. */
interface Named {
  id: number;
  version: number;
}

function holdInstrument(db: Db, { instrumentId }: GaugeStudyBody): void {
  const found = db.select({ id: instruments.id }).from(instruments).where(eq(instruments.id, instrumentId)).get();
  if (found) return;
  const message = 'This instrument does not exist.';
  throw new Refused('instrument-refused', message, [{ path: ['instrumentId'], message }]);
}

/** The study as it stands, open and at the version named. */
function openStudy(db: Db, { id, version }: Named): StudyRow {
  const row = findStudyRow(db, id);
  if (row.status === 'closed') throw new Conflict('study-closed', `${row.number} is closed; it changes no more.`);
  holdVersion('The gauge study', row.version, version);
  return row;
}

/** What the contract's body holds of a study as it stands. */
function bodyOf(row: StudyRow): GaugeStudyBody {
  const { title, instrumentId, quantity, unit, decimals, lowerLimit, upperLimit } = row;
  const { parts, persons, trials, values, note } = row;
  return {
    ...{ title, instrumentId, quantity, unit, decimals, lowerLimit, upperLimit },
    ...{ parts, persons, trials, values, note },
  };
}

export function addGaugeStudy({ db, clock }: Context, caller: Caller, body: GaugeStudyBody): GaugeStudy {
  return db.transaction((tx) => {
    holdInstrument(tx, body);
    const at = clock.now();
    const number = nextNumber(tx, 'GS', at.getUTCFullYear());
    const { id } = tx
      .insert(gaugeStudies)
      .values({ ...body, number, status: 'open', createdAt: at.toISOString(), createdById: caller.id })
      .returning({ id: gaugeStudies.id })
      .get();
    const after = { number, ...body };
    record(tx, { at, person: caller, action: 'added', subject: 'gauge-study', subjectId: id, after });
    return readGaugeStudy(tx, id);
  });
}

export function changeGaugeStudy(
  { db, clock }: Context,
  caller: Caller,
  { body, ...named }: Named & { body: GaugeStudyBody },
): GaugeStudy {
  return db.transaction((tx) => {
    const row = openStudy(tx, named);
    holdInstrument(tx, body);
    tx.update(gaugeStudies)
      .set({ ...body, version: row.version + 1 })
      .where(eq(gaugeStudies.id, row.id))
      .run();
    const change = { action: 'changed', subject: 'gauge-study', subjectId: row.id, before: bodyOf(row), after: body };
    record(tx, { at: clock.now(), person: caller, ...change });
    return readGaugeStudy(tx, row.id);
  });
}

/** Closes a whole study: from then on its readings are those that its results rest on. */
export function closeGaugeStudy({ db, clock }: Context, caller: Caller, named: Named): GaugeStudy {
  return db.transaction((tx) => {
    const row = openStudy(tx, named);
    const { entered, needed } = countsOf(row);
    if (entered < needed) throw new Conflict('readings-missing', missingReadings(needed - entered));
    const at = clock.now();
    const closed = { status: 'closed', closedAt: at.toISOString(), closedById: caller.id } as const;
    tx.update(gaugeStudies)
      .set({ ...closed, version: row.version + 1 })
      .where(eq(gaugeStudies.id, row.id))
      .run();
    record(tx, { at, person: caller, action: 'closed', subject: 'gauge-study', subjectId: row.id });
    return readGaugeStudy(tx, row.id);
  });
}

/** The sentence that refuses what needs all readings. */
export function missingReadings(missing: number): string {
  return missing === 1 ? '1 reading is missing.' : `${String(missing)} readings are missing.`;
}
