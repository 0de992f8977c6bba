import Sqlite from 'better-sqlite3';
import path from 'node:path';
import { accessOf, closeContext, contextOn, listen, settle } from './bench-site';
import { planOf, typedCharacteristics } from './bench-plan';
import { type DrawnLot, drawnLots, planned } from './drawn-lots';
import { median, spread } from './quantile';
import { type Line } from './report';
import { timeOf } from './timing';

/** The most that the contract takes: 40 characteristics, and the largest sample of the tables. */
const CHARACTERISTICS = typedCharacteristics(40);
const QUANTITY = 600_000;
const TURNS = 5;

function rackFile(units: number): string {
  const row = (unit: number) =>
    CHARACTERISTICS.map(({ kind }, index) =>
      kind === 'attribute' ? 'pass' : (12 + ((unit * 7 + index) % 97) / 1000).toFixed(3),
    );
  const rows = Array.from({ length: units }, (_, index) => [index + 1, ...row(index + 1)].join());
  return [['unit', ...CHARACTERISTICS.map(({ key }) => key)].join(), ...rows, ''].join('\n');
}

/** A row for each cell, in one transaction and a table without any index: the file is split, nothing is looked at. */
function bareImport(file: string): (text: string) => void {
  const db = new Sqlite(file);
  db.exec('pragma journal_mode = WAL; pragma synchronous = FULL; create table cells (unit text, key text, value text)');
  const insert = db.prepare('insert into cells values (?, ?, ?)');
  return db.transaction((text: string) => {
    const [head = '', ...rows] = text.trimEnd().split('\n');
    const [, ...keys] = head.split(',');
    for (const row of rows) {
      const [unit, ...cells] = row.split(',');
      cells.forEach((cell, index) => insert.run(unit, keys[index], cell));
    }
  });
}

async function importOf(address: string, access: string, lot: DrawnLot, body: object): Promise<void> {
  const answer = await fetch(`${address}/api/lots/${lot.id}/rack-file`, {
    method: 'POST',
    headers: { 'content-type': 'application/json', cookie: `qr_access=${access}` },
    body: JSON.stringify(body),
  });
  if (answer.status !== 201) throw new Error(`The rack file was answered with ${answer.status}.`);
  await answer.arrayBuffer();
}

/** Imports alternate with bare inserts; each import is of a lot of its own. */
async function alternate(folder: string) {
  const context = contextOn(path.join(folder, 'rack.db'));
  const caller = await settle(context);
  const references = planned(context, caller.id, planOf(CHARACTERISTICS, 'III'));
  const lots = drawnLots(context, caller, references, { lots: TURNS, quantity: QUANTITY });
  const access = accessOf(context, caller);
  const { port, close } = await listen(context);
  const text = rackFile(lots[0]?.sampleSize ?? 0);
  const bare = bareImport(path.join(folder, 'cells.db'));
  const times: { ours: number; theirs: number }[] = [];
  for (const lot of lots) {
    const theirs = await timeOf(() => bare(text));
    const body = { fileName: 'rack.csv', text, instrumentIds: [references.instrumentId] };
    const ours = await timeOf(() => importOf(`http://127.0.0.1:${port}`, access, lot, body));
    times.push({ ours, theirs });
  }
  close();
  closeContext(context);
  return { times, readings: CHARACTERISTICS.length * (lots[0]?.sampleSize ?? 0) };
}

export async function measureRackFile(folder: string): Promise<Line[]> {
  const { times, readings } = await alternate(folder);
  const ratios = times.map(({ ours, theirs }) => ours / theirs);
  const [ours, theirs] = [median(times.map((one) => one.ours)), median(times.map((one) => one.theirs))];
  return [
    {
      what: `rack CSV of ${readings} readings, against a bare insert of its cells`,
      measured: `x ${spread(ratios, 1)}, ${ours.toFixed(0)} ms against ${theirs.toFixed(0)}`,
      bar: '<= 4 x',
      holds: median(ratios) <= 4,
    },
  ];
}
