import { openDatabase } from '#db/open-database';
import { site } from '#db/schema/site';
import { createApp } from '#server/app';
import { type Caller } from '#server/caller';
import { systemClock } from '#server/clock';
import { type Context } from '#server/context';
import { readEnvironment } from '#server/environment';
import { Stream } from '#server/events/stream';
import { FileStore } from '#server/files/file-store';
import { signAccessToken } from '#server/sessions/access-token';
import { inProcessPasswords } from '#server/sessions/passwords';
import { startSession } from '#server/sessions/start-session';
import { inProcessWaves } from '#server/waveforms/wave-reader';
import { type AddressInfo } from 'node:net';
import path from 'node:path';
import process from 'node:process';
import { pino } from 'pino';
import { addTestPerson } from '../support/test-people';

/** The program on a file, as it runs at a site; mail is left out. */
export function contextOn(file: string): Context {
  const root = process.cwd();
  const environment = readEnvironment({}, root);
  const db = openDatabase(file, root);
  const clock = systemClock;
  return {
    db,
    clock,
    environment,
    log: pino({ level: environment.logLevel }),
    passwords: inProcessPasswords(environment.passwordCost),
    outbox: { wake: () => undefined, close: () => Promise.resolve(), idle: () => Promise.resolve() },
    stream: new Stream({ db, clock }),
    files: new FileStore(path.join(path.dirname(file), 'files')),
    waves: inProcessWaves(),
  };
}

export function closeContext({ db, stream }: Context): void {
  stream.close();
  db.$client.close();
}

/** Settings, and the one person who does everything here. */
export async function settle({ db }: Context): Promise<Caller> {
  db.insert(site)
    .values({
      name: 'Hollowmere Controls',
      department: 'Incoming inspection',
      address: '3 Weir Lane, Hollowmere',
      engineeringList: [],
      waitingTargetHours: 8,
      approveOwnPlans: true,
      releaseOwnReadings: true,
    })
    .run();
  const roles = ['receiving', 'inspector', 'quality'] as const;
  const stampNumber = '14';
  const person = await addTestPerson(db, {
    name: 'Ines Benchley',
    email: 'ines@hollowmere.example',
    roles,
    stampNumber,
  });
  return { ...person, stampNumber, roles, sessionId: '' };
}

/** The value of the cookie of a person who has just signed in. */
export function accessOf({ db, clock, environment }: Context, { id }: Caller): string {
  const now = clock.now();
  const { sessionId } = startSession(db, { personId: id, keep: true, now });
  return signAccessToken(sessionId, now, environment.secret);
}

/** Lets the program listen on a free port of this machine. */
export function listen(context: Context): Promise<{ port: number; close: () => void }> {
  return new Promise((resolve) => {
    const server = createApp(context).listen(0, '127.0.0.1', () => {
      const { port } = server.address() as AddressInfo;
      const close = () => {
        context.stream.close();
        server.closeAllConnections();
        server.close();
      };
      resolve({ port, close });
    });
  });
}
