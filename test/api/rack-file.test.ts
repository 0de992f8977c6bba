import { type Bench, type RackPreview } from '#shared/contract/bench';
import { type Assessment } from '#shared/contract/decision';
import { type Lot } from '#shared/contract/lots';
import { type ProblemDetails } from '#shared/contract/problem';
import { afterEach, describe, expect, it } from 'vitest';
import { addInstrument, addPlannedPart, attribute, drawnLot, measured } from '../support/bench-fixtures';
import { referenceLot } from '../support/reference-lot';
import { testSite, type TestSite } from '../support/test-site';

let site: TestSite;
afterEach(() => {
  site.close();
});

const rack = (lot: { id: number }) => `/api/lots/${lot.id}/rack-file`;
const body = (text: string, instrumentIds: number[] = []) => ({ fileName: 'rack-3.csv', text, instrumentIds });

// Readings of an independent circuit simulator; the plan and the answer stand beside each file.
describe.each(['lot-good', 'lot-low-capacitance', 'lot-bad-tap'] as const)('the rack file of %s', (name) => {
  const reference = referenceLot(name);
  const word = { accept: 'accepted', reject: 'rejected' }[reference.verdict];
  const failing = Object.entries(reference.unitsFailing).map(([unit, failed]) => ({ unit: Number(unit), failed }));

  async function imported(): Promise<{ lot: Lot; preview: RackPreview }> {
    site = await testSite();
    const references = addPlannedPart(site.db, site.people.quality.id, reference.plan);
    const lot = await drawnLot(site, references, reference.lotSize);
    const { body: preview } = await site.as('inspector').post(rack(lot)).send(body(reference.csv)).expect(201);
    return { lot, preview: preview as RackPreview };
  }

  it('is sampled with the code letter, n, Ac and Re of the tables', async () => {
    const { lot } = await imported();
    const groups = lot.sampling?.groups.map(
      ({ class: nonconformityClass, codeLetter, sampleSize, acceptance, rejection }) => ({
        nonconformityClass,
        codeLetter,
        sampleSize,
        numbers: [acceptance, rejection],
      }),
    );
    expect(groups).toEqual(
      (['major', 'minor'] as const).map((nonconformityClass) => ({
        nonconformityClass,
        codeLetter: reference.code,
        sampleSize: reference.sampleSize,
        numbers: reference.acRe[nonconformityClass],
      })),
    );
  });

  it('finds exactly the nonconforming units, counts and verdict stated', async () => {
    const { preview } = await imported();
    expect(preview.nonconformingUnits).toEqual(failing);
    expect(Object.fromEntries(preview.groups.map((group) => [group.class, group.found]))).toEqual(
      reference.nonconformingUnits,
    );
    expect(preview.verdict).toBe(word);
  });

  it('stands in the assessment as it stood in the preview', async () => {
    const { lot } = await imported();
    const { body: shown } = await site.as('quality').get(`/api/lots/${lot.id}/assessment`).expect(200);
    const assessment = shown as Assessment;
    expect(assessment.verdict).toBe(word);
    expect(assessment.unitsJudged).toBe(reference.sampleSize);
    expect(assessment.takenBy).toEqual(['Rack']);
    expect(assessment.units.filter(({ failed }) => failed.length > 0).map(({ unit }) => unit)).toEqual(
      failing.map(({ unit }) => unit),
    );
  });
});

