import { type Db } from '#db/open-database';
import { type readings } from '#db/schema/readings';
import { findRange } from '#server/instruments/instrument-ranges';
import { type Characteristic } from '#shared/contract/plans';
import { type Component } from '#shared/uncertainty/component';
import { readingBudget } from '#shared/uncertainty/reading-budget';

type Row = Pick<typeof readings.$inferSelect, 'id' | 'value' | 'entry' | 'rangeId'>;

/**
 * The uncertainty budget of a kept reading, made of its value, of what was typed and of the range it was taken on, which is
 * never altered; undefined where no range is known.
 */
export function readingComponents(
  db: Db,
  { value, entry, rangeId }: Row,
  characteristic: Characteristic,
): readonly Component[] | undefined {
  const range = rangeId === null ? undefined : findRange(db, rangeId);
  if (!range || value === null || characteristic.kind !== 'measured') return undefined;
  return readingBudget(value, entry, range, characteristic.alternatePeaks);
}
