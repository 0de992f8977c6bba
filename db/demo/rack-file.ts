import { asRackText } from './as-typed';
import { type WorkOfCharacteristic } from './bench-work';
import { type UnitTruth } from './unit-readings';

/** The automated rack of the demo: what it is called, and what the columns of its files hold. */
export const DEMO_RACK = { name: 'Rack 2', place: 'Test room' } as const;

/** What the rack calls what it can read; the rest is read by hand. */
const HEADINGS: Readonly<Record<string, string>> = {
  polarity: 'Plug',
  insulation: 'Riso [MOhm]',
  v_no_load: 'Vout open [V]',
  v_loaded: 'Vout load [V]',
  ripple_pp: 'Vripple [Vpp]',
};
const UNIT_HEADING = 'DUT';
const TEST_HEADING = 'Sequence';

/** What the columns of its files hold, as it is said when one is brought in: heading to key, null for what is skipped. */
export const RACK_MAPPING: Readonly<Record<string, string | null>> = {
  [UNIT_HEADING]: 'unit',
  [TEST_HEADING]: null,
  ...Object.fromEntries(Object.entries(HEADINGS).map(([key, heading]) => [heading, key])),
};

/** Whether the rack reads a characteristic. */
export function isReadByRack(key: string): boolean {
  return Object.hasOwn(HEADINGS, key);
}

function cell({ content, requiredTo }: WorkOfCharacteristic, truth: UnitTruth, unit: number): string {
  if (unit > requiredTo) return '';
  if (content.kind === 'attribute') return truth.failures.has(content.key) ? 'fail' : 'pass';
  const value = truth.values.get(content.key);
  return content.kind === 'measured' && value !== undefined ? asRackText(value, content) : '';
}

/** The file a rack writes of a sample: comma-separated, a line for each unit in draw order. */
export function rackFile(characteristics: readonly WorkOfCharacteristic[], truths: readonly UnitTruth[]): string {
  const columns = characteristics.filter(({ content }) => isReadByRack(content.key));
  const head = [UNIT_HEADING, TEST_HEADING, ...columns.map(({ content }) => HEADINGS[content.key])];
  const rows = truths.map((truth, index) => [
    String(index + 1),
    'SQ-4',
    ...columns.map((column) => cell(column, truth, index + 1)),
  ]);
  return [head, ...rows].map((cells) => cells.join(',')).join('\n') + '\n';
}
