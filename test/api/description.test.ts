import { type Endpoint } from '#shared/contract/endpoint';
import { ENDPOINTS } from '#shared/contract/index';
import * as racks from '#shared/contract/racks';
import { escape } from '#server/description/escape';
import {
  EXAMPLE_ANSWER,
  EXAMPLE_LOT,
  EXAMPLE_READINGS,
  EXAMPLE_WAVEFORM_ANSWER,
  RACK_STEPS,
} from '#server/description/rack-example';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { testSite, type TestSite } from '../support/test-site';

interface Document {
  openapi: string;
  paths: Record<
    string,
    Record<string, { operationId: string; security: unknown[]; responses: Record<string, unknown> }>
  >;
  components: { responses: object; securitySchemes: object };
}

function securityOf({ who }: Endpoint): object[] {
  if (who === 'anyone') return [];
  return who === 'rack' ? [{ rackToken: [] }] : [{ session: [] }];
}

let site: TestSite;
beforeAll(async () => {
  site = await testSite();
});
afterAll(() => site.close());

describe('the description of the interface', () => {
  it('holds every endpoint of the contract and nothing else', async () => {
    const document = (await site.nobody().get('/api/openapi.json').expect(200)).body as Document;
    expect(document.openapi).toBe('3.1.0');
    const operations = Object.values(document.paths).flatMap((path) => Object.values(path));
    expect(operations.map(({ operationId }) => operationId).sort()).toEqual([...ENDPOINTS.keys()].sort());
    for (const [name, endpoint] of ENDPOINTS) {
      const path = endpoint.path.replaceAll(/:(\w+)/g, '{$1}');
      const operation = document.paths[path]?.[endpoint.method.toLowerCase()];
      expect(operation?.operationId).toBe(name);
      expect(operation?.security).toEqual(securityOf(endpoint));
      expect(operation?.responses).toHaveProperty(String(endpoint.status));
      if (endpoint.versioned) expect(operation?.responses).toHaveProperty('412');
    }
  });

  it('refers only to what it holds', async () => {
    const { text, body } = await site.nobody().get('/api/openapi.json');
    const references = new Set([...text.matchAll(/"\$ref":"#\/([^"]+)"/g)].map(([, place]) => place ?? ''));
    for (const place of references)
      expect(place.split('/').reduce<unknown>((inner, step) => Reflect.get(Object(inner), step), body)).toBeDefined();
  });

  it('shows the whole conversation of a test rack, with bodies that the contract takes', async () => {
    expect(racks.rackLot.parse(EXAMPLE_LOT)).toEqual(EXAMPLE_LOT);
    expect(racks.sendRackReadings.body.parse(EXAMPLE_READINGS)).toEqual(EXAMPLE_READINGS);
    expect(racks.sendRackReadings.reply.parse(EXAMPLE_ANSWER)).toEqual(EXAMPLE_ANSWER);
    expect(racks.sendRackWaveform.reply.parse(EXAMPLE_WAVEFORM_ANSWER)).toEqual(EXAMPLE_WAVEFORM_ANSWER);
    const { text } = await site.nobody().get('/api/docs').expect(200);
    for (const { about, typed } of RACK_STEPS)
      for (const words of [about, typed]) expect(text).toContain(escape(words));
    expect(text).toContain('Authorization: Bearer $TOKEN');
    const { body } = await site.nobody().get('/api/openapi.json').expect(200);
    expect(body).toMatchObject({ components: { securitySchemes: { rackToken: { type: 'http', scheme: 'bearer' } } } });
  });

  it('is a page that needs no script', async () => {
    const answer = await site.nobody().get('/api/docs').expect(200);
    expect(answer.headers['content-type']).toBe('text/html; charset=utf-8');
    expect(answer.headers['content-security-policy']).toContain("script-src 'self'");
    expect(answer.text).not.toContain('<script');
    for (const { summary } of ENDPOINTS.values())
      expect(answer.text).toContain(summary.replaceAll("'", '&#39;').replaceAll('"', '&quot;'));
    expect(answer.text).toContain('characteristics[].formula.inputs');
  });
});
