import { type Db } from '#db/open-database';
import { preparedOnce } from '#db/prepared-once';
import { lots } from '#db/schema/lots';
import { people } from '#db/schema/people';
import { readings } from '#db/schema/readings';
import { canonicalJson } from '#server/audit/canonical-json';
import { record } from '#server/audit/record';
import { type Caller } from '#server/caller';
import { type Context } from '#server/context';
import { dayOf } from '#server/instruments/instrument-queries';
import { findLot, type LotRow } from '#server/lots/lot-rows';
import { recordLot } from '#server/lots/record-lot';
import { Conflict, Refused } from '#server/problems';
import { type Kept, type ReadingBody } from '#shared/contract/bench';
import { type Characteristic } from '#shared/contract/plans';
import { mayRepeat } from '#shared/verdict/counting-reading';
import { eq, sql } from 'drizzle-orm';
import { lotAtBench } from './bench-lot';
import { entryValue } from './entry-value';
import { expectedOf } from './expected-of';
import { insertReading } from './insert-reading';
import { countingReadings, unitOf, type LotRules, type ReadingRow, type UnitRows } from '#server/judging/lot-judging';
import { holdInstrument } from './reading-instrument';
import { answeredQuestion, questionOf, readingFacts } from './reading-facts';
import { readingView } from './reading-view';
import { takenAt } from './taken-at';
import { waveOf } from './wave-of';
import { rejudge, runningVerdict, type RunningVerdict, type RunningVerdicts } from '#server/judging/running-verdicts';

const readingById = preparedOnce((db) =>
  db
    .select()
    .from(readings)
    .where(eq(readings.id, sql.placeholder('id')))
    .prepare(),
);

const personById = preparedOnce((db) =>
  db
    .select({ name: people.name })
    .from(people)
    .where(eq(people.id, sql.placeholder('id')))
    .prepare(),
);

interface Cell {
  characteristicId: number;
  rows: UnitRows;
  /** All readings of the cell, the withdrawn ones too, in the order they were taken. */
  earlier: ReadingRow[];
}

function refuse(field: string, message: string): never {
  throw new Refused('reading-refused', message, [{ path: [field], message }]);
}

function cellOf(db: Db, lot: LotRow, { characteristics }: LotRules, body: ReadingBody): Cell {
  const characteristic = characteristics.find(({ content }) => content.key === body.characteristicKey);
  if (!characteristic) return refuse('characteristicKey', `The plan has no characteristic ${body.characteristicKey}.`);
  const rows = unitOf(db, lot.id, body.unit);
  if (!rows) return refuse('unit', `Unit ${body.unit} is not in the sample of ${lot.sampleSize ?? 0}.`);
  const earlier = rows.readings.filter((row) => row.characteristicId === characteristic.id);
  return { characteristicId: characteristic.id, rows, earlier };
}

function nameOf(db: Db, personId: number | null): string {
  const found = personId === null ? undefined : personById(db).get({ id: personId });
  return found?.name ?? 'a rack';
}

/** A cell that has a reading takes another one only as a repeat with its reason, and two of those at most. */
function holdRepeat(db: Db, { rows, earlier, characteristicId }: Cell, body: ReadingBody): void {
  const counting = countingReadings(rows.readings).get(characteristicId);
  if (counting && !body.repeat)
    throw new Conflict(
      'reading-there-already',
      `Unit ${body.unit} has this reading already, by ${nameOf(db, counting.takenById)}. Repeat it with a reason.`,
    );
  if (!counting && body.repeat) refuse('repeat', 'There is no reading to repeat.');
  if (!mayRepeat(earlier.map((row) => ({ withdrawn: row.withdrawnAt !== null }))))
    throw new Conflict('no-more-repeats', `Unit ${body.unit} has had this reading three times; set the unit aside.`);
}

function isSame(row: ReadingRow, cell: Cell, body: ReadingBody): boolean {
  return (
    row.unitId === cell.rows.unit.id &&
    row.characteristicId === cell.characteristicId &&
    row.instrumentId === body.instrumentId &&
    canonicalJson(row.entry) === canonicalJson(body.entry)
  );
}

/**
 * The same reading sent twice is acknowledged twice, also when its lot has left the bench meanwhile; another one under the
 * same id is refused.
 */
function knownAlready(db: Db, verdicts: RunningVerdicts, known: ReadingRow, lotId: number, body: ReadingBody) {
  const used = new Conflict('reading-id-used', 'Another reading has this id already.');
  if (known.lotId !== lotId) throw used;
  const { lot } = findLot(db, lotId);
  const held = verdicts.of(db, lot);
  if (!isSame(known, cellOf(db, lot, held.rules, body), body)) throw used;
  return { row: known, running: runningVerdict(held, body.unit) };
}

