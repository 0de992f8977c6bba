import { type RangeBody } from '#shared/contract/instruments';
import { type InstrumentBody } from './demo-bodies';

/** An instrument of the demo: its calibration is due so many days after the last day of the year. */
export type DemoInstrument = Omit<InstrumentBody, 'status'> & {
  dueInDays: number;
  /** Days from one calibration to the next. */
  everyDays: number;
  /** Whether the last calibration found it out of tolerance; it was used up to the day before. */
  isOutAtLast: boolean;
  ranges: readonly RangeBody[];
};

type Usual = Omit<DemoInstrument, 'everyDays' | 'isOutAtLast'>;
const yearly = (instrument: Usual): DemoInstrument => ({ ...instrument, everyDays: 365, isOutAtLast: false });

type Digital = Extract<RangeBody, { form: 'digital' }>;

function digital(range: Pick<Digital, 'name' | 'unit' | 'fullScale' | 'resolution'> & Partial<Digital>): Digital {
  return { form: 'digital', current: 'any', ofReading: 0, ofRange: 0, counts: 0, ...range };
}

const SCREEN: RangeBody = {
  form: 'graticule',
  name: 'Screen, 8 divisions',
  unit: 'V',
  screenDivisions: 8,
  ofReading: 0.02,
  ofFullScale: 0.002,
  readingStep: 0.1,
};
const SCOPE_RANGES: readonly RangeBody[] = [
  SCREEN,
  digital({
    name: 'Cursors, 40 V',
    unit: 'V',
    current: 'dc',
    fullScale: 40,
    resolution: 0.02,
    ofReading: 0.02,
    counts: 1,
  }),
];

const METER_ACCURACY = { unit: 'V', current: 'dc', ofReading: 0.00015, ofRange: 0.00004 } as const;
const METER_RANGES: readonly RangeBody[] = [
  digital({ name: 'DC 2 V', ...METER_ACCURACY, fullScale: 2, resolution: 1e-5 }),
  digital({ name: 'DC 20 V', ...METER_ACCURACY, fullScale: 20, resolution: 1e-4 }),
  digital({ name: 'DC 200 V', ...METER_ACCURACY, fullScale: 200, resolution: 1e-3 }),
  digital({
    name: 'AC 20 V',
    unit: 'V',
    current: 'ac',
    fullScale: 20,
    resolution: 1e-4,
    ofReading: 0.002,
    ofRange: 0.001,
  }),
];

const USUAL_INSTRUMENTS: readonly Usual[] = [
  {
    assetNumber: 'OS-03',
    kind: 'oscilloscope',
    description: 'Two-channel oscilloscope, 100 MHz',
    serialNumber: 'Z31-40718',
    place: 'Bench 1',
    dailyReference: null,
    ranges: SCOPE_RANGES,
    dueInDays: 148,
  },
  {
    assetNumber: 'OS-02',
    kind: 'oscilloscope',
    description: 'Two-channel oscilloscope, 60 MHz',
    serialNumber: 'Z22-11920',
    place: 'Bench 2',
    dailyReference: null,
    ranges: SCOPE_RANGES,
    dueInDays: -12,
  },
  {
    assetNumber: 'DM-11',
    kind: 'multimeter',
    description: 'Bench multimeter, 5½ digits',
    serialNumber: '770-0311',
    place: 'Bench 1',
    dailyReference: { name: 'Reference source, 10 V', unit: 'V', value: 10, tolerance: 0.005 },
    ranges: METER_RANGES,
    dueInDays: 201,
  },
  {
    assetNumber: 'DM-12',
    kind: 'multimeter',
    description: 'Bench multimeter, 5½ digits',
    serialNumber: '770-0312',
    place: 'Bench 2',
    dailyReference: { name: 'Reference source, 10 V', unit: 'V', value: 10, tolerance: 0.005 },
    ranges: METER_RANGES,
    dueInDays: 64,
  },
  {
    assetNumber: 'EL-02',
    kind: 'electronic-load',
    description: 'Electronic load, 80 V, 30 A, 150 W',
    serialNumber: 'LD-2208',
    place: 'Bench 1',
    dailyReference: null,
    ranges: [
      digital({
        name: '3 A',
        unit: 'A',
        current: 'dc',
        fullScale: 3,
        resolution: 1e-4,
        ofReading: 0.0005,
        ofRange: 0.0005,
      }),
      digital({
        name: '30 A',
        unit: 'A',
        current: 'dc',
        fullScale: 30,
        resolution: 1e-3,
        ofReading: 0.0005,
        ofRange: 0.0005,
      }),
    ],
    dueInDays: 9,
  },
  {
    assetNumber: 'IT-04',
    kind: 'insulation-tester',
    description: 'Insulation tester, 500 V DC',
    serialNumber: 'IR5-0093',
    place: 'Cage',
    dailyReference: null,
    ranges: [
      digital({ name: '20 GΩ at 500 V', unit: 'Ω', fullScale: 2e10, resolution: 1e6, ofReading: 0.05, counts: 5 }),
    ],
    dueInDays: 96,
  },
  {
    assetNumber: 'TC-05',
    kind: 'thermometer',
    description: 'Thermometer with thermocouple type K',
    serialNumber: 'K2-5518',
    place: 'Bench 2',
    dailyReference: null,
    ranges: [digital({ name: 'Type K', unit: 'K', fullScale: 400, resolution: 0.1, ofReading: 0.001, counts: 7 })],
    dueInDays: 120,
  },
  {
    assetNumber: 'PM-01',
    kind: 'power-meter',
    description: 'Power meter, 10 mW to 600 W',
    serialNumber: 'PW-0147',
    place: 'Bench 1',
    dailyReference: null,
    ranges: [
      digital({ name: '1 W', unit: 'W', fullScale: 1, resolution: 1e-4, ofReading: 0.001, ofRange: 0.001 }),
      digital({ name: '100 W', unit: 'W', fullScale: 100, resolution: 1e-2, ofReading: 0.001, ofRange: 0.001 }),
    ],
    dueInDays: 230,
  },
  {
    assetNumber: 'RU-07',
    kind: 'rule',
    description: 'Steel rule, 2 m',
    serialNumber: '',
    place: 'Bench 2',
    dailyReference: null,
    ranges: [digital({ name: '2 m', unit: 'm', fullScale: 2, resolution: 0.0005, counts: 1 })],
    dueInDays: 310,
  },
];

export const DEMO_INSTRUMENTS: readonly DemoInstrument[] = [
  ...USUAL_INSTRUMENTS.map(yearly),
  {
    assetNumber: 'OS-01',
    kind: 'oscilloscope',
    description: 'Two-channel oscilloscope, 60 MHz',
    serialNumber: 'Z22-11873',
    place: 'Bench 2',
    dailyReference: null,
    ranges: SCOPE_RANGES,
    dueInDays: 119,
    everyDays: 182,
    isOutAtLast: true,
  },
];
