import { type Chance, chanceOf } from './chance';
import { type DemoLot } from './demo-lot';
import { demoPart } from './demo-parts';
import { OPEN_LOTS, type OpenLot } from './open-lots';
import { type PastLot, pastLots } from './past-lots';
import { later, timeOn, workDays } from './work-days';

/** The quarter of the demo: its first morning, its days and all its lots in the order of their arrival. */
export interface Quarter {
  firstMorning: Date;
  /** When the second revision of a plan is approved. */
  revisedAt: Date;
  /** Afternoon of the last day before the open lots. */
  lastAfternoon: Date;
  lots: DemoLot[];
}

/** The time the demo tells of: so many weeks in full, and before them so many of which there is less to tell. */
export interface DemoSpan {
  until: Date;
  seed: number;
  weeks: number;
  weeksBefore?: number;
}

const HOUR = 3_600_000;
const LOTS_A_WEEK = 4;
/** Of the weeks before the quarter there is less to tell, and the first start takes less long. */
const LOTS_A_WEEK_BEFORE = 1;
/** The open lots take the last hours; the lots before them are decided by then. */
const OPEN_HOURS = 15;
const LARGEST_SEED = 2 ** 31 - 1;
const UNITS_IN_A_CARTON = { 'open-frame': 20, 'wall-adapter': 100, 'desktop-adapter': 50 } as const;

/** Week of make, some weeks before the delivery, as two digits of the year and two of the week. */
function dateCode(arrivedAt: Date, chance: Chance): string {
  const made = new Date(arrivedAt.getTime() - chance.whole(5, 12) * 7 * 24 * HOUR);
  const newYear = Date.UTC(made.getUTCFullYear(), 0, 1);
  const week = Math.floor((made.getTime() - newYear) / (7 * 24 * HOUR)) + 1;
  return `${String(made.getUTCFullYear() % 100).padStart(2, '0')}${String(week).padStart(2, '0')}`;
}

function papers(lot: { partNumber: string; quantity: number; arrivedAt: Date }, index: number, chance: Chance) {
  const { body } = demoPart(lot.partNumber);
  return {
    partNumber: lot.partNumber,
    deliveryNumber: `D-${7610 + index}`,
    orderNumber: `PO-${4100 + chance.whole(0, 380)}`,
    statedQuantity: lot.quantity,
    dateCode: dateCode(lot.arrivedAt, chance),
    cartons: Math.ceil(lot.quantity / UNITS_IN_A_CARTON[body.form]),
    place: `Rack ${chance.pick(['A', 'B', 'C'])}${chance.whole(1, 6)}`,
    arrivedAt: lot.arrivedAt,
    seed: chance.whole(1, LARGEST_SEED),
  };
}

/** The day of one of so many lots that are spread evenly over days. */
function spreadOver(days: readonly Date[], index: number, count: number): Date | undefined {
  return days[Math.floor((index * days.length) / count)];
}

/** Two lots a day at most: one in the morning, one after noon. */
function pastLot(past: PastLot, day: Date, index: number, chance: Chance): DemoLot {
  const isMorning = index % 2 === 0;
  const arrivedAt = isMorning ? timeOn(day, 7, chance.whole(4, 50)) : timeOn(day, 8, chance.whole(0, 150));
  const drawnAt = isMorning ? timeOn(day, 8, chance.whole(5, 40)) : timeOn(day, 11, chance.whole(30, 55));
  const { lotSizes } = demoPart(past.partNumber);
  const quantity = past.isSmall ? Math.min(...lotSizes) : chance.pick(lotSizes);
  const byRack = past.fault === 'none' && chance.happens(0.25);
  return {
    ...papers({ partNumber: past.partNumber, quantity, arrivedAt }, index, chance),
    supplierCode: past.supplierCode,
    countedQuantity: quantity,
    note: '',
    neededBy: null,
    drawnAt,
    fault: past.fault,
    bench: isMorning ? 0 : 1,
    byRack,
    endsAtStop: past.endsAtStop,
    setAside: null,
    captured: past.fault === 'low-capacitance' || past.fault === 'bad-tap',
    ending: past.ending,
  };
}

function openLot(open: OpenLot, until: Date, index: number, chance: Chance): DemoLot {
  const arrivedAt = later(until, -open.hoursAgo * 60);
  return {
    ...papers({ partNumber: open.partNumber, quantity: open.quantity, arrivedAt }, index, chance),
    supplierCode: open.supplierCode,
    countedQuantity: open.quantity + (open.countedMore ?? 0),
    note: open.note ?? '',
    neededBy: open.neededAfter === undefined ? null : later(arrivedAt, open.neededAfter * 60),
    drawnAt: later(until, -(open.drawnHoursAgo ?? 0) * 60),
    fault: open.fault ?? 'none',
    bench: open.bench ?? 0,
    byRack: false,
    endsAtStop: false,
    setAside: open.setAside ?? null,
    captured: open.ending.kind === 'measuring' || open.ending.kind === 'submitted',
    ending: open.ending,
  };
}

/**
 * Everything that arrives in the weeks up to a moment, and more sparsely in the weeks before them. Past lots fall into working hours; the open lots of the last hours
 * are placed by that moment alone, so that the queues look alike whenever the demo is made.
 */
export function quarterOf({ until, seed, weeks, weeksBefore = 0 }: DemoSpan): Quarter {
  const chance = chanceOf(seed);
  const end = new Date(until.getTime() - OPEN_HOURS * HOUR);
  // A day counts as past when its last working hour is.
  const days = workDays(new Date(until.getTime() - weeks * 7 * 24 * HOUR), new Date(end.getTime() - 16 * HOUR));
  const [first, ...rest] = days;
  const last = rest.at(-1);
  if (!first || !last) throw new RangeError('weeks is too short for a quarter with a past.');
  const before = workDays(new Date(first.getTime() - weeksBefore * 7 * 24 * HOUR), new Date(first.getTime() - HOUR));
  const [start = first, ...early] = before;
  const earlier = weeksBefore * LOTS_A_WEEK_BEFORE;
  const told = pastLots(earlier + weeks * LOTS_A_WEEK, earlier, chance);
  const past = told.map((one, index) => {
    const day =
      index < earlier ? spreadOver(early, index, earlier) : spreadOver(rest, index - earlier, told.length - earlier);
    return pastLot(one, day ?? last, index, chance);
  });
  const open = OPEN_LOTS.map((one, index) => openLot(one, until, past.length + index, chance));
  return {
    firstMorning: timeOn(start, 7, 10),
    revisedAt: timeOn(rest[Math.floor(rest.length / 3)] ?? last, 15, 40),
    lastAfternoon: timeOn(last, 15, 45),
    lots: [...past, ...open],
  };
}
