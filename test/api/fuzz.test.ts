import { demoGaugeStudy } from '#db/demo/gauge-study';
import { lots } from '#db/schema/lots';
import { people, personRoles } from '#db/schema/people';
import { rackParts, racks } from '#db/schema/racks';
import { verifyChain } from '#server/audit/verify-chain';
import { type Endpoint } from '#shared/contract/endpoint';
import { ENDPOINTS } from '#shared/contract/index';
import { type Lot } from '#shared/contract/lots';
import { ROLES, type Role } from '#shared/contract/roles';
import fc from 'fast-check';
import { eq } from 'drizzle-orm';
import process from 'node:process';
import { type Response } from 'supertest';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import * as z from 'zod';
import { addInstrument, addPlannedPart, attribute, booking, drawnLot, measured } from '../support/bench-fixtures';
import { typedReading } from '../support/bench-acts';
import { inputFor } from '../support/odd-input';
import { PASSWORD } from '../support/test-people';
import { addTestRack, addTestToken } from '../support/test-rack';
import { type Agent, testSite, type TestSite } from '../support/test-site';

/** Enough for a short run; QUIETRAIL_FUZZ asks for more. */
const RUNS = Number(process.env['QUIETRAIL_FUZZ'] ?? 1500);
const SEED = Number(process.env['QUIETRAIL_FUZZ_SEED'] ?? 20260312);

const PLAN = {
  level: 'II',
  classAqls: [
    { class: 'critical', aql: '0.65' },
    { class: 'major', aql: '1.0' },
    { class: 'minor', aql: '2.5' },
  ],
  characteristics: [
    measured('v_loaded', 'major', { lower: 11.4, upper: 12.6 }),
    measured('v_no_load', 'minor', { upper: 18 }, { instrumentKind: 'multimeter' }),
    attribute('label', 'minor'),
    {
      ...measured('insulation', 'critical', { lower: 1 }),
      kind: 'computed',
      unit: '%',
      formula: { key: 'load-regulation', inputs: { no_load: 'v_no_load', loaded: 'v_loaded' } },
    },
  ],
} as Parameters<typeof addPlannedPart>[2];

const RACK = fc.oneof(
  fc.constantFrom(
    'unit,v_loaded\n1,12.1\n2,12.2\n3,12.0',
    'unit;v_loaded;label\n1;12,1;pass\n2;1e308;fail',
    '\ufeffunit\tv_loaded\r1\t12.1\r',
    'unit,v_loaded\n1,"12.1\n2,3',
    'unit,unit\n1,1',
    '\u0000\u0001\u00ff',
    'u\u0000n\u0000i\u0000t\u0000',
    `unit${',v_loaded'.repeat(2000)}\n1`,
    `unit,v_loaded\n${'1,12\n'.repeat(2000)}`,
  ),
  fc.string({ unit: 'binary', minLength: 1, maxLength: 300 }),
);

/** The only rack there is. */
const RACK_ID = 1;

const HINTS = {
  characteristicKey: fc.constantFrom('v_loaded', 'v_no_load', 'label', 'insulation', '__proto__'),
  unit: fc.integer({ min: 1, max: 4 }),
  instrumentId: fc.constantFrom(null, 1, 2),
  partId: fc.integer({ min: 1, max: 2 }),
  supplierId: fc.constant(1),
  partIds: fc.constantFrom([1], [1], [], [999]),
  rackId: fc.constantFrom(null, RACK_ID, 999),
  instrument: fc.constantFrom(null, 'MM-01', 'OS-01', 'MM-99'),
  // A rack's own id of a reading.
  id: fc.constantFrom('r-1', 'r-2', 'r-3', '\u0000', '__proto__'),
  instrumentIds: fc.constantFrom([], [1], [1], [2], [1, 1, 999]),
  // Of a rack file, of a typed reading and of a search alike.
  text: fc.oneof(RACK, fc.constantFrom('12.1', '1e300', '5e-324', '-12', '4k7', '12,1', '0')),
  reason: fc.constantFrom('Look at it again', 'Look at it again', null, '\u0000\ud800\u202e', 'x'),
  password: fc.constantFrom(PASSWORD, PASSWORD, 'a guess that is long enough'),
  newPassword: fc.constantFrom(PASSWORD, 'another plain long password', '\u0000'.repeat(20), 'é'.repeat(36)),
  repeat: fc.constantFrom(null, null, { reason: 'contact', note: '' }),
};

