import { type Db } from '#db/open-database';
import { sampleUnits } from '#db/schema/lots';
import { people } from '#db/schema/people';
import { planCharacteristics } from '#db/schema/plans';
import { readings } from '#db/schema/readings';
import { wholeCharacteristic } from '#server/plans/whole-characteristic';
import { type CalibrationPoint, type DoubtfulReading } from '#shared/contract/calibrations';
import { type Characteristic } from '#shared/contract/plans';
import { and, asc, eq } from 'drizzle-orm';
import { type Doubt, inDoubt } from './doubt';
import { couldTurn, foundError } from './found-error';

/** A reading in doubt with the lot it is of. */
export interface LotReading {
  lotId: number;
  reading: DoubtfulReading;
}

/**
 * Every reading in doubt, lot by lot in the order of their units; with whether the error found could have turned it.
 *
 * @param lotId of the lot to be looked at; all where undefined
 */
export function doubtfulReadings(
  db: Db,
  doubt: Doubt,
  points: readonly CalibrationPoint[],
  lotId?: number,
): LotReading[] {
  const rows = db
    .select({
      id: readings.id,
      lotId: readings.lotId,
      unit: sampleUnits.unit,
      characteristicId: planCharacteristics.id,
      content: planCharacteristics.content,
      value: readings.value,
      pass: readings.pass,
      takenAt: readings.takenAt,
      takenBy: people.name,
    })
    .from(readings)
    .innerJoin(sampleUnits, eq(sampleUnits.id, readings.unitId))
    .innerJoin(planCharacteristics, eq(planCharacteristics.id, readings.characteristicId))
    .leftJoin(people, eq(people.id, readings.takenById))
    .where(and(lotId === undefined ? undefined : eq(readings.lotId, lotId), inDoubt(doubt)))
    .orderBy(asc(readings.lotId), asc(sampleUnits.unit), asc(planCharacteristics.position), asc(readings.attempt))
    .all();
  const known = new Map<number, Judged>();
  return rows.map(({ lotId: of, characteristicId, content, ...row }) => {
    const judged = known.get(characteristicId) ?? judgedBy(wholeCharacteristic(content), points);
    known.set(characteristicId, judged);
    return { lotId: of, reading: { ...row, ...judged.shown, nearLimit: judged.isNear(row.value) } };
  });
}

/** What is shown of a characteristic, and whether the error found could have carried a value over one of its limits. */
interface Judged {
  shown: Pick<DoubtfulReading, 'characteristic' | 'lowerLimit' | 'upperLimit'>;
  isNear(value: number | null): boolean | null;
}

function judgedBy(whole: Characteristic, points: readonly CalibrationPoint[]): Judged {
  const { key, name } = whole;
  if (whole.kind === 'attribute') {
    const characteristic = { key, name, unit: '', decimals: 0 };
    return { shown: { characteristic, lowerLimit: null, upperLimit: null }, isNear: () => null };
  }
  const { unit, decimals, lowerLimit, upperLimit } = whole;
  const share = foundError(points, unit);
  return {
    shown: { characteristic: { key, name, unit, decimals }, lowerLimit, upperLimit },
    isNear: (value) => (share === null || value === null ? null : couldTurn(value, [lowerLimit, upperLimit], share)),
  };
}
