import { openDatabase, type Database } from '#db/open-database';
import { site } from '#db/schema/site';
import { createApp } from '#server/app';
import { type Context } from '#server/context';
import { type Environment, readEnvironment } from '#server/environment';
import { Stream } from '#server/events/stream';
import { FileStore } from '#server/files/file-store';
import { inProcessPasswords } from '#server/sessions/passwords';
import { signAccessToken } from '#server/sessions/access-token';
import { startSession } from '#server/sessions/start-session';
import { inProcessWaves } from '#server/waveforms/wave-reader';
import { type Role } from '#shared/contract/roles';
import { type Express } from 'express';
import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { fileURLToPath } from 'node:url';
import { pino } from 'pino';
import request from 'supertest';
import { TestClock } from './test-clock';
import { addTestPeople, PASSWORD, PASSWORD_COST, type TestPerson } from './test-people';

const ROOT = fileURLToPath(new URL('../..', import.meta.url));

export type Agent = ReturnType<typeof request.agent>;

export interface TestSite {
  app: Express;
  context: Context;
  db: Database;
  clock: TestClock;
  people: Record<Role, TestPerson>;
  /** Signs a role's person in with the password; the agent keeps the cookies. */
  signIn(role: Role): Promise<Agent>;
  /** An agent of a role's person, or of anybody, with a session but no refresh cookie. */
  as(who: Role | TestPerson): Agent;
  /** An agent of nobody. */
  nobody(): Agent;
  close(): void;
}

function testEnvironment(changes: Partial<Environment>): Environment {
  return {
    ...readEnvironment({ LOG_LEVEL: 'silent', PORT: '3000' }, ROOT),
    dataFolder: mkdtempSync(path.join(tmpdir(), 'quietrail-site-')),
    passwordCost: PASSWORD_COST,
    ...changes,
  };
}

function testContext(environment: Environment, clock: TestClock): Context {
  const db = openDatabase(':memory:', ROOT);
  return {
    db,
    clock,
    environment,
    log: pino({ level: environment.logLevel }),
    passwords: inProcessPasswords(PASSWORD_COST),
    outbox: { wake: () => undefined, close: () => Promise.resolve(), idle: () => Promise.resolve() },
    stream: new Stream({ db, clock }),
    files: new FileStore(environment.dataFolder),
    waves: inProcessWaves(),
  };
}

function addTestSettings(db: Database): void {
  db.insert(site)
    .values({
      name: 'Hollowmere Controls',
      department: 'Incoming inspection',
      address: '3 Weir Lane, Hollowmere',
      engineeringList: ['engineering@hollowmere.example'],
      waitingTargetHours: 8,
      approveOwnPlans: false,
      releaseOwnReadings: false,
    })
    .run();
}

function agentOf(app: Express, context: Context, person: TestPerson): Agent {
  const now = context.clock.now();
  const { sessionId } = startSession(context.db, { personId: person.id, keep: true, now });
  const token = signAccessToken(sessionId, now, context.environment.secret);
  return request.agent(app).set('cookie', `qr_access=${token}`);
}

/** A site in memory with the real migrations: its settings, one person per role, and a clock that stands still. */
export async function testSite(changes: Partial<Environment> = {}): Promise<TestSite> {
  const clock = new TestClock();
  const context = testContext(testEnvironment(changes), clock);
  const { db, stream } = context;
  addTestSettings(db);
  const people = await addTestPeople(db);
  const app = createApp(context);
  return {
    app,
    context,
    db,
    clock,
    people,
    nobody: () => request.agent(app),
    as: (who) => agentOf(app, context, typeof who === 'string' ? people[who] : who),
    signIn: async (role) => {
      const agent = request.agent(app);
      await agent.post('/api/session').send({ email: people[role].email, password: PASSWORD }).expect(200);
      return agent;
    },
    close: () => {
      stream.close();
      db.$client.close();
      rmSync(context.environment.dataFolder, { recursive: true, force: true });
    },
  };
}
