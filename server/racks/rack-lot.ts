import { type Db } from '#db/open-database';
import { lots } from '#db/schema/lots';
import { parts } from '#db/schema/parts';
import { lotAtBench } from '#server/bench/bench-lot';
import { type RunningVerdicts } from '#server/judging/running-verdicts';
import { unitsOf, type LotRules } from '#server/judging/lot-judging';
import { type LotRow } from '#server/lots/lot-rows';
import { fixedSampling } from '#server/lots/lot-sampling-queries';
import { Forbidden, NotFound } from '#server/problems';
import { type Characteristic } from '#shared/contract/plans';
import { type RackLot } from '#shared/contract/racks';
import { displayUnit } from '#shared/quantities/display-unit';
import { eq } from 'drizzle-orm';
import { type RackCaller } from './rack-caller';

/** The lot a rack names. @throws {Forbidden} for one whose part the rack is not bound to */
export function lotOfRack(db: Db, rack: RackCaller, number: string) {
  const found = db
    .select({ lot: lots, part: { number: parts.number, name: parts.name } })
    .from(lots)
    .innerJoin(parts, eq(parts.id, lots.partId))
    .where(eq(lots.number, number))
    .get();
  if (!found) throw new NotFound('This lot');
  if (!rack.partIds.has(found.lot.partId))
    throw new Forbidden(`The rack ${rack.name} is not set up for the part ${found.part.number}.`, 'part-not-bound');
  return found;
}

function shown(content: Exclude<Characteristic, { kind: 'computed' }>): RackLot['characteristics'][number] {
  const { key, name, kind, condition, instrumentKind } = content;
  const limits =
    content.kind === 'measured'
      ? { unit: displayUnit(content.unit).base, lowerLimit: content.lowerLimit, upperLimit: content.upperLimit }
      : { unit: '', lowerLimit: null, upperLimit: null };
  return { key, name, kind, condition, ...limits, instrumentKind };
}

/** The readings that are still to be taken, by unit; what is computed from them is not asked for. */
function wanted(db: Db, lot: LotRow, verdicts: RunningVerdicts, typed: ReadonlySet<string>): RackLot['wanted'] {
  const { units } = verdicts.of(db, lot);
  return unitsOf(db, lot.id).flatMap(({ unit: { unit, position } }) => {
    const characteristicKeys = (units.get(unit)?.missing ?? []).filter((key) => typed.has(key));
    return characteristicKeys.length === 0 ? [] : [{ unit, position, characteristicKeys }];
  });
}

function typedOf({ characteristics }: LotRules) {
  return characteristics.flatMap(({ content }) => (content.kind === 'computed' ? [] : [content]));
}

/** What a rack measures of a lot at the bench. */
export function readRackLot(db: Db, verdicts: RunningVerdicts, rack: RackCaller, number: string): RackLot {
  const { lot, part } = lotOfRack(db, rack, number);
  const { status } = lotAtBench(db, lot.id);
  const sampling = fixedSampling(db, lot);
  if (!sampling || (status !== 'drawn' && status !== 'measuring'))
    throw new Error(`Lot ${number} is at the bench and has no sample.`);
  const typed = typedOf(verdicts.of(db, lot).rules);
  return {
    lot: { number, status, quantity: lot.countedQuantity },
    part,
    plan: { number: sampling.planNumber, revision: sampling.revision },
    sampleSize: sampling.sampleSize,
    characteristics: typed.map(shown),
    wanted: wanted(db, lot, verdicts, new Set(typed.map(({ key }) => key))),
  };
}
