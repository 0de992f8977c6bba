import { type Db } from '#db/open-database';
import { sampleUnits } from '#db/schema/lots';
import { people } from '#db/schema/people';
import { planCharacteristics } from '#db/schema/plans';
import { readings } from '#db/schema/readings';
import { wholeCharacteristic } from '#server/plans/whole-characteristic';
import { type CalibrationPoint, type DoubtfulReading } from '#shared/contract/calibrations';
import { and, asc, eq } from 'drizzle-orm';
import { type Doubt, inDoubt } from './doubt';
import { couldTurn, foundError } from './found-error';

/** Every reading of a lot that is in doubt, in the order of its units; with whether the error found could have turned it. */
export function doubtfulReadings(
  db: Db,
  doubt: Doubt,
  points: readonly CalibrationPoint[],
  lotId: number,
): DoubtfulReading[] {
  const rows = db
    .select({
      id: readings.id,
      unit: sampleUnits.unit,
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
    .where(and(eq(readings.lotId, lotId), inDoubt(doubt)))
    .orderBy(asc(sampleUnits.unit), asc(planCharacteristics.position), asc(readings.attempt))
    .all();
  return rows.map(({ content, ...row }) => {
    const whole = wholeCharacteristic(content);
    const { key, name } = whole;
    if (whole.kind === 'attribute')
      return {
        ...row,
        characteristic: { key, name, unit: '', decimals: 0 },
        lowerLimit: null,
        upperLimit: null,
        nearLimit: null,
      };
    const { unit, decimals, lowerLimit, upperLimit } = whole;
    const share = foundError(points, unit);
    const isKnown = share !== null && row.value !== null;
    return {
      ...row,
      characteristic: { key, name, unit, decimals },
      lowerLimit,
      upperLimit,
      nearLimit: isKnown ? couldTurn(row.value ?? 0, [lowerLimit, upperLimit], share) : null,
    };
  });
}