/** The first reading of a drawn lot starts its measuring. */
export function startMeasuring(db: Db, lot: LotRow, caller: Caller, at: Date): void {
  if (lot.status !== 'drawn') return;
  db.update(lots).set({ status: 'measuring' }).where(eq(lots.id, lot.id)).run();
  recordLot(db, { at, person: caller, action: 'started', lotId: lot.id, note: '' });
}

/** Range, uncertainty and plausibility of a measured value; nothing of the kind for what is judged by eye. */
function measuredFacts(
  db: Db,
  lot: LotRow,
  rules: LotRules,
  content: Characteristic,
  given: { body: ReadingBody; value: number | null; by: { name: string; at: Date } },
) {
  const { body, value, by } = given;
  if (content.kind !== 'measured' || value === null)
    return { rangeId: null, expandedUncertainty: null, question: null } as const;
  const { entry, instrumentId, rangeId } = body;
  const facts = readingFacts(db, rules.revision, content, { value, entry, instrumentId, rangeId });
  const expected = expectedOf(db, lot.partId);
  const corrected = () => {
    if (body.question?.answer !== 'corrected') return undefined;
    const from = body.question.from;
    const before = entryValue(from, content, waveOf(db, lot, { ...body, entry: from })).value;
    return before === null ? undefined : questionOf(content, expected, { value: before, entry: from });
  };
  const question = answeredQuestion(questionOf(content, expected, { value, entry }), body.question, by, corrected);
  return { ...facts, question };
}

function insert(
  db: Db,
  lot: LotRow,
  cell: Cell,
  caller: Caller,
  id: string,
  body: ReadingBody,
  rules: LotRules,
  at: Date,
) {
  const content = rules.characteristics.find((one) => one.id === cell.characteristicId)?.content;
  if (!content) throw new Error('A cell without characteristic.');
  const worth = entryValue(body.entry, content, waveOf(db, lot, body));
  holdInstrument(db, content, body.instrumentId, dayOf(at));
  holdRepeat(db, cell, body);
  const measured = measuredFacts(db, lot, rules, content, { body, value: worth.value, by: { name: caller.name, at } });
  const row = insertReading(db, {
    id,
    lotId: lot.id,
    unitId: cell.rows.unit.id,
    characteristicId: cell.characteristicId,
    attempt: cell.earlier.length + 1,
    ...worth,
    ...measured,
    entry: body.entry,
    instrumentId: body.instrumentId,
    waveformId: body.entry.kind === 'waveform' ? body.entry.waveformId : null,
    rackId: null,
    note: body.note,
    repeatReason: body.repeat?.reason ?? null,
    repeatNote: body.repeat?.note ?? null,
    takenById: caller.id,
    rackImportId: null,
    takenAt: takenAt(body.takenAt, lot.drawnAt, at),
    receivedAt: at.toISOString(),
  });
  record(db, {
    at,
    person: caller,
    action: 'kept',
    subject: 'reading',
    subjectId: id,
    after: {
      lot: lot.id,
      unit: body.unit,
      characteristic: content.key,
      ...worth,
      attempt: row.attempt,
      ...(row.question && { question: row.question.given }),
    },
  });
  return row;
}

function acknowledge(db: Db, row: ReadingRow, body: ReadingBody, running: RunningVerdict): Kept {
  const names = {
    people: new Map([[row.takenById ?? 0, nameOf(db, row.takenById)]]),
    racks: new Map<number, string>(),
  };
  return {
    reading: readingView(row, body.unit, body.characteristicKey, names),
    verdict: running.unit.characteristics.get(body.characteristicKey)?.verdict ?? 'not judged',
    unitVerdict: running.unit.verdict,
    stop: running.lot.stop,
    lotReason: running.lot.reason,
  };
}

/**
 * Keeps a reading under the id its client made. When this returns, the reading is on the disk.
 *
 * @throws {Refused | Conflict} telling the inspector what to do
 */
export function keepReading(
  context: Context,
  verdicts: RunningVerdicts,
  caller: Caller,
  lotId: number,
  id: string,
  body: ReadingBody,
): Kept {
  const at = context.clock.now();
  const { row, running } = context.db.transaction((tx) => {
    const known = readingById(tx).get({ id });
    if (known) return knownAlready(tx, verdicts, known, lotId, body);
    const lot = lotAtBench(tx, lotId);
    const held = verdicts.of(tx, lot);
    const cell = cellOf(tx, lot, held.rules, body);
    startMeasuring(tx, lot, caller, at);
    const kept = insert(tx, lot, cell, caller, id, body, held.rules, at);
    const { unit, readings: earlier } = cell.rows;
    return { row: kept, running: rejudge(tx, lot, held, { unit, readings: [...earlier, kept] }, at) };
  });
  verdicts.commit(lotId, running.unit);
  return acknowledge(context.db, row, body, running);
}