describe('a rack file with faults', () => {
  async function smallLot() {
    site = await testSite();
    const references = addPlannedPart(site.db, site.people.quality.id, {
      level: 'II',
      classAqls: [
        { class: 'major', aql: '1.0' },
        { class: 'minor', aql: '2.5' },
      ],
      characteristics: [
        measured('v_loaded', 'major', { lower: 11.4, upper: 12.9 }, { instrumentKind: 'multimeter' }),
        attribute('marking', 'minor'),
      ],
    });
    const meter = addInstrument(site.db, 'multimeter', 'DM-11');
    return { lot: await drawnLot(site, references, 40), meter };
  }

  it('names every bad row with line, column and reason, and keeps nothing', async () => {
    const { lot, meter } = await smallLot();
    const text = [
      'unit,v_loaded,marking',
      '1,12.1,pass',
      '2,twelve,pass',
      '99,12.1,pass',
      '1,12.2,pass',
      '3,12.1',
      'x,12.1,pass',
      '4,12.0,perhaps',
    ].join('\n');
    const { body: preview } = await site
      .as('inspector')
      .post(`${rack(lot)}/preview`)
      .send(body(text, [meter]))
      .expect(200);
    const { faults } = preview as RackPreview;
    expect(faults.map(({ line, column }) => [line, column])).toEqual([
      [3, 'v_loaded'],
      [4, 'unit'],
      [5, 'unit'],
      [6, null],
      [7, 'unit'],
      [8, 'marking'],
    ]);
    const { body: refused } = await site
      .as('inspector')
      .post(rack(lot))
      .send(body(text, [meter]))
      .expect(422);
    expect((refused as ProblemDetails).code).toBe('rack-file-refused');
    expect((refused as ProblemDetails).errors?.[0]?.path).toEqual(['text', 3, 'v_loaded']);
    const { body: bench } = await site.as('inspector').get(`/api/lots/${lot.id}/bench`).expect(200);
    expect((bench as Bench).readings).toEqual([]);
    expect((bench as Bench).lot.status).toBe('drawn');
  });

  it.each([
    ['an empty file', '   ', 'The file holds no rows of readings.'],
    ['only a head', 'unit,v_loaded\n', 'The file holds no rows of readings.'],
    [
      'an open quote',
      'unit,v_loaded\n1,"12.1\n2,12.0',
      'A quoted field is not closed, or quotes stand inside a field.',
    ],
    ['no unit column', 'v_loaded\n12.1\n', 'The column unit is missing: the number of the unit in draw order.'],
    ['an unknown column', 'unit,v_loud\n1,12.1\n', 'The plan has no characteristic v_loud.'],
    ['the same column twice', 'unit,v_loaded,v_loaded\n1,12.1,12.1\n', 'Two columns are named v_loaded.'],
  ])('says why %s cannot be read', async (_what, text, message) => {
    const { lot, meter } = await smallLot();
    const { body: preview } = await site
      .as('inspector')
      .post(`${rack(lot)}/preview`)
      .send(body(text, [meter]))
      .expect(200);
    expect((preview as RackPreview).faults.map((fault) => fault.message)).toContain(message);
  });

  it('asks for the instrument that the plan wants', async () => {
    const { lot } = await smallLot();
    const { body: preview } = await site
      .as('inspector')
      .post(`${rack(lot)}/preview`)
      .send(body('unit,v_loaded\n1,12.1'))
      .expect(200);
    expect((preview as RackPreview).faults[0]?.message).toBe('Name the multimeter the rack used.');
  });

  it('refuses an instrument past its calibration date', async () => {
    const { lot } = await smallLot();
    const overdue = addInstrument(site.db, 'multimeter', 'DM-12', { calibrationDue: '2026-03-11' });
    const { body: refused } = await site
      .as('inspector')
      .post(rack(lot))
      .send(body('unit,v_loaded\n1,12.1', [overdue]))
      .expect(422);
    expect((refused as ProblemDetails).title).toBe('DM-12 is past its calibration date 2026-03-11.');
  });

  it('reads semicolons with decimal commas, as a spreadsheet writes them', async () => {
    const { lot, meter } = await smallLot();
    const { body: kept } = await site
      .as('inspector')
      .post(rack(lot))
      .send(body('\uFEFFunit;v_loaded;marking\r\n1;12,1;P\r\n2;13,5;f\r\n', [meter]))
      .expect(201);
    expect((kept as RackPreview).nonconformingUnits).toEqual([{ unit: 2, failed: ['v_loaded', 'marking'] }]);
  });

  it('does not overwrite a reading that the bench has kept', async () => {
    const { lot, meter } = await smallLot();
    await site
      .as('inspector')
      .post(rack(lot))
      .send(body('unit,v_loaded\n1,12.1', [meter]))
      .expect(201);
    const { body: refused } = await site
      .as('inspector')
      .post(rack(lot))
      .send(body('unit,v_loaded\n1,12.3', [meter]))
      .expect(422);
    expect((refused as ProblemDetails).errors?.[0]?.message).toBe('Line 2: Unit 1 has this reading already.');
  });
});
