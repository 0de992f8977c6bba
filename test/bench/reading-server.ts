import Sqlite from 'better-sqlite3';
import express from 'express';
import { type AddressInfo } from 'node:net';
import process from 'node:process';
import { closeContext, contextOn, listen } from './bench-site';

/** What the program is compared with: the row is inserted as it comes, in the same table under the same pragmas. */
function bareServer(file: string): Promise<number> {
  const db = new Sqlite(file);
  db.exec('pragma journal_mode = WAL; pragma synchronous = FULL; pragma foreign_keys = ON');
  const insert = db.prepare(`insert into readings (id, lot_id, unit_id, characteristic_id, attempt, value, pass, entry,
    instrument_id, note, taken_by_id, taken_at, received_at) values (@id, @lotId, @unitId, @characteristicId, @attempt, @value,
    @pass, @entry, @instrumentId, '', @takenById, @takenAt, @takenAt)`);
  const app = express();
  app.use(express.json());
  app.put('/readings/:id', (request, response) => {
    insert.run({ id: request.params.id, ...(request.body as object) });
    response.json({ done: true });
  });
  return new Promise((resolve) => {
    const server = app.listen(0, '127.0.0.1', () => {
      resolve((server.address() as AddressInfo).port);
    });
  });
}

async function programServer(file: string): Promise<number> {
  const context = contextOn(file);
  process.once('disconnect', () => {
    closeContext(context);
  });
  return (await listen(context)).port;
}

const [kind, file = ''] = process.argv.slice(2);
const port = await (kind === 'bare' ? bareServer(file) : programServer(file));
process.once('disconnect', () => process.exit(0));
process.send?.({ port });
