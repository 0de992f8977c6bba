import { type Bench, type Reading } from '#shared/contract/bench';
import { type InstrumentRange } from '#shared/contract/instruments';
import { type Characteristic } from '#shared/contract/plans';

const COMMON = { condition: '', method: '', caution: '', ownLevel: null, ownAql: null } as const;
const LIMITS = { unit: 'V', decimals: 2, target: null, lowerLimit: null, upperLimit: null } as const;
const MEASURED = { ...LIMITS, alternatePeaks: 'worst' } as const;

/** The plan of the bench specs: a marking judged by eye, two voltages, the regulation computed from them, a ripple. */
export const CHARACTERISTICS: Characteristic[] = [
  {
    kind: 'attribute',
    key: 'marking',
    name: 'Marking',
    class: 'minor',
    ...COMMON,
    requirement: 'Legible, complete',
    failReasons: ['Smeared', 'Missing'],
    instrumentKind: null,
  },
  {
    kind: 'measured',
    key: 'no_load',
    name: 'No-load voltage',
    class: 'major',
    ...COMMON,
    ...MEASURED,
    measurand: 'no-load-voltage',
    upperLimit: 18.2,
    entryMode: 'direct',
    instrumentKind: 'multimeter',
  },
  {
    kind: 'measured',
    key: 'loaded',
    name: 'Loaded voltage',
    class: 'major',
    ...COMMON,
    ...MEASURED,
    measurand: 'loaded-voltage',
    caution: 'Mains inside. Keep the cover on.',
    lowerLimit: 11.4,
    entryMode: 'direct',
    instrumentKind: 'multimeter',
  },
  {
    kind: 'computed',
    key: 'regulation',
    name: 'Regulation',
    class: 'minor',
    ...COMMON,
    ...LIMITS,
    unit: '%',
    decimals: 1,
    upperLimit: 0.5,
    formula: { key: 'load-regulation', inputs: { no_load: 'no_load', loaded: 'loaded' }, constants: {} },
  },
  {
    kind: 'measured',
    key: 'ripple',
    name: 'Ripple',
    class: 'major',
    ...COMMON,
    ...MEASURED,
    measurand: 'ripple',
    unit: 'V p-p',
    upperLimit: 2.4,
    entryMode: 'scope',
    instrumentKind: null,
  },
];

const GROUP = {
  level: 'II',
  codeLetter: 'C',
  planLetter: 'C',
  sampleSize: 5,
  wholeLot: false,
  severity: 'normal',
} as const;

/** An instrument at a site that asks for no daily check. */
const UNCHECKED = { dailyReference: null, dailyCheck: 'not-asked', openReview: null } as const;

/** A reading as the server has it. */
export function readingOf(unit: number, characteristicKey: string, worth: number | boolean): Reading {
  return {
    id: crypto.randomUUID(),
    unit,
    characteristicKey,
    value: typeof worth === 'number' ? worth : null,
    pass: typeof worth === 'boolean' ? worth : null,
    entry: null,
    instrumentId: null,
    rangeId: null,
    expandedUncertainty: null,
    waveformId: null,
    question: null,
    note: '',
    repeat: null,
    attempt: 1,
    withdrawn: false,
    takenBy: 'I. Sandvær',
    rack: null,
    takenAt: '2026-03-12T14:20:00.000Z',
    receivedAt: '2026-03-12T14:20:00.000Z',
  };
}

/** A multimeter's two ranges of direct voltage. */
const RANGES: InstrumentRange[] = [
  { id: 51, name: '20 V', fullScale: 20, resolution: 0.001 },
  { id: 52, name: '200 V', fullScale: 200, resolution: 0.01 },
].map((range) => ({ ...range, form: 'digital', unit: 'V', current: 'dc', ofReading: 0.0005, ofRange: 0, counts: 2 }));

/** A lot of 40 on the bench, five units drawn, major Ac 0 Re 1, minor Ac 1 Re 2. */
export function benchReply(given: Partial<Bench> = {}): Bench {
  return {
    lot: {
      id: 12,
      number: 'L-26-0431',
      status: 'measuring',
      part: { id: 1, number: 'WA-12-500', name: 'Wall adapter 12 V, 500 mA' },
      supplier: { id: 1, name: 'Omdal Vik Supply' },
      deliveryNumber: 'D-7719',
      countedQuantity: 40,
      statedQuantity: 40,
      arrivedAt: '2026-03-12T08:00:00.000Z',
      neededBy: null,
      targetHours: 8,
      severity: 'normal',
      sampleSize: 5,
      unitsJudged: 0,
      stopped: false,
      verdict: null,
      drawnAt: '2026-03-12T09:00:00.000Z',
      submittedAt: null,
      decidedAt: null,
    },
    version: 3,
    sampling: {
      provisional: false,
      planId: 1,
      planNumber: 'P-014',
      revision: 4,
      level: 'II',
      severity: 'normal',
      sampleSize: 5,
      groups: [
        {
          key: 'major',
          class: 'major',
          aql: '1.0',
          characteristicKeys: ['no_load', 'loaded', 'ripple'],
          acceptance: 0,
          rejection: 1,
          ...GROUP,
        },
        {
          key: 'minor',
          class: 'minor',
          aql: '10',
          characteristicKeys: ['marking', 'regulation'],
          acceptance: 1,
          rejection: 2,
          ...GROUP,
        },
      ],
    },
    characteristics: CHARACTERISTICS,
    units: [1, 2, 3, 4, 5].map((unit) => ({ unit, position: unit * 7, carton: 1, setAside: null, ruling: null })),
    readings: [],
    instruments: [
      {
        id: 5,
        assetNumber: 'DM-11',
        kind: 'multimeter',
        description: 'Bench multimeter',
        serialNumber: '',
        place: 'Bench 1',
        calibrationDue: '2026-09-30',
        status: 'in-service',
        version: 1,
        ranges: RANGES,
        ...UNCHECKED,
        usable: true,
        daysLeft: 200,
      },
      {
        id: 6,
        assetNumber: 'DM-09',
        kind: 'multimeter',
        description: 'Bench multimeter',
        serialNumber: '',
        place: 'Bench 1',
        calibrationDue: '2026-02-21',
        status: 'in-service',
        version: 1,
        ranges: RANGES,
        ...UNCHECKED,
        usable: false,
        daysLeft: -19,
      },
    ],
    decisionRule: 'simple',
    coverageFactor: 2,
    warmUpMinutes: null,
    expected: null,
    conditions: null,
    racks: [],
    cursor: '2026-03-12T14:20:00.000Z',
    ...given,
  };
}
