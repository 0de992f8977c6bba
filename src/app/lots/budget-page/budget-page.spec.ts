import { type Budget, type BudgetReading } from '#shared/contract/budgets';
import { type Characteristic } from '#shared/contract/plans';
import { openPage } from '../../../testing/open-page';
import { BudgetPage } from './budget-page';

const LOADED: Characteristic = {
  kind: 'measured',
  key: 'loaded',
  name: 'Voltage at full load',
  class: 'major',
  condition: 'at 500 mA',
  method: '',
  caution: '',
  ownLevel: null,
  ownAql: null,
  unit: 'V',
  decimals: 2,
  target: 12,
  lowerLimit: 11.4,
  upperLimit: 12.6,
  entryMode: 'direct',
  measurand: 'loaded-voltage',
  alternatePeaks: 'worst',
  instrumentKind: 'multimeter',
};

const READING: BudgetReading = {
  id: '0197a000-0000-7000-8000-000000000000',
  input: null,
  characteristic: LOADED,
  value: 12.58,
  entry: { kind: 'direct', text: '12,58', decimalComma: true },
  attempt: 2,
  withdrawn: false,
  takenAt: '2026-03-12T08:00:00.000Z',
  takenBy: 'M. Aldoush',
  rack: null,
  expandedUncertainty: 0.0926,
  instrument: {
    id: 3,
    assetNumber: 'MM-07',
    kind: 'multimeter',
    description: 'Bench multimeter',
    range: {
      id: 9,
      form: 'digital',
      name: '20 V',
      unit: 'V',
      current: 'dc',
      fullScale: 20,
      resolution: 0.01,
      ofReading: 0.005,
      ofRange: 0,
      counts: 2,
    },
    calibration: {
      calibratedOn: '2026-02-01',
      dueOn: '2027-02-01',
      laboratory: 'Aldernau Metrology',
      certificateNumber: 'C-2',
      asFound: 'in-tolerance',
    },
  },
};

const BUDGET: Budget = {
  lot: { id: 4, number: 'L-26-0412', part: 'WA-12-500' },
  unit: 17,
  characteristic: LOADED,
  decisionRule: 'non-binary',
  coverageFactor: 2,
  value: 12.58,
  readings: [READING],
  unknown: '',
  result: {
    lines: [
      {
        line: 1,
        source: 'Accuracy of 20 V',
        input: null,
        distribution: 'rectangular',
        halfWidth: 0.08,
        divisor: '√3',
        standardUncertainty: 0.0462,
        sensitivity: 1,
        contribution: 0.0462,
        degreesOfFreedom: null,
        share: 0.996,
        note: null,
      },
    ],
    standardUncertainty: 0.0463,
    degreesOfFreedom: null,
    expandedUncertainty: 0.0926,
    coverage: 'One rectangular component dominates.',
    guardBand: 0.0926,
    accepted: { lower: 11.4926, upper: 12.5074 },
    fineness: { kind: 'ratio', ratio: 6.48, coarse: false },
    conformityProbability: 0.667,
    verdict: 'conditional',
    side: 'inside',
  },
};

const ADDRESS = '/api/lots/4/units/17/budgets/loaded';

async function openBudget(budget: object = BUDGET) {
  const page = await openPage(BudgetPage, ['quality'], { id: 4, unit: 17, key: 'loaded' });
  await page.answer(ADDRESS, budget);
  return page;
}

describe('BudgetPage', () => {
  it('lays the budget out line by line, down to U', async () => {
    const text = (await openBudget()).text();
    for (const shown of ['Accuracy of 20 V', '80.0 mV', '√3', '46.2 mV', '100 %', '∞', '92.6 mV', '± 0.09 V'])
      expect(text).toContain(shown);
  });

  it('says how the rule judges the value, in words', async () => {
    const text = (await openBudget()).text();
    expect(text).toContain('Conditional');
    expect(text).toContain('within the limits, but nearer to one than U');
    expect(text).toContain('66.7 %');
    expect(text).toContain('11.49 to 12.51 V');
  });

  it('names the reading as it was typed, its range and the calibration that held then', async () => {
    const page = await openBudget();
    expect(page.text()).toContain('typed 12,58');
    expect(page.text()).toContain('±(0.5 % of reading + 2 counts of 10 mV)');
    expect(page.text()).toContain('C-2 of 2026-02-01, Aldernau Metrology, due 2027-02-01');
    expect(page.element.querySelector('a[href="/instruments/3"]')?.textContent).toBe('MM-07');
  });

  it('says which errors lines share, and which readings feed what is computed', async () => {
    const computed: Characteristic = {
      ...{ key: 'regulation', name: 'Load regulation', class: 'minor', condition: '', method: '', caution: '' },
      ...{ ownLevel: null, ownAql: null, unit: '%', decimals: 1, target: null, lowerLimit: null, upperLimit: 0.5 },
      kind: 'computed',
      formula: { key: 'load-regulation', inputs: { no_load: 'no_load', loaded: 'loaded' }, constants: {} },
    };
    const [line] = BUDGET.result?.lines ?? [];
    const lines = [
      { ...line, input: 'no_load', sensitivity: 0.0833, note: 'The same error as in line 2: it cancels in part.' },
      { ...line, line: 2, input: 'loaded', sensitivity: -0.117, share: null },
    ];
    const page = await openBudget({
      ...BUDGET,
      characteristic: computed,
      readings: [
        { ...READING, input: 'no_load' },
        { ...READING, id: '0197a000-0000-7000-8000-000000000001', input: 'loaded' },
      ],
      result: { ...BUDGET.result, lines },
    });
    expect(page.text()).toContain('Line 1 The same error as in line 2: it cancels in part.');
    expect(page.text()).toContain('8.33 %/V');
    expect(page.text()).toContain('−11.7 %/V');
    const titles = [...page.element.querySelectorAll('qr-budget-sources h2')].map((each) => each.textContent);
    expect(titles).toEqual([
      expect.stringContaining('Voltage without load'),
      expect.stringContaining('Voltage at full load'),
    ]);
  });

  it('makes up nothing where the uncertainty is not known', async () => {
    const page = await openBudget({ ...BUDGET, result: null, unknown: 'The instrument has no range for this.' });
    expect(page.text()).toContain('The instrument has no range for this.');
    expect(page.element.querySelector('qr-budget-table')).toBeNull();
    expect(page.text()).toContain('MM-07');
  });
});
