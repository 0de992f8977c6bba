import { type Db } from '#db/open-database';
import { instruments } from '#db/schema/instruments';
import { rangesOf } from '#server/bench/range-of-reading';
import { expectedOf } from '#server/bench/expected-of';
import { type FreshReading } from '#server/bench/insert-reading';
import { questionOf, readingFacts } from '#server/bench/reading-facts';
import { holdInstrument } from '#server/bench/reading-instrument';
import { takenAt } from '#server/bench/taken-at';
import { dayOf } from '#server/instruments/instrument-queries';
import { countingReadings, unitOf, type LotRules, type UnitRows } from '#server/judging/lot-judging';
import { type LotRow } from '#server/lots/lot-rows';
import { Refused } from '#server/problems';
import { type Characteristic } from '#shared/contract/plans';
import { type RackReading } from '#shared/contract/racks';
import { mayRepeat } from '#shared/verdict/counting-reading';
import { eq } from 'drizzle-orm';

/** What the readings of a rack are checked against. */
export interface RackBench {
  db: Db;
  lot: LotRow;
  rules: LotRules;
  rackId: number;
  at: Date;
  /** Units read so far, with the readings of the request beside those in the database. */
  units: Map<number, UnitRows>;
}

type Field = keyof RackReading;
type Measured = Extract<Characteristic, { kind: 'measured' }>;

/** What is wrong with a reading, and with which field of it. */
export class ReadingFault extends Error {
  constructor(
    readonly field: Field,
    message: string,
  ) {
    super(message);
  }
}

function fault(field: Field, message: string): never {
  throw new ReadingFault(field, message);
}

function unitRows({ db, lot, units }: RackBench, unit: number): UnitRows {
  const known = units.get(unit) ?? unitOf(db, lot.id, unit);
  if (!known) return fault('unit', `Unit ${unit} is not in the sample of ${lot.sampleSize ?? 0}.`);
  units.set(unit, known);
  return known;
}

/** The characteristic a reading is of; what is computed is not sent. */
function characteristicOf({ rules }: RackBench, key: string) {
  const found = rules.characteristics.find(({ content }) => content.key === key);
  if (!found) return fault('characteristicKey', `The plan has no characteristic ${key}.`);
  const { id, content } = found;
  if (content.kind === 'computed')
    return fault('characteristicKey', `${content.name} is computed from other readings; it is not sent.`);
  return { id, content };
}

function worthOf({ value, pass }: RackReading, { kind, name }: Characteristic) {
  if (kind === 'attribute') {
    if (pass === undefined) return fault('pass', `${name} is judged by eye: send pass.`);
    return { value: null, pass };
  }
  if (value === undefined) return fault('value', `${name} is measured: send a value.`);
  return { value, pass: null };
}

function instrumentIdOf(db: Db, { instrument }: RackReading): number | null {
  if (instrument === null) return null;
  const found = db
    .select({ id: instruments.id })
    .from(instruments)
    .where(eq(instruments.assetNumber, instrument))
    .get();
  return found ? found.id : fault('instrument', `There is no instrument ${instrument}.`);
}

function rangeIdOf(db: Db, { instrument, rangeName }: RackReading, instrumentId: number | null): number | null {
  if (rangeName === undefined) return null;
  const ranges = instrumentId === null ? [] : rangesOf(db, instrumentId);
  const found = ranges.find(({ name }) => name === rangeName);
  return found ? found.id : fault('rangeName', `${instrument ?? 'No instrument'} has no range ${rangeName}.`);
}

/** A cell that has a reading takes no other one from a rack: repeating is for a person, with a reason. */
function holdCell({ unit }: RackReading, { readings }: UnitRows, characteristicId: number): number {
  if (countingReadings(readings).has(characteristicId))
    fault('characteristicKey', `Unit ${unit} has this reading already.`);
  const earlier = readings.filter((row) => row.characteristicId === characteristicId);
  if (!mayRepeat(earlier.map((row) => ({ withdrawn: row.withdrawnAt !== null }))))
    fault('characteristicKey', `Unit ${unit} has had this reading three times; set the unit aside.`);
  return earlier.length + 1;
}

/** The field of a rack's reading that the bench's rules mean. */
function fieldOf({ errors: [first] }: Refused, { rangeName }: RackReading): Field {
  if (first?.path[0] === 'rangeId') return rangeName === undefined ? 'value' : 'rangeName';
  return first?.path[0] === 'instrumentId' ? 'instrument' : 'value';
}

/** Runs rules of the bench; what they refuse becomes a fault of the reading. */
function told<T>(reading: RackReading, run: () => T): T {
  try {
    return run();
  } catch (error) {
    if (error instanceof Refused) return fault(fieldOf(error, reading), error.title);
    throw error;
  }
}

/** Range, uncertainty and question of a measured value; the question stays open until a person answers it. */
function factsOf({ db, lot, rules }: RackBench, content: Measured, given: Parameters<typeof readingFacts>[3]) {
  const facts = readingFacts(db, rules.revision, content, given);
  return { ...facts, question: questionOf(content, expectedOf(db, lot.partId), given) ?? null };
}

const NO_FACTS = { rangeId: null, expandedUncertainty: null, question: null };

/** A rack's reading as it is to be kept. @throws {ReadingFault} */
export function checkedReading(bench: RackBench, id: string, reading: RackReading): FreshReading {
  const { db, lot, rackId, at } = bench;
  const { id: characteristicId, content } = characteristicOf(bench, reading.characteristicKey);
  const rows = unitRows(bench, reading.unit);
  const worth = worthOf(reading, content);
  const attempt = holdCell(reading, rows, characteristicId);
  const instrumentId = instrumentIdOf(db, reading);
  const rangeId = rangeIdOf(db, reading, instrumentId);
  const facts = told(reading, () => {
    holdInstrument(db, content, instrumentId, dayOf(at));
    if (content.kind !== 'measured' || worth.value === null) return NO_FACTS;
    return factsOf(bench, content, { value: worth.value, entry: null, instrumentId, rangeId });
  });
  const fresh: FreshReading = {
    id,
    lotId: lot.id,
    unitId: rows.unit.id,
    characteristicId,
    attempt,
    ...worth,
    entry: null,
    instrumentId,
    note: '',
    repeatReason: null,
    repeatNote: null,
    takenById: null,
    rackImportId: null,
    rackId,
    ...facts,
    waveformId: null,
    takenAt: takenAt(reading.takenAt, lot.drawnAt, at),
    receivedAt: at.toISOString(),
  };
  rows.readings.push({ ...fresh, withdrawnAt: null, withdrawnById: null });
  return fresh;
}
