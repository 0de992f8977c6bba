import { type instruments } from '#db/schema/instruments';
import { RANGE_UNITS, type Instrument } from '#shared/contract/instruments';

type Columns = Pick<typeof instruments.$inferSelect, 'checkName' | 'checkUnit' | 'checkValue' | 'checkTolerance'>;

/** The reference of an instrument's daily check, out of its columns. */
export function dailyReferenceOf({
  checkName,
  checkUnit,
  checkValue,
  checkTolerance,
}: Columns): Instrument['dailyReference'] {
  const unit = RANGE_UNITS.find((one) => one === checkUnit);
  if (checkName === null || unit === undefined || checkValue === null || checkTolerance === null) return null;
  return { name: checkName, unit, value: checkValue, tolerance: checkTolerance };
}

/** The columns of a reference. */
export function dailyReferenceColumns(reference: Instrument['dailyReference']): Columns {
  return {
    checkName: reference?.name ?? null,
    checkUnit: reference?.unit ?? null,
    checkValue: reference?.value ?? null,
    checkTolerance: reference?.tolerance ?? null,
  };
}
