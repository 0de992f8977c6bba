import { type Db } from '#db/open-database';
import { lots } from '#db/schema/lots';
import { rackImports } from '#db/schema/readings';
import { type Caller } from '#server/caller';
import { type Context } from '#server/context';
import { dayOf } from '#server/instruments/instrument-queries';
import { type LotRow } from '#server/lots/lot-rows';
import { recordLot } from '#server/lots/record-lot';
import { Refused } from '#server/problems';
import { type importRackFile as contract, type RackPreview } from '#shared/contract/bench';
import { type InstrumentKind } from '#shared/contract/instruments';
import { mayRepeat } from '#shared/verdict/counting-reading';
import { judgeGroups } from '#shared/verdict/judge-groups';
import { judgeLot } from '#shared/verdict/judge-lot';
import { judgeUnit } from '#shared/verdict/judge-unit';
import { type SampleVerdict } from '#shared/verdict/sample-verdict';
import { eq } from 'drizzle-orm';
import { createHash, randomUUID } from 'node:crypto';
import type * as z from 'zod';
import { racksOf, rememberMapping } from '#server/racks/rack-mapping';
import { lotAtBench } from './bench-lot';
import { expectedOf } from './expected-of';
import { insertReading, type FreshReading } from './insert-reading';
import {
  countingReadings,
  judgedReadings,
  rulesOf,
  unitsOf,
  type LotRules,
  type ReadingRow,
  type UnitRows,
} from '#server/judging/lot-judging';
import { rackReadings, type RackContent, type RackReading } from './rack-readings';
import { rackTable } from './rack-table';
import { questionOf, readingFacts } from './reading-facts';
import { instrumentFaults, instrumentIdFor, instrumentsByKind } from './rack-instruments';
import { keepProgress, type RunningVerdicts } from '#server/judging/running-verdicts';

type RackBody = z.output<(typeof contract)['body']>;

interface ReadFile {
  rules: LotRules;
  units: UnitRows[];
  content: RackContent;
  instruments: ReadonlyMap<InstrumentKind, number>;
}

/** A file is named after a rack only where that rack may measure this part. */
function holdRack(db: Db, lot: LotRow, rackId: number | null): void {
  if (rackId === null || racksOf(db, lot.partId).some(({ id }) => id === rackId)) return;
  const message = 'This rack is not set up for this part.';
  throw new Refused('rack-refused', message, [{ path: ['rackId'], message }]);
}

function readFile(db: Db, lot: LotRow, body: RackBody, today: string): ReadFile {
  holdRack(db, lot, body.rackId);
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
  const expected = expectedOf(db, lot.partId);
  const content = rackReadings(table, {
    mapping: body.mapping,
    factsOf: (characteristic, value) => {
      const given = { value, entry: null, instrumentId: instrumentIdFor(characteristic, instruments), rangeId: null };
      const question = questionOf(characteristic, expected, given) ?? null;
      return { ...readingFacts(db, rules.revision, characteristic, given), question };
    },
    characteristics: rules.characteristics,
    sampleSize: units.length,
    hasReading: (unit, id) => taken.get(unit)?.has(id) ?? false,
    isUsedUp: (unit, id) => !mayRepeat(ofCell(unit, id).map((row) => ({ withdrawn: row.withdrawnAt !== null }))),
  });
  const faults = [...instrumentFaults(rules, content, instruments), ...content.faults];
  return { rules, units, instruments, content: { ...content, faults } };
}

/** Where readings of a file come from, beside the file itself. */
interface Origin {
  rackImportId: number | null;
  rackId: number | null;
  at: string;
}

