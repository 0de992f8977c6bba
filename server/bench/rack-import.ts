import { type Db } from '#db/open-database';
import { lots } from '#db/schema/lots';
import { rackImports } from '#db/schema/readings';
import { type Caller } from '#server/caller';
import { type Context } from '#server/context';
import { dayOf } from '#server/instruments/instrument-queries';
import { type LotRow } from '#server/lots/lot-rows';
import { recordLot } from '#server/lots/record-lot';
import { Refused } from '#server/problems';
import { type RackPreview } from '#shared/contract/bench';
import { INSTRUMENT_KIND_TITLES, type InstrumentKind } from '#shared/contract/instruments';
import { mayRepeat } from '#shared/verdict/counting-reading';
import { judgeSample } from '#shared/verdict/judge-sample';
import { type SampleVerdict } from '#shared/verdict/sample-verdict';
import { eq } from 'drizzle-orm';
import { createHash, randomUUID } from 'node:crypto';
import { lotAtBench } from './bench-lot';
import { insertReading } from './insert-reading';
import {
  countingReadings,
  judgedReadings,
  rulesOf,
  unitsOf,
  type LotRules,
  type UnitRows,
} from '#server/judging/lot-judging';
import { rackReadings, type RackContent, type RackReading } from './rack-readings';
import { rackTable } from './rack-table';
import { usableInstrument } from './reading-instrument';
import { keepProgress, type RunningVerdicts } from '#server/judging/running-verdicts';

interface RackBody {
  fileName: string;
  text: string;
  instrumentIds: number[];
}

interface ReadFile {
  rules: LotRules;
  units: UnitRows[];
  content: RackContent;
  instruments: ReadonlyMap<InstrumentKind, number>;
}

function instrumentsByKind(db: Db, ids: readonly number[], today: string): Map<InstrumentKind, number> {
  return new Map(ids.map((id) => [usableInstrument(db, id, today).kind, id]));
}

