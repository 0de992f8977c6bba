import { type InstrumentBody } from './demo-bodies';

/** An instrument of the demo: its calibration is due so many days after the last day of the quarter. */
export type DemoInstrument = Omit<InstrumentBody, 'calibrationDue' | 'status'> & { dueInDays: number };

export const DEMO_INSTRUMENTS: readonly DemoInstrument[] = [
  {
    assetNumber: 'OS-03',
    kind: 'oscilloscope',
    description: 'Two-channel oscilloscope, 100 MHz',
    serialNumber: 'Z31-40718',
    place: 'Bench 1',
    dueInDays: 148,
  },
  {
    assetNumber: 'OS-02',
    kind: 'oscilloscope',
    description: 'Two-channel oscilloscope, 60 MHz',
    serialNumber: 'Z22-11920',
    place: 'Bench 2',
    dueInDays: -12,
  },
  {
    assetNumber: 'DM-11',
    kind: 'multimeter',
    description: 'Bench multimeter, 5½ digits',
    serialNumber: '770-0311',
    place: 'Bench 1',
    dueInDays: 201,
  },
  {
    assetNumber: 'DM-12',
    kind: 'multimeter',
    description: 'Bench multimeter, 5½ digits',
    serialNumber: '770-0312',
    place: 'Bench 2',
    dueInDays: 64,
  },
  {
    assetNumber: 'EL-02',
    kind: 'electronic-load',
    description: 'Electronic load, 80 V, 30 A, 150 W',
    serialNumber: 'LD-2208',
    place: 'Bench 1',
    dueInDays: 9,
  },
  {
    assetNumber: 'IT-04',
    kind: 'insulation-tester',
    description: 'Insulation tester, 500 V DC',
    serialNumber: 'IR5-0093',
    place: 'Cage',
    dueInDays: 96,
  },
  {
    assetNumber: 'TC-05',
    kind: 'thermometer',
    description: 'Thermometer with thermocouple type K',
    serialNumber: 'K2-5518',
    place: 'Bench 2',
    dueInDays: 120,
  },
  {
    assetNumber: 'PM-01',
    kind: 'power-meter',
    description: 'Power meter, 10 mW to 600 W',
    serialNumber: 'PW-0147',
    place: 'Bench 1',
    dueInDays: 230,
  },
  {
    assetNumber: 'RU-07',
    kind: 'rule',
    description: 'Steel rule, 2 m',
    serialNumber: '',
    place: 'Bench 2',
    dueInDays: 310,
  },
];
