import { type Chance } from './chance';
import { type Ending } from './demo-lot';
import { DEMO_PARTS } from './demo-parts';
import { type Fault } from './production';

/** What is told of a past lot, before it gets its papers and its day. */
export interface PastLot {
  partNumber: string;
  supplierCode: string;
  fault: Fault;
  endsAtStop: boolean;
  ending: Ending;
  /** The least that is delivered of the part. */
  isSmall?: boolean;
}

const DECIDED: Ending = { kind: 'decided' };

/** The events of the year, by their place counted back from its last decided lot. */
const EVENTS: ReadonlyMap<number, PastLot> = new Map([
  [
    2,
    {
      partNumber: 'WA-12-500',
      supplierCode: 'KES',
      fault: 'low-capacitance',
      endsAtStop: true,
      ending: DECIDED,
    },
  ],
  [
    4,
    {
      partNumber: 'OF-12-3A0',
      supplierCode: 'BAL',
      fault: 'none',
      endsAtStop: false,
      ending: { kind: 'held', reason: 'The supplier announced a change of the transformer; waiting for its drawing.' },
    },
  ],
  [6, { partNumber: 'OF-24-2A5', supplierCode: 'OMD', fault: 'bad-tap', endsAtStop: false, ending: DECIDED }],
  [
    9,
    {
      partNumber: 'WA-12-500',
      supplierCode: 'KES',
      fault: 'low-capacitance',
      endsAtStop: false,
      ending: DECIDED,
    },
  ],
  [19, { partNumber: 'WA-09-300', supplierCode: 'BAL', fault: 'smeared-marking', endsAtStop: false, ending: DECIDED }],
  [57, { partNumber: 'WA-12-500', supplierCode: 'KES', fault: 'low-capacitance', endsAtStop: false, ending: DECIDED }],
  [71, { partNumber: 'WA-24-400', supplierCode: 'OMD', fault: 'smeared-marking', endsAtStop: false, ending: DECIDED }],
  [31, { partNumber: 'WA-24-400', supplierCode: 'OMD', fault: 'reversed-plug', endsAtStop: true, ending: DECIDED }],
]);

/** Every part of every supplier, in an order that chance decides. */
function everyPair(chance: Chance): { partNumber: string; supplierCode: string }[] {
  const pairs = DEMO_PARTS.flatMap(({ body, suppliers }) =>
    suppliers.map((supplierCode) => ({ partNumber: body.number, supplierCode })),
  );
  return pairs
    .map((pair) => ({ pair, rank: chance.between(0, 1) }))
    .sort((a, b) => a.rank - b.rank)
    .map(({ pair }) => pair);
}

/**
 * So many past lots in the order of their days: parts and suppliers in turn, with the events between.
 *
 * @param small how many of them, the first, are small
 */
export function pastLots(count: number, small: number, chance: Chance): PastLot[] {
  const plain: { partNumber: string; supplierCode: string }[] = [];
  return Array.from({ length: count }, (_, index) => {
    const event = EVENTS.get(count - index);
    if (event) return event;
    if (plain.length === 0) plain.push(...everyPair(chance));
    const pair = plain.shift();
    if (!pair) throw new RangeError('The demo has no parts.');
    return { ...pair, fault: 'none', endsAtStop: false, ending: DECIDED, isSmall: index < small };
  });
}
