import { rackParts, racks, rackTokens } from '#db/schema/racks';
import { newToken } from '#server/racks/rack-token';
import { type RackReading } from '#shared/contract/racks';
import request from 'supertest';
import { type Agent, type TestSite } from './test-site';

/** A rack in the database, with a token and an agent that calls with it. */
export interface TestRack {
  id: number;
  tokenId: number;
  token: string;
  agent: Agent;
}

/** An agent that calls with a token. */
export function withToken(site: TestSite, token: string): Agent {
  return request.agent(site.app).set('authorization', `Bearer ${token}`);
}

/** One more token of a rack. */
export function addTestToken(site: TestSite, rackId: number): Omit<TestRack, 'id'> {
  const { token, hash, beginning } = newToken();
  const issued = { issuedAt: '2026-01-05T08:00:00.000Z', issuedById: site.people.admin.id };
  const { id: tokenId } = site.db
    .insert(rackTokens)
    .values({ rackId, hash, beginning, ...issued })
    .returning({ id: rackTokens.id })
    .get();
  return { tokenId, token, agent: withToken(site, token) };
}

export function addTestRack(
  site: TestSite,
  { name = 'Rack 2', partIds = [] as readonly number[], mapping = {} as Record<string, string | null> } = {},
): TestRack {
  const { db } = site;
  const { id } = db.insert(racks).values({ name, place: 'Test room', mapping }).returning({ id: racks.id }).get();
  for (const partId of partIds) db.insert(rackParts).values({ rackId: id, partId }).run();
  return { id, ...addTestToken(site, id) };
}

/** A measured value as a rack sends it. */
export function rackReading(
  id: string,
  unit: number,
  characteristicKey: string,
  value: number,
  more: Partial<RackReading> = {},
): RackReading {
  return { id, unit, characteristicKey, value, takenAt: '2026-03-12T08:00:00.000Z', instrument: null, ...more };
}
