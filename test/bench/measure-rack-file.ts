import { type Caller } from '#server/caller';
import { type Context } from '#server/context';
import path from 'node:path';
import { cellImport, rowImport } from './bare-imports';
import { accessOf, closeContext, contextOn, listen, settle } from './bench-site';
import { planOf, typedCharacteristics } from './bench-plan';
import { type DrawnLot, drawnLots, planned, type Planned } from './drawn-lots';
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

/** A site with a lot for each turn. */
interface RackSite {
  context: Context;
  caller: Caller;
  references: Planned;
  lots: DrawnLot[];
}

async function rackSite(file: string): Promise<RackSite> {
  const context = contextOn(file);
  const caller = await settle(context);
  const references = planned(context, caller.id, planOf(CHARACTERISTICS, 'III'));
  const lots = drawnLots(context, caller, references, { lots: TURNS, quantity: QUANTITY });
  return { context, caller, references, lots };
}

async function send(address: string, access: string, body: object): Promise<void> {
  const headers = { 'content-type': 'application/json', cookie: `qr_access=${access}` };
  const answer = await fetch(address, { method: 'POST', headers, body: JSON.stringify(body) });
  if (answer.status !== 201) throw new Error(`The rack file was answered with ${answer.status}.`);
  await answer.arrayBuffer();
}

interface Turn {
  program: number;
  cells: number;
  rows: number;
}

/** Imports alternate with what they are compared with; each is of a lot of its own. */
async function turnsOf({ context, caller, references, lots }: RackSite, folder: string): Promise<Turn[]> {
  const rowsFile = path.join(folder, 'rack-rows.db');
  closeContext((await rackSite(rowsFile)).context);
  const [cells, rows] = [cellImport(path.join(folder, 'rack-cells.db')), rowImport(rowsFile, references)];
  const access = accessOf(context, caller);
  const { port, close } = await listen(context);
  const turns: Turn[] = [];
  for (const lot of lots) {
    const text = rackFile(lot.sampleSize);
    const body = { fileName: 'rack.csv', text, instrumentIds: [references.instrumentId] };
    turns.push({
      cells: await timeOf(() => cells(text, lot)),
      program: await timeOf(() => send(`http://127.0.0.1:${port}/api/lots/${lot.id}/rack-file`, access, body)),
      rows: await timeOf(() => rows(text, lot)),
    });
  }
  close();
  return turns;
}

export async function measureRackFile(folder: string): Promise<Line[]> {
  const site = await rackSite(path.join(folder, 'rack.db'));
  const turns = await turnsOf(site, folder);
  closeContext(site.context);
  const of = (what: keyof Turn) => `${median(turns.map((turn) => turn[what])).toFixed(0)} ms`;
  const ratios = (under: 'cells' | 'rows') => turns.map((turn) => turn.program / turn[under]);
  const readings = CHARACTERISTICS.length * (site.lots[0]?.sampleSize ?? 0);
  return [
    {
      what: `rack CSV of ${readings} readings, against a bare insert of its cells`,
      measured: `x ${spread(ratios('cells'), 1)}, ${of('program')} against ${of('cells')}`,
      bar: '<= 4 x',
      holds: median(ratios('cells')) <= 4,
    },
    {
      what: '  against a bare insert of the same rows of readings',
      measured: `x ${spread(ratios('rows'), 1)}, against ${of('rows')}`,
      bar: '',
      holds: null,
    },
  ];
}
