import { type Db } from '#db/open-database';
import { rulesOf, unitsOf } from '#server/judging/lot-judging';
import { dayOf, listInstruments } from '#server/instruments/instrument-queries';
import { fixedSampling } from '#server/lots/lot-sampling-queries';
import { findLot, headOf } from '#server/lots/lot-rows';
import { Conflict } from '#server/problems';
import { racksOf } from '#server/racks/rack-mapping';
import { type Bench } from '#shared/contract/bench';
import { namesOf } from './bench-names';
import { expectedOf } from './expected-of';
import { conditionsOf } from './lot-conditions';
import { readingView } from './reading-view';
import { sampleUnitView } from './sample-unit-view';

/** Everything the bench needs of a drawn lot. @throws {Conflict} before the draw */
export function readBench(db: Db, id: number, now: Date): Bench {
  const joined = findLot(db, id);
  const { lot } = joined;
  const sampling = fixedSampling(db, lot);
  if (!sampling) throw new Conflict('not-drawn', `The sample of lot ${lot.number} is not drawn yet.`);
  const { characteristics, keyOf, revision } = rulesOf(db, lot);
  const units = unitsOf(db, id);
  const names = namesOf(db);
  return {
    lot: headOf(db, joined),
    version: lot.version,
    sampling,
    characteristics: characteristics.map(({ content }) => content),
    units: units.map((rows) => sampleUnitView(rows, names.people)),
    readings: units.flatMap(({ unit, readings }) =>
      readings.map((row) => readingView(row, unit.unit, keyOf.get(row.characteristicId) ?? '', names)),
    ),
    instruments: listInstruments(db, dayOf(now)).sort((a, b) => a.assetNumber.localeCompare(b.assetNumber)),
    decisionRule: revision.decisionRule,
    coverageFactor: revision.coverageFactor,
    warmUpMinutes: revision.warmUpMinutes,
    expected: expectedOf(db, lot.partId),
    conditions: conditionsOf(db, id),
    racks: racksOf(db, lot.partId),
    cursor: now.toISOString(),
  };
}