const ODD_STEPS = ['0', '-1', '1e3', '999999', '0x1', 'NaN', '%00', '%2e%2e', '%E0%A4%A', '__proto__', '9'.repeat(40)];

/** A reading of the lot at the bench. */
const KNOWN_READING = '0197a000-0000-7000-8000-000000000001';

/** A step of the path: mostly an id that something has. */
const step = fc.oneof(
  { weight: 9, arbitrary: fc.constantFrom('1', '1', '2', '3', '3', '4', '5', '6', '7', '8', '9') },
  { weight: 1, arbitrary: fc.constantFrom(...ODD_STEPS) },
);
const lotNumber = fc.oneof(
  { weight: 9, arbitrary: fc.constantFrom('L-26-0003', 'L-26-0003', 'L-26-0001', 'L-26-0004', 'L-26-0006') },
  { weight: 1, arbitrary: step },
);
const readingStep = fc.oneof(
  { weight: 6, arbitrary: fc.uuid() },
  { weight: 2, arbitrary: fc.constantFrom(KNOWN_READING) },
  { weight: 1, arbitrary: step },
);

function stepFor(name: string): fc.Arbitrary<string> {
  if (name === 'number') return lotNumber;
  return name === 'reading' ? readingStep : step;
}

/** Mostly the version that is current when the request is sent. */
const version = fc.oneof(
  { weight: 9, arbitrary: fc.constant('current') },
  { weight: 1, arbitrary: fc.constantFrom('"1"', '*', 'W/"1"', '""', '1e400', '-1', 'null') },
);

/** Where the work of the line is done; asked more often than the rest. */
const OFTEN = /^\/api\/lots\/:id\/|^\/api\/rack\/|^\/api\/plans\/:id\/revisions/;

type Caller = Role | 'nobody' | 'rack';

interface Attempt {
  endpoint: Endpoint;
  who: Caller;
  path: string;
  query: unknown;
  body: unknown;
  version: string;
}

function attemptAt(endpoint: Endpoint): fc.Arbitrary<Attempt> {
  const names = [...endpoint.path.matchAll(/:(\w+)/g)].map(([, name]) => name ?? '');
  const steps = fc.tuple(...names.map(stepFor));
  const allowed: readonly Caller[] =
    endpoint.who === 'rack' ? ['rack'] : typeof endpoint.who === 'string' ? ROLES : endpoint.who;
  return fc.record({
    endpoint: fc.constant(endpoint),
    who: fc.oneof(
      { weight: 8, arbitrary: fc.constantFrom(...allowed) },
      { weight: 1, arbitrary: fc.constantFrom<Caller[]>(...ROLES, 'nobody', 'rack') },
    ),
    path: steps.map((given) =>
      names.reduce((path, name, at) => path.replace(`:${name}`, given[at] ?? ''), endpoint.path as string),
    ),
    query: inputFor(endpoint.query, {}),
    body: endpoint.body instanceof z.ZodUndefined ? fc.constant(undefined) : inputFor(endpoint.body, HINTS),
    version,
  });
}

function queryText(query: unknown): string {
  if (typeof query !== 'object' || query === null) return '';
  return new URLSearchParams(
    Object.entries(query).map(([name, value]) => [
      name,
      String(typeof value === 'object' ? JSON.stringify(value) : value),
    ]),
  ).toString();
}

function agentOf(site: TestSite, who: Caller): Agent {
  if (who === 'nobody') return site.nobody();
  // A token of its own for each request: none is revoked, and none is used too often.
  return who === 'rack' ? addTestToken(site, RACK_ID).agent : site.as(who);
}

function send(site: TestSite, { endpoint, who, path, query, body, version: named }: Attempt): Promise<Response> {
  const agent = agentOf(site, who);
  const method = endpoint.method.toLowerCase() as 'get' | 'post' | 'put' | 'patch' | 'delete';
  const request = agent[method](`${path}?${queryText(query)}`);
  if (endpoint.versioned) void request.set('if-match', named === 'current' ? currentVersion(site, path) : named);
  if (body === undefined) return Promise.resolve(request);
  return Promise.resolve(request.set('content-type', 'application/json').send(JSON.stringify(body)));
}

/** Where the table has another name than the path. */
const TABLES: Readonly<Record<string, string>> = {
  reviews: 'instrument_reviews',
  'gauge-studies': 'gauge_studies',
};

