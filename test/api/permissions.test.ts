import { type Endpoint } from '#shared/contract/endpoint';
import { ENDPOINTS } from '#shared/contract/index';
import { ROLES, type Role } from '#shared/contract/roles';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import * as z from 'zod';
import { addTestRack } from '../support/test-rack';
import { type Agent, testSite, type TestSite } from '../support/test-site';

/** Calls an endpoint with nothing that it could do: ids that do not exist, and no body unless one is given. */
function call(agent: Agent, endpoint: Endpoint, body?: object) {
  const url = endpoint.path.replaceAll(/:(\w+)/g, (_, name: string) =>
    name === 'reading' ? '0197a000-0000-7000-8000-000000000000' : '999999',
  );
  const method = endpoint.method.toLowerCase() as 'get' | 'post' | 'put' | 'patch' | 'delete';
  const request = agent[method](url);
  if (endpoint.versioned) void request.set('if-match', '"1"');
  return body === undefined ? request : request.send(body);
}

function isAllowed(endpoint: Endpoint, role: Role): boolean {
  return endpoint.who === 'anyone' || endpoint.who === 'signed-in' || endpoint.who.includes(role);
}

const endpoints = [...ENDPOINTS.entries()];

describe('who may call what', () => {
  let site: TestSite;
  let rackAgent: Agent;
  beforeAll(async () => {
    site = await testSite();
    rackAgent = addTestRack(site).agent;
  });
  afterAll(() => site.close());

  it.each(endpoints)('%s is there', async (_name, endpoint) => {
    const answer = await call(site.nobody(), endpoint);
    expect((answer.body as { code?: string }).code).not.toBe('no-such-endpoint');
  });

  it.each(endpoints.filter(([, { who }]) => who !== 'anyone'))('%s asks nobody in', async (_name, endpoint) => {
    const answer = await call(site.nobody(), endpoint);
    expect(answer.status).toBe(401);
    expect(answer.type).toBe('application/problem+json');
    expect(answer.body).toMatchObject({ code: 'signed-out', status: 401 });
  });

  for (const role of ROLES) {
    it.each(endpoints)(`%s, asked as ${role}`, async (name, endpoint) => {
      const answer = await call(site.as(role), endpoint);
      if (isAllowed(endpoint, role)) {
        // Whoever has no refresh cookie is told so by the one endpoint that lives on it.
        if (name !== 'refreshSession') expect(answer.status).not.toBe(401);
        expect(answer.status).not.toBe(403);
        expect(answer.status).toBeLessThan(500);
      } else {
        expect(answer.status).toBe(403);
        expect(answer.body).toMatchObject({ code: 'forbidden' });
      }
    });
  }

  it.each(endpoints)('%s, asked by a test rack', async (_name, endpoint) => {
    const answer = await call(rackAgent, endpoint);
    const isAsked = endpoint.who === 'rack' || endpoint.who === 'anyone';
    if (!isAsked) expect(answer.status).toBe(403);
    else if (endpoint.who === 'rack') expect([400, 404]).toContain(answer.status);
    expect(answer.status).toBeLessThan(500);
  });

  it('answers what is not in the contract as unknown', async () => {
    const answer = await site.as('quality').get('/api/nothing').expect(404);
    expect(answer.body).toMatchObject({ code: 'no-such-endpoint' });
  });
});

describe('a body that has not the shape', () => {
  let site: TestSite;
  let rackAgent: Agent;
  beforeAll(async () => {
    site = await testSite({ signInAttempts: 100 });
    rackAgent = addTestRack(site).agent;
  });
  afterAll(() => site.close());

  const withBody = endpoints.filter(([, { body }]) => !(body instanceof z.ZodUndefined));
  const agentFor = ({ who }: Endpoint): Agent => {
    if (who === 'rack') return rackAgent;
    const [role] = typeof who === 'string' ? ROLES : who;
    return site.as(role ?? 'quality');
  };

  it.each(withBody)('%s refuses an empty one with the paths of what is missing', async (_name, endpoint) => {
    const answer = await call(agentFor(endpoint), endpoint, {}).expect(400);
    const { code, errors } = answer.body as { code: string; errors: { path: unknown[]; message: string }[] };
    expect(code).toBe('not-the-shape');
    expect(errors.length).toBeGreaterThan(0);
    for (const { path, message } of errors) {
      expect(path.length).toBeGreaterThan(0);
      expect(message).not.toBe('');
    }
  });

  it.each(withBody)('%s refuses nonsense', async (_name, endpoint) => {
    const fields = endpoint.body instanceof z.ZodObject ? Object.keys(endpoint.body.shape) : [];
    const nonsense = Object.fromEntries(fields.map((field) => [field, { nonsense: [null, -1e308, '\u0000'] }]));
    const answer = await call(agentFor(endpoint), endpoint, { ...nonsense, surplus: 'x' }).expect(400);
    expect(answer.body).toMatchObject({ code: 'not-the-shape' });
  });

  it('a body that is no JSON is refused without a word about the program', async () => {
    const answer = await site
      .as('quality')
      .post('/api/suppliers')
      .set('content-type', 'application/json')
      .send('{"code":')
      .expect(400);
    expect(answer.body).toMatchObject({ code: 'not-understood' });
  });

  it('a file may be large where the contract expects one, from whoever is signed in and from racks', async () => {
    const body = { fileName: 'rack.csv', text: 'unit\n'.repeat(60_000), instrumentIds: [] };
    await site.as('inspector').post('/api/lots/999999/rack-file/preview').send(body).expect(404);
    await rackAgent.post('/api/rack/lots/L-26-0001/readings').send(body).expect(400);
    await site.nobody().post('/api/lots/999999/rack-file/preview').send(body).expect(413);
  });

  it('a body larger than allowed is refused', async () => {
    const answer = await site
      .as('quality')
      .post('/api/suppliers')
      .send({ name: 'x'.repeat(300_000) });
    expect(answer.status).toBe(413);
    expect(answer.body).toMatchObject({ code: 'too-large' });
  });
});
