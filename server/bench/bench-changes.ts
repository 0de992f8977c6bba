import { type Db } from '#db/open-database';
import { unitsOf, type ReadingRow } from '#server/judging/lot-judging';
import { findLot, headOf } from '#server/lots/lot-rows';
import { characteristicsOf } from '#server/lots/lot-sampling-queries';
import { Conflict } from '#server/problems';
import { type readBenchChanges as contract } from '#shared/contract/bench';
import type * as z from 'zod';
import { namesOf } from './bench-names';
import { conditionsOf } from './lot-conditions';
import { readingView } from './reading-view';
import { sampleUnitView } from './sample-unit-view';

type Changes = z.input<(typeof contract)['reply']>;

/** Whether anything happened to a reading at an instant or after it: kept, withdrawn, or its question answered. */
function isChanged({ receivedAt, withdrawnAt, question }: ReadingRow, since: string): boolean {
  return [receivedAt, withdrawnAt, question?.answeredAt].some((at) => at !== null && at !== undefined && at >= since);
}

/**
 * What happened at the bench of a lot since a cursor. The instant of the cursor itself is asked again, so that nothing of
 * its millisecond is missed; taking a change in twice changes nothing.
 *
 * @throws {Conflict} before the draw
 */
export function readBenchChanges(db: Db, id: number, since: string, now: Date): Changes {
  const joined = findLot(db, id);
  const { lot } = joined;
  if (lot.revisionId === null) throw new Conflict('not-drawn', `The sample of lot ${lot.number} is not drawn yet.`);
  const keyOf = new Map(characteristicsOf(db, lot.revisionId).map(({ id: own, content }) => [own, content.key]));
  const units = unitsOf(db, id);
  const names = namesOf(db);
  return {
    cursor: now.toISOString(),
    lot: headOf(db, joined),
    version: lot.version,
    readings: units.flatMap(({ unit, readings }) =>
      readings
        .filter((row) => isChanged(row, since))
        .map((row) => readingView(row, unit.unit, keyOf.get(row.characteristicId) ?? '', names)),
    ),
    units: units
      .filter(({ unit }) => unit.setAsideReason !== null || unit.ruling !== null)
      .map((rows) => sampleUnitView(rows, names.people)),
    conditions: conditionsOf(db, id),
  };
}
