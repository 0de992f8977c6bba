import { type DemoLot, type Ending } from './demo-lot';
import { type Fault } from './production';

/** A lot that is not decided yet at the last moment; hours are counted back from it, so that waits are always the same. */
export interface OpenLot {
  partNumber: string;
  supplierCode: string;
  quantity: number;
  /** Units counted more or less than the papers say. */
  countedMore?: number;
  hoursAgo: number;
  /** Hours after arrival by which the line needs the lot. */
  neededAfter?: number;
  drawnHoursAgo?: number;
  fault?: Fault;
  /** Who measures it, 0 where nothing is said. */
  bench?: 1;
  note?: string;
  setAside?: DemoLot['setAside'];
  ending: Ending;
}

const WAITING: Ending = { kind: 'waiting' };

export const OPEN_LOTS: readonly OpenLot[] = [
  {
    partNumber: 'WA-12-500',
    supplierCode: 'KES',
    quantity: 1200,
    hoursAgo: 13.4,
    drawnHoursAgo: 9.6,
    fault: 'low-capacitance',
    ending: { kind: 'submitted' },
  },
  {
    partNumber: 'OF-05-4A0',
    supplierCode: 'OMD',
    quantity: 320,
    hoursAgo: 11.2,
    drawnHoursAgo: 6.4,
    bench: 1,
    ending: { kind: 'submitted' },
  },
  { partNumber: 'OF-24-2A5', supplierCode: 'BAL', quantity: 240, hoursAgo: 10.3, neededAfter: 9, ending: WAITING },
  { partNumber: 'WA-09-300', supplierCode: 'KES', quantity: 2400, hoursAgo: 9.1, ending: WAITING },
  {
    partNumber: 'WA-12-500',
    supplierCode: 'OMD',
    quantity: 1200,
    hoursAgo: 7.9,
    drawnHoursAgo: 1.5,
    setAside: { unit: 45, reason: 'Cable loose at the strain relief; the contact comes and goes.' },
    ending: { kind: 'measuring', units: 47 },
  },
  {
    partNumber: 'OF-05-4A0',
    supplierCode: 'KES',
    quantity: 280,
    hoursAgo: 6.7,
    neededAfter: 6,
    note: 'Line 2 waits for this lot.',
    ending: WAITING,
  },
  {
    partNumber: 'WA-06-800',
    supplierCode: 'BAL',
    quantity: 800,
    hoursAgo: 6.1,
    drawnHoursAgo: 3.2,
    bench: 1,
    fault: 'smeared-marking',
    ending: { kind: 'measuring', units: 62 },
  },
  { partNumber: 'WA-24-400', supplierCode: 'OMD', quantity: 900, hoursAgo: 5.6, ending: WAITING },
  {
    partNumber: 'OF-24-2A5',
    supplierCode: 'OMD',
    quantity: 160,
    countedMore: -4,
    hoursAgo: 4.4,
    note: 'One carton was opened on the way.',
    ending: WAITING,
  },
  {
    partNumber: 'OF-12-3A0',
    supplierCode: 'OMD',
    quantity: 480,
    hoursAgo: 3.9,
    drawnHoursAgo: 0.35,
    ending: { kind: 'drawn' },
  },
  { partNumber: 'WA-12-500', supplierCode: 'BAL', quantity: 1200, hoursAgo: 3.1, ending: WAITING },
  { partNumber: 'OF-12-3A0', supplierCode: 'BAL', quantity: 320, hoursAgo: 2.2, ending: WAITING },
  {
    partNumber: 'OF-12-3A0',
    supplierCode: 'BAL',
    quantity: 320,
    hoursAgo: 2.1,
    ending: { kind: 'cancelled', reason: 'Booked in twice: the same delivery note.' },
  },
  {
    partNumber: 'WA-06-800',
    supplierCode: 'BAL',
    quantity: 1000,
    countedMore: 2,
    hoursAgo: 1.4,
    ending: WAITING,
  },
  { partNumber: 'WA-24-400', supplierCode: 'KES', quantity: 750, hoursAgo: 0.8, ending: WAITING },
  { partNumber: 'WA-12-500', supplierCode: 'KES', quantity: 1200, hoursAgo: 0.3, ending: WAITING },
];
