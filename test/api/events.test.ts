import { type Counts } from '#shared/contract/counts';
import { Stream } from '#server/events/stream';
import { createApp } from '#server/app';
import { type AddressInfo, type Server } from 'node:net';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { lots } from '#db/schema/lots';
import { people } from '#db/schema/people';
import { eq } from 'drizzle-orm';
import { buildLot, buildPart, buildSupplier } from '../support/builders';
import { sentBack } from '../support/cookies';
import { PASSWORD } from '../support/test-people';
import { testSite, type TestSite } from '../support/test-site';

const HEARTBEAT = 150;

let site: TestSite;
let stream: Stream;
let server: Server;
let address: string;
const leaving: AbortController[] = [];

beforeEach(async () => {
  site = await testSite();
  site.context.stream.close();
  stream = new Stream({ db: site.db, clock: site.clock, heartbeat: HEARTBEAT });
  const app = createApp({ ...site.context, stream });
  server = await new Promise<Server>((resolve) => {
    const listening = app.listen(0, '127.0.0.1', () => resolve(listening));
  });
  address = `http://127.0.0.1:${(server.address() as AddressInfo).port}`;
});
afterEach(async () => {
  for (const controller of leaving.splice(0)) controller.abort();
  stream.close();
  await new Promise((resolve) => server.close(resolve));
  site.close();
});

async function cookieOf(role: 'receiving' | 'quality' | 'admin'): Promise<string> {
  const answer = await site.nobody().post('/api/session').send({ email: site.people[role].email, password: PASSWORD });
  return sentBack(answer, 'qr_access');
}

/** Listens as a browser does; `nextOf` gives the next event of a kind, `next` the next counts, undefined at the end. */
async function listen(cookie: string) {
  const controller = new AbortController();
  leaving.push(controller);
  const response = await fetch(`${address}/api/events`, { headers: { cookie }, signal: controller.signal });
  const reader = response.body?.pipeThrough(new TextDecoderStream()).getReader();
  let text = '';
  const nextOf = async (kind: string): Promise<unknown> => {
    while (!text.includes('\n\n')) {
      const piece = await reader?.read();
      if (!piece || piece.done) return undefined;
      text += piece.value;
    }
    const [message = '', ...rest] = text.split('\n\n');
    text = rest.join('\n\n');
    const [, event, data = ''] = /^event: (\w+)\ndata: (\{.*\})$/.exec(message) ?? [];
    return event === kind ? JSON.parse(data) : nextOf(kind);
  };
  const next = async () => (await nextOf('counts')) as Counts | undefined;
  return { response, next, nextOf };
}

function addLot(number: string) {
  const partId = buildPart(site.db, { number: `HC-${number}` }).id;
  const supplierId = buildSupplier(site.db, { code: `S${number}`, name: `Supplier ${number}` }).id;
  return buildLot(site.db, { number, partId, supplierId, bookedById: site.people.receiving.id });
}

describe('the stream of counts', () => {
  it('sends the counts at once, and again when a lot arrives', async () => {
    const { response, next } = await listen(await cookieOf('receiving'));
    expect(response.headers.get('content-type')).toBe('text/event-stream');
    expect(response.headers.get('content-encoding')).toBeNull();
    expect(await next()).toMatchObject({ arrivals: 0 });
    addLot('1');
    stream.announce();
    stream.announce();
    expect(await next()).toMatchObject({ arrivals: 1 });
  });

  it('is told of every change that a request made', async () => {
    const { next } = await listen(await cookieOf('receiving'));
    await next();
    const lot = addLot('1');
    site.db.update(lots).set({ status: 'cancelled', cancelReason: 'Never came' }).where(eq(lots.id, lot.id)).run();
    addLot('2');
    const cookie = await cookieOf('receiving');
    await fetch(`${address}/api/session`, { method: 'DELETE', headers: { cookie } });
    expect(await next()).toMatchObject({ arrivals: 1 });
  });

  it('names each lot that somebody changed, once however often within a moment', async () => {
    const { nextOf } = await listen(await cookieOf('receiving'));
    const [first, second] = [addLot('1'), addLot('2')];
    stream.announceLot(first.id);
    stream.announceLot(first.id);
    stream.announceLot(second.id);
    expect(await nextOf('lot')).toEqual({ lotId: first.id });
    expect(await nextOf('lot')).toEqual({ lotId: second.id });
  });

  it('names a lot after a change by a request, and not after one that was refused', async () => {
    const cookie = await cookieOf('receiving');
    const { nextOf } = await listen(cookie);
    const [refused, cancelled] = [addLot('1'), addLot('2')];
    const cancel = (id: number, reason: string) =>
      fetch(`${address}/api/lots/${id}/cancellation`, {
        method: 'POST',
        headers: { cookie, 'content-type': 'application/json', 'if-match': '"1"' },
        body: JSON.stringify({ reason }),
      });
    expect((await cancel(refused.id, '')).status).toBe(400);
    expect((await cancel(cancelled.id, 'Booked in twice')).status).toBe(200);
    expect(await nextOf('lot')).toEqual({ lotId: cancelled.id });
  });

  it('beats with the time even when nothing changes', async () => {
    const { next } = await listen(await cookieOf('receiving'));
    const first = await next();
    site.clock.advance({ seconds: 15 });
    const second = await next();
    expect(second).toEqual({ ...first, at: site.clock.now().toISOString() });
  });

  it('ends for a person who may no longer listen', async () => {
    const { next } = await listen(await cookieOf('quality'));
    await next();
    site.db.update(people).set({ active: false }).where(eq(people.id, site.people.quality.id)).run();
    let counts = await next();
    while (counts) counts = await next();
    expect(counts).toBeUndefined();
  });

  it('is for those whose work is lots', async () => {
    expect((await fetch(`${address}/api/events`)).status).toBe(401);
    const { response } = await listen(await cookieOf('admin'));
    expect(response.status).toBe(403);
    expect(response.headers.get('content-type')).toContain('application/problem+json');
  });

  it('ends when the program stops', async () => {
    const { next } = await listen(await cookieOf('receiving'));
    await next();
    stream.close();
    expect(await next()).toBeUndefined();
  });
});
