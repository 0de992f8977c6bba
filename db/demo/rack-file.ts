import { asRackText } from './as-typed';
import { type WorkOfCharacteristic } from './bench-work';
import { type UnitTruth } from './unit-readings';

/** What the automated rack of the demo can read; the rest is read by hand. */
const RACK_KEYS = ['polarity', 'insulation', 'v_no_load', 'v_loaded', 'ripple_pp'];

/** Whether the rack reads a characteristic. */
export function isReadByRack(key: string): boolean {
  return RACK_KEYS.includes(key);
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
  const head = ['unit', ...columns.map(({ content }) => content.key)];
  const rows = truths.map((truth, index) => [
    String(index + 1),
    ...columns.map((column) => cell(column, truth, index + 1)),
  ]);
  return [head, ...rows].map((cells) => cells.join(',')).join('\n') + '\n';
}
