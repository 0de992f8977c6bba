import Sqlite from 'better-sqlite3';
import { randomUUID } from 'node:crypto';
import { type DrawnLot, type Planned } from './drawn-lots';

/** Takes a rack file in without looking at it, in one transaction. */
export type BareImport = (text: string, lot: DrawnLot) => void;

/** Calls back with unit, key and text of each cell; the file is split, nothing is quoted in it. */
function forEachCell(text: string, take: (unit: number, key: string, cell: string) => void): void {
  const [head = '', ...rows] = text.trimEnd().split('\n');
  const [, ...keys] = head.split(',');
  for (const row of rows) {
    const [unit, ...cells] = row.split(',');
    cells.forEach((cell, index) => {
      take(Number(unit), keys[index] ?? '', cell);
    });
  }
}

/** What the import of the sqlite3 shell does of a file with a row for each cell: a table of text without any index. */
export function cellImport(file: string): BareImport {
  const db = new Sqlite(file);
  db.exec('pragma journal_mode = WAL; pragma synchronous = FULL; create table cells (unit text, key text, value text)');
  const insert = db.prepare('insert into cells values (?, ?, ?)');
  return db.transaction((text: string) => {
    forEachCell(text, (unit, key, cell) => insert.run(unit, key, cell));
  });
}

/** The rows that the program writes, in the same table of another file. */
export function rowImport(file: string, { characteristicIds, instrumentId }: Planned): BareImport {
  const db = new Sqlite(file);
  db.exec('pragma journal_mode = WAL; pragma synchronous = FULL; pragma foreign_keys = ON');
  const units = db.prepare<[number], number>('select id from sample_units where lot_id = ? order by unit').pluck();
  const insert = db.prepare(`insert into readings
    (id, lot_id, unit_id, characteristic_id, attempt, value, pass, instrument_id, note, taken_at, received_at)
    values (?, ?, ?, ?, 1, ?, ?, ?, '', ?, ?)`);
  const at = new Date().toISOString();
  return db.transaction((text: string, lot: DrawnLot) => {
    const unitIds = units.all(lot.id);
    forEachCell(text, (unit, key, cell) => {
      const worth = cell === 'pass' ? [null, 1] : [Number(cell), null];
      const place = [randomUUID(), lot.id, unitIds[unit - 1], characteristicIds.get(key)];
      insert.run(...place, ...worth, instrumentId, at, at);
    });
  });
}
