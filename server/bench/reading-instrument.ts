import { type Db } from '#db/open-database';
import { preparedOnce } from '#db/prepared-once';
import { instrumentChecks } from '#db/schema/calibrations';
import { instruments } from '#db/schema/instruments';
import { Refused } from '#server/problems';
import { findSite } from '#server/site/site-queries';
import { INSTRUMENT_KIND_TITLES } from '#shared/contract/instruments';
import { type Characteristic } from '#shared/contract/plans';
import { and, desc, eq, sql } from 'drizzle-orm';

type InstrumentRow = typeof instruments.$inferSelect;

const instrumentById = preparedOnce((db) =>
  db
    .select()
    .from(instruments)
    .where(eq(instruments.id, sql.placeholder('id')))
    .prepare(),
);

const lastCheck = preparedOnce((db) =>
  db
    .select({ passed: instrumentChecks.passed })
    .from(instrumentChecks)
    .where(
      and(
        eq(instrumentChecks.instrumentId, sql.placeholder('instrumentId')),
        eq(instrumentChecks.day, sql.placeholder('day')),
      ),
    )
    .orderBy(desc(instrumentChecks.id))
    .limit(1)
    .prepare(),
);

/** Why today's check against the reference keeps an instrument from being used; undefined when it does not. */
function unchecked(db: Db, { id, assetNumber, checkName }: InstrumentRow, today: string): string | undefined {
  if (checkName === null || !findSite(db).dailyChecks) return undefined;
  const check = lastCheck(db).get({ instrumentId: id, day: today });
  if (!check) return `Check ${assetNumber} against ${checkName} before its first reading of the day.`;
  return check.passed ? undefined : `${assetNumber} did not pass today’s check against ${checkName}.`;
}

/** Why an instrument may not be used on a day; undefined when it may. The due date itself is still good. */
export function unusable(db: Db, instrument: InstrumentRow, today: string): string | undefined {
  if (instrument.status === 'withdrawn') return `${instrument.assetNumber} is withdrawn.`;
  if (instrument.calibrationDue < today)
    return `${instrument.assetNumber} is past its calibration date ${instrument.calibrationDue}.`;
  return unchecked(db, instrument, today);
}

/** @throws {Refused} when no such instrument exists or it may not be used today */
export function usableInstrument(db: Db, id: number, today: string): InstrumentRow {
  const refuse = (message: string): never => {
    throw new Refused('instrument-refused', message, [{ path: ['instrumentId'], message }]);
  };
  const found = instrumentById(db).get({ id });
  if (!found) return refuse('This instrument does not exist.');
  const why = unusable(db, found, today);
  return why === undefined ? found : refuse(why);
}

/**
 * Holds that a reading names an instrument of the kind the plan asks for, in service and not past its calibration date.
 *
 * @throws {Refused} naming the field
 */
export function holdInstrument(
  db: Db,
  characteristic: Characteristic,
  instrumentId: number | null,
  today: string,
): void {
  if (characteristic.kind === 'computed') return;
  const kind = characteristic.instrumentKind;
  const refuse = (message: string): never => {
    throw new Refused('instrument-refused', message, [{ path: ['instrumentId'], message }]);
  };
  if (instrumentId === null) {
    if (kind !== null) refuse(`Choose the ${INSTRUMENT_KIND_TITLES[kind].toLowerCase()} that took this reading.`);
    return;
  }
  const instrument = usableInstrument(db, instrumentId, today);
  if (kind !== null && instrument.kind !== kind)
    refuse(`${instrument.assetNumber} is no ${INSTRUMENT_KIND_TITLES[kind].toLowerCase()}.`);
}