/** The version of what a path names; 1 where there is no such thing. */
function currentVersion({ db }: TestSite, path: string): string {
  const [, , named = '', id = '', , revision = ''] = path.split('/');
  const table = TABLES[named] ?? named;
  const place = table === 'plans' ? 'plan_revisions where plan_id = ? and revision = ?' : `${table} where id = ?`;
  const values = table === 'plans' ? [id, revision] : [table === 'site' ? '1' : id];
  const found = db.$client.prepare(`select version from ${place}`).get(values) as { version: number } | undefined;
  return `"${found?.version ?? 1}"`;
}

/** Whoever a request has shut out is let in again, so that the next one gets as far. */
function letEverybodyIn({ db, people: persons }: TestSite, passwordHash: string): void {
  for (const role of ROLES) {
    db.update(people).set({ active: true, passwordHash }).where(eq(people.id, persons[role].id)).run();
    db.insert(personRoles).values({ personId: persons[role].id, role }).onConflictDoNothing().run();
  }
  db.update(racks).set({ active: true }).where(eq(racks.id, RACK_ID)).run();
  db.insert(rackParts).values({ rackId: RACK_ID, partId: 1 }).onConflictDoNothing().run();
}

async function lotsAlongTheLine(site: TestSite): Promise<void> {
  const references = addPlannedPart(site.db, site.people.quality.id, PLAN);
  addInstrument(site.db, 'multimeter', 'MM-01');
  addInstrument(site.db, 'oscilloscope', 'OS-01', { status: 'withdrawn' });
  await site.as('receiving').post('/api/lots').send(booking(references, 3)).expect(201);
  await site
    .as('receiving')
    .post('/api/lots')
    .send(booking(references, 1, { cartons: 1 }))
    .expect(201);
  addTestRack(site, { partIds: [references.partId] });
  const study = demoGaugeStudy('meter', { instrumentId: 1, persons: ['A', 'B'], seed: 1 });
  await site.as('quality').post('/api/gauge-studies').send(study).expect(201);
  for (let lot = 0; lot < 7; lot += 1) await drawnLot(site, references, 3);
  await site
    .as('inspector')
    .put(`/api/lots/3/readings/${KNOWN_READING}`)
    .send(typedReading(1, 'v_loaded', '12.1'))
    .expect(200);
  const text = 'unit,v_no_load,v_loaded,label\n1,13,12,pass\n2,13,12,pass\n3,13,12,pass';
  for (const id of [4, 5]) {
    await site
      .as('inspector')
      .post(`/api/lots/${id}/rack-file`)
      .send({ fileName: 'r', text, instrumentIds: [1] })
      .expect(201);
    const { body } = await site.as('quality').get(`/api/lots/${id}`);
    await site
      .as('inspector')
      .post(`/api/lots/${id}/submission`)
      .set('if-match', `"${(body as Lot).version}"`)
      .expect(200);
  }
}

describe('whatever is sent', () => {
  let site: TestSite;
  beforeAll(async () => {
    site = await testSite({ signInAttempts: 100_000 });
    await lotsAlongTheLine(site);
  });
  afterAll(() => site.close());

  it('is answered, refused with a reason, and never breaks the server', { timeout: 600_000 }, async () => {
    const passwordHash = await site.context.passwords.hash(PASSWORD);
    const attempt = fc.oneof(
      ...[...ENDPOINTS.values()].map((endpoint) => ({
        weight: OFTEN.test(endpoint.path) ? 4 : 1,
        arbitrary: attemptAt(endpoint),
      })),
    );
    await fc.assert(
      fc.asyncProperty(attempt, async (one) => {
        letEverybodyIn(site, passwordHash);
        const answer = await send(site, one);
        expect(answer.status, JSON.stringify(answer.body)).toBeLessThan(500);
        if (answer.status < 400) return;
        expect(answer.type).toBe('application/problem+json');
        expect(answer.body).toMatchObject({ status: answer.status });
        expect((answer.body as { title: string }).title).not.toBe('');
      }),
      { numRuns: RUNS, seed: SEED, endOnFailure: true },
    );
  });

  it('leaves records that agree with one another', async () => {
    const client = site.db.$client;
    expect(client.pragma('foreign_key_check')).toEqual([]);
    expect(client.pragma('integrity_check', { simple: true })).toBe('ok');
    expect(await verifyChain(site.db)).toMatchObject({ intact: true });
    for (const { id } of site.db.select({ id: lots.id }).from(lots).all())
      await site.as('quality').get(`/api/lots/${id}`).expect(200);
  });
});
