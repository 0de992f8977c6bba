import { type ReadingEntry } from '#shared/contract/bench';
import { type Instrument, type InstrumentRange } from '#shared/contract/instruments';
import { type Characteristic } from '#shared/contract/plans';
import { type RangedQuantity } from '#shared/uncertainty/range-choice';

/** What a range is wanted for by a characteristic; null for what is judged by eye or computed. */
export function rangedQuantity(
  characteristic: Characteristic,
  entryKind?: ReadingEntry['kind'],
): RangedQuantity | null {
  if (characteristic.kind !== 'measured') return null;
  const kind = entryKind ?? characteristic.entryMode;
  return { unit: characteristic.unit, readAs: kind === 'scope' || kind === 'waveform' ? kind : 'direct' };
}

/** A range of a list of instruments, by its id. */
export function rangeById(instruments: readonly Instrument[], id: number | null): InstrumentRange | undefined {
  if (id === null) return undefined;
  return instruments.flatMap(({ ranges }) => ranges).find((range) => range.id === id);
}
