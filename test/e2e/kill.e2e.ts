import { DEMO_PASSWORD } from '#db/demo/sign-ins';
import { type Bench } from '#shared/contract/bench';
import { type LotHead } from '#shared/contract/lots';
import { expect, test, type APIRequestContext } from '@playwright/test';
import { randomUUID } from 'node:crypto';
import { rmSync } from 'node:fs';
import { demoCopy } from './support/demo-folder';
import { startServer } from './support/server-process';

/** How many readings are acknowledged before the program is killed, each time. */
const BEFORE_THE_KILL = 40;
const KILLS = 3;

async function signedIn(request: APIRequestContext, address: string, who: string): Promise<void> {
  const data = { email: `${who}@hollowmere.example`, password: DEMO_PASSWORD };
  expect((await request.post(`${address}/api/session`, { data })).status()).toBe(200);
}

/** Cells of a lot at the bench that have no reading yet, each with an entry that fits. */
function freeCells({ characteristics, units, readings, instruments }: Bench) {
  const taken = new Set(readings.map(({ unit, characteristicKey }) => `${unit}/${characteristicKey}`));
  return units.flatMap(({ unit }) =>
    characteristics.flatMap((characteristic) => {
      const { key } = characteristic;
      if (characteristic.kind === 'computed' || taken.has(`${unit}/${key}`)) return [];
      const entry =
        characteristic.kind === 'attribute'
          ? { kind: 'attribute', pass: true, reason: '' }
          : { kind: 'direct', text: '1', decimalComma: false };
      const instrument = instruments.find(({ kind, usable }) => usable && kind === characteristic.instrumentKind);
      return [{ unit, characteristicKey: key, entry, instrumentId: instrument?.id ?? null }];
    }),
  );
}

test('killed in the middle of a bench session, the program has lost no acknowledged reading', async ({ request }) => {
  const folder = demoCopy();
  const acknowledged: string[] = [];
  let lotId = 0;
  for (let kill = 0; kill < KILLS; kill += 1) {
    const server = await startServer(folder);
    await signedIn(request, server.address, 'inspector');
    const { items } = (await (await request.get(`${server.address}/api/lots?station=bench`)).json()) as {
      items: LotHead[];
    };
    lotId = items[0]?.id ?? 0;
    const bench = (await (await request.get(`${server.address}/api/lots/${lotId}/bench`)).json()) as Bench;
    const cells = freeCells(bench);
    expect(cells.length).toBeGreaterThan(BEFORE_THE_KILL + 10);
    let answered = 0;
    const typing = cells.map(async (cell) => {
      const id = randomUUID();
      const data = { ...cell, note: '', repeat: null, takenAt: new Date().toISOString() };
      try {
        const answer = await request.put(`${server.address}/api/lots/${lotId}/readings/${id}`, { data });
        if (answer.status() !== 200) throw new Error(`a reading was refused: ${await answer.text()}`);
        acknowledged.push(id);
        answered += 1;
      } catch (error) {
        // Requests that the kill cut off were not acknowledged; a refusal is a fault of the test.
        if (String(error).includes('refused:')) throw error;
      }
      if (answered === BEFORE_THE_KILL) await server.kill();
    });
    await Promise.all(typing);
  }

  const server = await startServer(folder);
  await signedIn(request, server.address, 'quality');
  const bench = (await (await request.get(`${server.address}/api/lots/${lotId}/bench`)).json()) as Bench;
  const kept = bench.readings.map(({ id }) => id);
  expect(acknowledged.length).toBeGreaterThanOrEqual(KILLS * BEFORE_THE_KILL);
  expect(acknowledged.filter((id) => !kept.includes(id))).toEqual([]);
  expect(new Set(kept).size).toBe(kept.length);
  const cells = bench.readings
    .filter(({ withdrawn }) => !withdrawn)
    .map((one) => `${one.unit}/${one.characteristicKey}/${one.attempt}`);
  expect(new Set(cells).size).toBe(cells.length);
  const chain = (await (await request.get(`${server.address}/api/audit/verification`)).json()) as { intact: boolean };
  expect(chain.intact).toBe(true);
  expect(await server.stop()).toBe(0);
  rmSync(folder, { recursive: true, force: true });
});
