import { DEMO_PASSWORD, DEMO_SIGN_INS } from '#db/demo/sign-ins';
import { type Database, openDatabase } from '#db/open-database';
import { people } from '#db/schema/people';
import { inArray } from 'drizzle-orm';
import { existsSync, mkdirSync, renameSync, rmSync } from 'node:fs';
import path from 'node:path';
import pino from 'pino';
import { startReminders } from './calibrations/remind-daily';
import { makeMissingFiles } from './certificates/make-certificate-file';
import { systemClock } from './clock';
import { type Context } from './context';
import { playDemo } from './demo/play-demo';
import { type Environment, EnvironmentRefused } from './environment';
import { Stream } from './events/stream';
import { FileStore } from './files/file-store';
import { type Outbox, startOutbox } from './mail/outbox';
import { startSmtpFake } from './mail/smtp-fake';
import { smtpTransport } from './mail/transport';
import { completeExpected } from './parts/complete-expected';
import { type Passwords, workerPasswords } from './sessions/passwords';
import { inProcessWaves, type WaveReader, workerWaves } from './waveforms/wave-reader';

/** Seed of the demo: the same quarter at every first start, up to the day. */
const DEMO_SEED = 20_26;

/** The running parts of the program, and how to stop them in order. */
export interface Running {
  context: Context;
  close(): Promise<void>;
}

/** Uploaded files lie beside the database. */
function filesOf(environment: Environment): FileStore {
  return new FileStore(path.join(environment.dataFolder, 'files'));
}

/** Starts everything on a database but the listening: mail, its local fake when no server is named, the live counts. */
async function startOn(
  db: Database,
  environment: Environment,
  passwords: Passwords,
  waves: WaveReader,
): Promise<Running> {
  const log = pino({ level: environment.logLevel });
  const clock = systemClock;
  const fake = environment.smtpUrl === undefined ? await startSmtpFake({ db, clock, log }) : undefined;
  const transport = smtpTransport(environment.smtpUrl ?? fake?.url ?? '');
  const outbox = startOutbox({ db, clock, log, transport, from: environment.mailFrom });
  const stream = new Stream({ db, clock });
  const files = filesOf(environment);
  files.sweep(db);
  const context = { db, clock, environment, log, passwords, outbox, stream, files, waves };
  return {
    context,
    close: async () => {
      stream.close();
      await outbox.close();
      await fake?.close();
      db.$client.close();
    },
  };
}

/** While the demo is made nothing is sent but what the demo itself sends, at its own time. */
const QUIET_OUTBOX: Outbox = { wake: () => undefined, close: () => Promise.resolve(), idle: () => Promise.resolve() };

/** The demo is made in a file of its own and put in place when it is whole, so that a stop in between leaves nothing half made. */
async function makeDemo(file: string, environment: Environment, passwords: Passwords): Promise<void> {
  const draft = `${file}.being-made`;
  for (const leftOver of [draft, `${draft}-wal`, `${draft}-shm`]) rmSync(leftOver, { force: true });
  const db = openDatabase(draft, environment.root);
  db.$client.pragma('synchronous = OFF');
  const clock = systemClock;
  const stream = new Stream({ db, clock });
  const log = pino({ level: environment.logLevel });
  const files = filesOf(environment);
  const context = {
    db,
    clock,
    environment,
    log,
    passwords,
    outbox: QUIET_OUTBOX,
    stream,
    files,
    waves: inProcessWaves(),
  };
  await playDemo(context, { until: clock.now(), seed: DEMO_SEED });
  stream.close();
  db.$client.pragma('wal_checkpoint(TRUNCATE)');
  db.$client.close();
  renameSync(draft, file);
}

/** Production does not run on the people of the demo. */
async function refuseDemoPeople(db: Database, passwords: Passwords): Promise<void> {
  const known = db
    .select({ hash: people.passwordHash })
    .from(people)
    .where(
      inArray(
        people.email,
        DEMO_SIGN_INS.map(({ email }) => email),
      ),
    )
    .all();
  for (const { hash } of known)
    if (hash !== null && (await passwords.matches(DEMO_PASSWORD, hash)))
      throw new EnvironmentRefused('QUIETRAIL_DATA: this folder holds the demo, whose passwords are public.');
}

/**
 * Opens the data folder and starts the program on it; in demo mode an empty folder is given the demo first.
 *
 * @param threads the folder in which the compiled threads lie
 * @throws {EnvironmentRefused} when production would run on demo data
 */
export async function start(environment: Environment, threads: URL): Promise<Running> {
  mkdirSync(environment.dataFolder, { recursive: true });
  const file = path.join(environment.dataFolder, 'quietrail.db');
  const passwords = workerPasswords(environment.passwordCost, new URL('password-worker.js', threads));
  if (environment.mode === 'demo' && !existsSync(file)) await makeDemo(file, environment, passwords);
  const db = openDatabase(file, environment.root);
  if (environment.mode === 'production') await refuseDemoPeople(db, passwords);
  completeExpected(db);
  const waves = workerWaves(new URL('waveform-worker.js', threads));
  const running = await startOn(db, environment, passwords, waves);
  await makeMissingFiles(running.context);
  const stopReminders = startReminders(running.context);
  return {
    context: running.context,
    close: async () => {
      stopReminders();
      await running.close();
      await Promise.all([passwords.close(), waves.close()]);
    },
  };
}
