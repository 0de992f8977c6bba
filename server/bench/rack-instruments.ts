import { type Db } from '#db/open-database';
import { type LotRules } from '#server/judging/lot-judging';
import { INSTRUMENT_KIND_TITLES, type InstrumentKind } from '#shared/contract/instruments';
import { type Characteristic } from '#shared/contract/plans';
import { type RackContent } from './rack-readings';
import { usableInstrument } from './reading-instrument';

/** The instruments a rack measured with, by their kind. @throws {Refused} for one that may not be used today */
export function instrumentsByKind(db: Db, ids: readonly number[], today: string): Map<InstrumentKind, number> {
  return new Map(ids.map((id) => [usableInstrument(db, id, today).kind, id]));
}

/** The instrument that took a characteristic; null where none is named. */
export function instrumentIdFor(
  characteristic: Characteristic,
  instruments: ReadonlyMap<InstrumentKind, number>,
): number | null {
  if (characteristic.kind === 'computed' || characteristic.instrumentKind === null) return null;
  return instruments.get(characteristic.instrumentKind) ?? null;
}

/** Each measured column needs the instrument that its characteristic asks for. */
export function instrumentFaults(
  { characteristics }: LotRules,
  content: RackContent,
  given: ReadonlyMap<InstrumentKind, number>,
) {
  const wanted = characteristics.flatMap(({ content: one }) =>
    one.kind !== 'computed' &&
    one.instrumentKind !== null &&
    content.columns.some((c) => c.characteristicKey === one.key)
      ? [one.instrumentKind]
      : [],
  );
  return [...new Set(wanted)]
    .filter((kind) => !given.has(kind))
    .map((kind) => ({
      line: 1,
      column: null,
      message: `Name the ${INSTRUMENT_KIND_TITLES[kind].toLowerCase()} the rack used.`,
    }));
}
