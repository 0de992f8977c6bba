import { type RackPreview } from '#shared/contract/bench';
import { type Lot } from '#shared/contract/lots';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { planOf } from '../support/bench-acts';
import { addPlannedPart, drawnLot, measured } from '../support/bench-fixtures';
import { testSite, type TestSite } from '../support/test-site';

describe('a file that is no rack file of this lot', () => {
  let site: TestSite;
  let lot: Lot;
  beforeAll(async () => {
    site = await testSite();
    const plan = planOf(measured('v_loaded', 'major', { lower: 11.4 }));
    lot = await drawnLot(site, addPlannedPart(site.db, site.people.quality.id, plan), 3);
  });
  afterAll(() => site.close());

  async function previewed(text: string): Promise<RackPreview> {
    const file = { fileName: 'rack.csv', text, instrumentIds: [] };
    const { body } = await site.as('inspector').post(`/api/lots/${lot.id}/rack-file/preview`).send(file).expect(200);
    return body as RackPreview;
  }

  it('is refused unread when it is larger than any sample', async () => {
    const file = {
      fileName: 'rack.csv',
      text: `unit,v_loaded\n${`${','.repeat(9_999)}\n`.repeat(501)}`,
      instrumentIds: [],
    };
    const { body } = await site.as('inspector').post(`/api/lots/${lot.id}/rack-file/preview`).send(file).expect(400);
    expect(body).toMatchObject({
      errors: [{ path: ['text'], message: 'A rack file has at most 5 million characters.' }],
    });
  });

  it.each([
    ['with rows without end', `unit,v_loaded\n${'1,12\n'.repeat(300_000)}`, /more than 10 000 rows/],
    ['with more columns than a plan has', `unit${',v_loaded'.repeat(1_000)}\n1`, /1 001 columns/],
    ['with columns without end', `unit${',v_loaded'.repeat(100_000)}\n1`, /row is too long/],
    ['with a row without end', `unit,v_loaded\n1,"${'9'.repeat(2_000_000)}"`, /row is too long/],
    ['of empty lines', '\n'.repeat(2_000_000), /no rows/],
    ['of quotes', '"'.repeat(1_000_001), /quote|no rows|too long/],
    ['of zeros, as a recording of another kind', '\u0000'.repeat(100_000), /no rows|too long/],
    ['written with two bytes a character', Buffer.from('unit,v_loaded\n1,12', 'utf16le').toString('latin1'), /./],
  ])('%s is refused in few words, soon', async (_what, text, words) => {
    const started = Date.now();
    const { faults, readings } = await previewed(text);
    expect(Date.now() - started).toBeLessThan(3000);
    expect(readings).toBe(0);
    expect(faults.length).toBeGreaterThan(0);
    expect(faults.length).toBeLessThan(100);
    expect(faults.map(({ message }) => message.replaceAll('\u202f', ' ')).join(' ')).toMatch(words);
  });
});