/** Each measured column needs the instrument that its characteristic asks for. */
function instrumentFaults(
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

function readFile(db: Db, lot: LotRow, body: RackBody, today: string): ReadFile {
  const rules = rulesOf(db, lot);
  const units = unitsOf(db, lot.id);
  const instruments = instrumentsByKind(db, body.instrumentIds, today);
  const table = rackTable(body.text);
  if (table.state === 'no table') {
    const faults = [{ line: table.line, column: null, message: table.message }];
    return { rules, units, instruments, content: { columns: [], rows: 0, readings: [], faults } };
  }
  const taken = new Map(units.map((rows) => [rows.unit.unit, countingReadings(rows.readings)]));
  const everTaken = new Map(units.map((rows) => [rows.unit.unit, rows.readings]));
  const ofCell = (unit: number, id: number) => (everTaken.get(unit) ?? []).filter((row) => row.characteristicId === id);
  const content = rackReadings(table, {
    characteristics: rules.characteristics,
    sampleSize: units.length,
    hasReading: (unit, id) => taken.get(unit)?.has(id) ?? false,
    isUsedUp: (unit, id) => !mayRepeat(ofCell(unit, id).map((row) => ({ withdrawn: row.withdrawnAt !== null }))),
  });
  const faults = [...instrumentFaults(rules, content, instruments), ...content.faults];
  return { rules, units, instruments, content: { ...content, faults } };
}

/** The verdicts as they would be with the file's readings. */
function verdictWith({ rules, units, content }: ReadFile): SampleVerdict {
  const added = new Map<number, RackReading[]>();
  for (const reading of content.readings) {
    const ofUnit = added.get(reading.unit);
    if (ofUnit) ofUnit.push(reading);
    else added.set(reading.unit, [reading]);
  }
  return judgeSample({
    characteristics: rules.rules.characteristics.map(({ characteristic }) => characteristic),
    groups: rules.rules.groups,
    units: units.map((rows) => {
      const judged = judgedReadings(rows, rules.keyOf);
      const more = (added.get(judged.unit) ?? []).map(({ key, value, pass }) => [key, value ?? pass ?? false] as const);
      return { ...judged, values: new Map([...judged.values, ...more]) };
    }),
  });
}

function previewOf(fileName: string, file: ReadFile, verdict: SampleVerdict): RackPreview {
  const { columns, rows, faults } = file.content;
  return {
    fileName,
    rows,
    columns,
    readings: file.content.readings.length,
    faults,
    nonconformingUnits: verdict.units
      .filter((unit) => unit.verdict === 'nonconforming')
      .map(({ unit, failed }) => ({ unit, failed })),
    groups: verdict.groups.map(({ group, found }) => ({
      class: group.class,
      found,
      acceptance: group.acceptance,
      rejection: group.rejection,
    })),
    verdict: verdict.lot.verdict,
    reason: verdict.lot.reason,
  };
}

/** What a rack file would bring; nothing is kept. */
export function previewRackFile(context: Context, lotId: number, body: RackBody): RackPreview {
  const lot = lotAtBench(context.db, lotId);
  const file = readFile(context.db, lot, body, dayOf(context.clock.now()));
  return previewOf(body.fileName, file, verdictWith(file));
}

function holdFaultless({ content }: ReadFile): void {
  const { faults } = content;
  if (faults.length === 0) return;
  const errors = faults.slice(0, 100).map(({ line, column, message }) => ({
    path: ['text', line, ...(column === null ? [] : [column])],
    message: `Line ${line}: ${message}`,
  }));
  const title = `The file has ${faults.length} ${faults.length === 1 ? 'fault' : 'faults'}; nothing was imported.`;
  throw new Refused('rack-file-refused', title, errors);
}

function insertReadings(db: Db, lot: LotRow, file: ReadFile, rackImportId: number, at: string): void {
  const unitIds = new Map(file.units.map(({ unit, readings: rows }) => [unit.unit, { id: unit.id, rows }]));
  const kinds = new Map(
    file.rules.characteristics.map(({ id, content }) => [
      id,
      content.kind === 'computed' ? null : content.instrumentKind,
    ]),
  );
  for (const { unit, characteristicId, value, pass } of file.content.readings) {
    const known = unitIds.get(unit);
    if (!known) throw new Error(`Unit ${unit} is not in the sample.`);
    const kind = kinds.get(characteristicId) ?? null;
    insertReading(db, {
      id: randomUUID(),
      lotId: lot.id,
      unitId: known.id,
      characteristicId,
      attempt: known.rows.filter((row) => row.characteristicId === characteristicId).length + 1,
      value,
      pass,
      entry: null,
      instrumentId: kind === null ? null : (file.instruments.get(kind) ?? null),
      note: '',
      repeatReason: null,
      repeatNote: null,
      takenById: null,
      rackImportId,
      takenAt: at,
      receivedAt: at,
    });
  }
}

/** Imports a rack file: all rows or none. Its readings count as taken by nobody. */
export function importRackFile(
  context: Context,
  verdicts: RunningVerdicts,
  caller: Caller,
  lotId: number,
  body: RackBody,
): RackPreview {
  const at = context.clock.now();
  const preview = context.db.transaction((tx) => {
    const lot = lotAtBench(tx, lotId);
    const file = readFile(tx, lot, body, dayOf(at));
    holdFaultless(file);
    const { fileName, text } = body;
    const sha256 = createHash('sha256').update(text).digest('hex');
    const { id } = tx
      .insert(rackImports)
      .values({
        lotId,
        fileName,
        sha256,
        text,
        rows: file.content.rows,
        importedAt: at.toISOString(),
        importedById: caller.id,
      })
      .returning({ id: rackImports.id })
      .get();
    insertReadings(tx, lot, file, id, at.toISOString());
    if (lot.status === 'drawn') tx.update(lots).set({ status: 'measuring' }).where(eq(lots.id, lotId)).run();
    const note = `${fileName}, ${file.content.readings.length} readings of ${file.content.rows} units`;
    recordLot(tx, { at, person: caller, action: 'imported', lotId, note, after: { sha256, rackImport: id } });
    const verdict = verdictWith(file);
    keepProgress(tx, lot, file.rules, verdict.units, at);
    return previewOf(fileName, file, verdict);
  });
  verdicts.drop(lotId);
  return preview;
}
