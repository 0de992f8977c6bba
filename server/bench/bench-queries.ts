import { type Db } from '#db/open-database';
import { instruments } from '#db/schema/instruments';
import { people } from '#db/schema/people';
import { instrumentView } from '#server/instruments/instrument-queries';
import { fixedSampling } from '#server/lots/lot-sampling-queries';
import { findLot, headOf } from '#server/lots/lot-rows';
import { Conflict } from '#server/problems';
import { type Bench } from '#shared/contract/bench';
import { asc } from 'drizzle-orm';
import { rulesOf, unitsOf } from '#server/judging/lot-judging';
import { readingView } from './reading-view';

/** Names of everybody, by id. */
export function namesOf(db: Db): ReadonlyMap<number, string> {
  return new Map(
    db
      .select({ id: people.id, name: people.name })
      .from(people)
      .all()
      .map(({ id, name }) => [id, name]),
  );
}

/** Everything the bench needs of a drawn lot. @throws {Conflict} before the draw */
export function readBench(db: Db, id: number, today: string): Bench {
  const joined = findLot(db, id);
  const { lot } = joined;
  const sampling = fixedSampling(db, lot);
  if (!sampling) throw new Conflict('not-drawn', `The sample of lot ${lot.number} is not drawn yet.`);
  const { characteristics, keyOf } = rulesOf(db, lot);
  const units = unitsOf(db, id);
  const names = namesOf(db);
  return {
    lot: headOf(db, joined),
    version: lot.version,
    sampling,
    characteristics: characteristics.map(({ content }) => content),
    units: units.map(({ unit }) => ({
      unit: unit.unit,
      position: unit.position,
      carton: unit.carton,
      setAside: unit.setAsideReason,
    })),
    readings: units.flatMap(({ unit, readings }) =>
      readings.map((row) =>
        readingView(
          row,
          unit.unit,
          keyOf.get(row.characteristicId) ?? '',
          row.takenById === null ? null : (names.get(row.takenById) ?? null),
        ),
      ),
    ),
    instruments: db
      .select()
      .from(instruments)
      .orderBy(asc(instruments.assetNumber))
      .all()
      .map((row) => instrumentView(row, today)),
  };
}