/** A reading of the file as it is to be kept; it counts as taken by nobody. */
function freshReading({ instruments }: ReadFile, { unit, readings }: UnitRows, read: RackReading, origin: Origin) {
  const { id: characteristicId, content } = read.characteristic;
  const { value, pass, rangeId, expandedUncertainty, question } = read;
  const { rackImportId, rackId, at } = origin;
  return {
    id: randomUUID(),
    lotId: unit.lotId,
    unitId: unit.id,
    characteristicId,
    attempt: readings.filter((row) => row.characteristicId === characteristicId).length + 1,
    value,
    pass,
    entry: null,
    instrumentId: instrumentIdFor(content, instruments),
    note: '',
    repeatReason: null,
    repeatNote: null,
    takenById: null,
    rackImportId,
    rackId,
    rangeId,
    expandedUncertainty,
    waveformId: null,
    question,
    takenAt: at,
    receivedAt: at,
  };
}

function byUnit(readings: readonly RackReading[]): Map<number, RackReading[]> {
  const units = new Map<number, RackReading[]>();
  for (const reading of readings) {
    const ofUnit = units.get(reading.unit);
    if (ofUnit) ofUnit.push(reading);
    else units.set(reading.unit, [reading]);
  }
  return units;
}

/**
 * The verdicts with the file's readings, which are taken in unit by unit: a large file's rows are never all in memory.
 *
 * @param take keeps a reading, or only makes its row
 */
function verdictWith(db: Db, file: ReadFile, origin: Origin, take: (fresh: FreshReading) => ReadingRow): SampleVerdict {
  const { rules, units, content } = file;
  const added = byUnit(content.readings);
  const judged = units.map((rows) => {
    const taken = (added.get(rows.unit.unit) ?? []).map((read) => take(freshReading(file, rows, read, origin)));
    const all = { unit: rows.unit, readings: [...rows.readings, ...taken] };
    return judgeUnit(rules.rules, judgedReadings(db, all, rules));
  });
  const groups = judgeGroups(rules.rules, judged);
  return { units: judged, groups, lot: judgeLot(rules.rules, judged, groups) };
}

function previewOf(fileName: string, file: ReadFile, verdict: SampleVerdict): RackPreview {
  const { columns, rows, faults } = file.content;
  return {
    fileName,
    rows,
    columns,
    readings: file.content.readings.length,
    faults,
    questions: file.content.readings.flatMap(({ unit, characteristic, value, question }) =>
      question === null || value === null
        ? []
        : [{ unit, characteristicKey: characteristic.content.key, value, sentence: question.sentence }],
    ),
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
  const at = context.clock.now();
  const file = readFile(context.db, lot, body, dayOf(at));
  const origin = { rackImportId: null, rackId: body.rackId, at: at.toISOString() };
  const verdict = verdictWith(context.db, file, origin, (fresh) => ({
    ...fresh,
    withdrawnAt: null,
    withdrawnById: null,
  }));
  return previewOf(body.fileName, file, verdict);
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

/** What was said of the columns that the file has; of others nothing was shown to be so. */
function ofFile({ content }: ReadFile, { mapping }: RackBody): RackBody['mapping'] {
  const headers = new Set(content.columns.map(({ header }) => header));
  return Object.fromEntries(Object.entries(mapping).filter(([header]) => headers.has(header)));
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
    const origin = { rackImportId: id, rackId: body.rackId, at: at.toISOString() };
    const verdict = verdictWith(tx, file, origin, (fresh) => insertReading(tx, fresh));
    if (body.rackId !== null) rememberMapping(tx, caller, { rackId: body.rackId, mapping: ofFile(file, body), at });
    if (lot.status === 'drawn') tx.update(lots).set({ status: 'measuring' }).where(eq(lots.id, lotId)).run();
    const note = `${fileName}, ${file.content.readings.length} readings of ${file.content.rows} units`;
    recordLot(tx, { at, person: caller, action: 'imported', lotId, note, after: { sha256, rackImport: id } });
    keepProgress(tx, lot, file.rules, verdict.units, at);
    return previewOf(fileName, file, verdict);
  });
  verdicts.drop(lotId);
  return preview;
}
