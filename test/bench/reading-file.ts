import { addYears } from './years-of-readings';
import { accessOf, closeContext, contextOn, settle } from './bench-site';
import { planOf, TWELVE } from './bench-plan';
import { type DrawnLot, drawnLots, planned, type Planned } from './drawn-lots';

/** How many inspectors measure at the same time, each a lot of its own. */
export const CLIENTS = 20;
/** Code letter L: a sample of 200. */
const QUANTITY = 5000;

/** A file with lots at the benches, and what a client must know to measure them. */
export interface ReadingFile {
  file: string;
  access: string;
  personId: number;
  planned: Planned;
  lots: DrawnLot[];
  /** Rows of the sample units by lot, in draw order. */
  unitIds: ReadonlyMap<number, readonly number[]>;
}

/** @param years whether two years of lots and readings are in the file already */
export async function readingFile(file: string, years: boolean): Promise<ReadingFile> {
  const context = contextOn(file);
  const caller = await settle(context);
  const references = planned(context, caller.id, planOf(TWELVE));
  if (years) addYears(context.db, references, caller.id);
  const lots = drawnLots(context, caller, references, { lots: CLIENTS, quantity: QUANTITY });
  const units = context.db.$client.prepare<[number], number>('select id from sample_units where lot_id = ?').pluck();
  const unitIds = new Map(lots.map(({ id }) => [id, units.all(id)]));
  const access = accessOf(context, caller);
  closeContext(context);
  return { file, access, personId: caller.id, planned: references, lots, unitIds };
}
