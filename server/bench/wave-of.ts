import { type Db } from '#db/open-database';
import { sampleUnits } from '#db/schema/lots';
import { waveforms } from '#db/schema/waveforms';
import { type LotRow } from '#server/lots/lot-rows';
import { type ReadingBody } from '#shared/contract/bench';
import { waveformValue } from '#shared/waveform/waveform-value';
import { and, eq, isNull } from 'drizzle-orm';
import { type MeasuredWave } from './entry-value';

/** The waveform that an entry names, of the unit it is a reading of; undefined where there is none. */
export function waveOf(
  db: Db,
  lot: LotRow,
  { unit, entry }: Pick<ReadingBody, 'unit' | 'entry'>,
): MeasuredWave | undefined {
  if (entry.kind !== 'waveform') return undefined;
  const found = db
    .select({ record: waveforms.record })
    .from(waveforms)
    .innerJoin(sampleUnits, eq(sampleUnits.id, waveforms.unitId))
    .where(
      and(
        eq(waveforms.id, entry.waveformId),
        eq(waveforms.lotId, lot.id),
        eq(sampleUnits.unit, unit),
        isNull(waveforms.withdrawnAt),
      ),
    )
    .get();
  return found && ((characteristic) => waveformValue(found.record.analysis, characteristic));
}
