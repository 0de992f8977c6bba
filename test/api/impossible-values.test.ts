import { type ProblemDetails } from '#shared/contract/problem';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { keep, planOf, typedReading } from '../support/bench-acts';
import { addPlannedPart, drawnLot, measured } from '../support/bench-fixtures';
import { buildPart } from '../support/builders';
import * as bodies from '../support/plan-bodies';
import { testSite, type TestSite } from '../support/test-site';

let site: TestSite;
beforeEach(async () => {
  site = await testSite();
});
afterEach(() => site.close());

async function lotWithRegulation() {
  const plan = planOf(measured('v_no_load', 'major', {}), measured('v_loaded', 'major', {}), {
    ...measured('regulation', 'minor', { upper: 0.2 }),
    kind: 'computed',
    unit: '%',
    formula: { key: 'load-regulation', inputs: { no_load: 'v_no_load', loaded: 'v_loaded' }, constants: {} },
  } as Parameters<typeof planOf>[0]);
  return drawnLot(site, addPlannedPart(site.db, site.people.quality.id, plan), 3);
}

describe('values that no instrument gives', () => {
  it('a reading beyond them is refused beside its field', async () => {
    const lot = await lotWithRegulation();
    const { body } = await keep(site, lot, typedReading(1, 'v_no_load', '1e308')).expect(422);
    const [fault] = (body as ProblemDetails).errors ?? [];
    expect(fault).toMatchObject({ path: ['entry', 'text'] });
    expect(fault?.message).toContain('too large to be a measured value');
  });

  it('what is computed from a reading next to nothing has no value and does not conform', async () => {
    const lot = await lotWithRegulation();
    await keep(site, lot, typedReading(1, 'v_no_load', '12')).expect(200);
    const { body } = await keep(site, lot, typedReading(1, 'v_loaded', '1e-320')).expect(200);
    expect(body).toMatchObject({ unitVerdict: 'nonconforming' });
    await site.as('quality').get(`/api/lots/${lot.id}/assessment`).expect(200);
  });

  it('are refused in a rack file with their line', async () => {
    const lot = await lotWithRegulation();
    const file = { fileName: 'rack.csv', text: 'unit,v_no_load,v_loaded\n1,12,1e300\n2,12,1e-320', instrumentIds: [] };
    const { body } = await site.as('inspector').post(`/api/lots/${lot.id}/rack-file/preview`).send(file).expect(200);
    expect((body as { faults: unknown[] }).faults).toMatchObject([{ line: 2, column: 'v_loaded' }]);
  });

  it('are no limits of a plan', async () => {
    const { id: partId } = buildPart(site.db);
    const content = bodies.revisionBody({ characteristics: [bodies.measured('v_loaded', { upperLimit: 1e300 })] });
    const { body } = await site.as('quality').post('/api/plans').send({ partId, content }).expect(400);
    const paths = (body as ProblemDetails).errors?.map(({ path }) => path);
    expect(paths).toContainEqual(['content', 'characteristics', 0, 'upperLimit']);
  });
});
