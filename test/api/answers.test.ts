import { serve } from '#server/serve';
import { problemHandler } from '#server/problem-handler';
import { readCounts } from '#shared/contract/counts';
import express, { Router } from 'express';
import { connect, type AddressInfo } from 'node:net';
import { pino } from 'pino';
import request from 'supertest';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { lotSummaries } from '#db/schema/summaries';
import { buildLot, buildPart, buildSupplier } from '../support/builders';
import { testSite, type TestSite } from '../support/test-site';

describe('an answer of ours that is not as the contract says', () => {
  it('is our fault and not the caller’s', async () => {
    const log = pino({ level: 'silent' });
    const router = Router();
    serve(router, { ...readCounts, who: 'anyone' }, () => ({ arrivals: 0.5 }) as never);
    const answer = await request(express().use(router, problemHandler(log))).get(readCounts.path);
    expect(answer.status).toBe(500);
    expect(answer.body).toMatchObject({ code: 'our-fault' });
    expect(answer.body).not.toHaveProperty('errors');
  });
});

describe('at the edges', () => {
  let site: TestSite;
  beforeAll(async () => {
    site = await testSite();
  });
  afterAll(() => site.close());

  it('requests that name no host and come from nowhere change nothing', async () => {
    const server = site.app.listen(0, '127.0.0.1');
    await new Promise((resolve) => server.once('listening', resolve));
    const answer = await new Promise<string>((resolve) => {
      const socket = connect((server.address() as AddressInfo).port, '127.0.0.1');
      let text = '';
      socket.on('data', (piece) => (text += piece.toString()));
      socket.on('end', () => resolve(text));
      socket.end('POST /api/session/refresh HTTP/1.0\r\norigin: null\r\n\r\n');
    });
    await new Promise((resolve) => server.close(resolve));
    expect(answer).toMatch(/^HTTP\/1\.1 403/);
    expect(answer).toContain('cross-site');
  });

  it('yields up to the last day there is hold every lot', async () => {
    const references = { partId: buildPart(site.db).id, supplierId: buildSupplier(site.db).id };
    const { id: lotId } = buildLot(site.db, { number: 'L-1', ...references, bookedById: site.people.receiving.id });
    const counts = { lotSize: 3, unitsJudged: 3, unitsConforming: 3, criticalUnits: 0, majorUnits: 0, minorUnits: 0 };
    const decidedAt = '2026-03-12T23:59:59.999Z';
    site.db
      .insert(lotSummaries)
      .values({ lotId, month: '2026-03', decidedAt, ...references, verdict: 'accepted', ...counts, unitsReleased: 3 })
      .run();
    const decided = async (query: string) => {
      const { body } = await site.as('quality').get(`/api/yields?${query}`).expect(200);
      return (body as { total: { lotsDecided: number } }).total.lotsDecided;
    };
    expect(await decided('to=9999-12-31')).toBe(1);
    expect(await decided('to=2026-03-12')).toBe(1);
    expect(await decided('to=2026-03-11')).toBe(0);
    expect(await decided('from=2026-03-12')).toBe(1);
    expect(await decided('from=2026-03-13')).toBe(0);
  });
});
