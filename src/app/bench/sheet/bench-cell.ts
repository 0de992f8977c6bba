import { type Characteristic } from '#shared/contract/plans';
import { formatLimits } from '#shared/quantities/format-quantity';
import { type CharacteristicVerdict, type UnitVerdict } from '#shared/verdict/sample-verdict';
import { readingDigits, readingText } from '../../ui/values/reading-text';
import { lookOf, LOOK_WORDS, type VerdictLook } from '../../ui/verdict-look';
import { type BenchColumn, type BenchStop } from './bench-column';
import { type BenchReading } from './bench-reading';
import { countingAt, readingsAt, refusedAt, type UnitRecord } from './unit-record';

/** What one cell of the grid shows. */
export interface BenchCell {
  readonly key: string;
  readonly shape: BenchColumn['shape'];
  readonly text: string;
  readonly value: number | null;
  readonly look: VerdictLook;
  /** Whether the plan asks nothing here, as the unit is beyond the characteristic's sample. */
  readonly unasked: boolean;
  /** How often the reading was taken; 1 is not shown. */
  readonly attempts: number;
  /** Whether what is shown is typed and not yet kept. */
  readonly typed: boolean;
  readonly waiting: boolean;
  /** The server's sentence about a refused reading. */
  readonly refusal: string | null;
  /** The cell as a sentence. */
  readonly label: string;
}

/** The cell of a column for one unit; `typedKey` is the characteristic whose shown value is not kept yet. */
export function benchCell(
  column: BenchColumn,
  record: UnitRecord,
  verdict: UnitVerdict,
  typedKey: string | null,
): BenchCell {
  const cells = column.stops.map((stop) => stopCell(column, stop, record, verdict, typedKey));
  const [first] = cells;
  if (first === undefined) throw new RangeError(`column ${column.key} has no characteristic.`);
  return column.shape === 'attributes' ? mergedCell(column, cells) : first;
}

function stopCell(
  { shape }: BenchColumn,
  { characteristic, requiredTo }: BenchStop,
  record: UnitRecord,
  verdict: UnitVerdict,
  typedKey: string | null,
): BenchCell {
  const { key } = characteristic;
  const judged = verdict.characteristics.get(key) ?? { value: null, verdict: 'not judged' };
  const counting = countingAt(record, key);
  const refusal = refusedAt(record, key)?.refusal ?? null;
  const text = valueText(characteristic, judged);
  return {
    key,
    shape,
    text,
    value: typeof judged.value === 'number' ? judged.value : null,
    look: lookOf(judged.verdict),
    unasked: record.unit > requiredTo,
    attempts: readingsAt(record, key).length,
    typed: key === typedKey,
    waiting: counting?.state === 'waiting',
    refusal,
    label: cellLabel(characteristic, judged, counting, refusal),
  };
}

function valueText(characteristic: Characteristic, { value, verdict }: CharacteristicVerdict): string {
  if (typeof value === 'boolean') return value ? 'Pass' : 'Fail';
  if (characteristic.kind === 'attribute') return '';
  if (value !== null) return readingDigits(value, characteristic.unit, characteristic.decimals);
  return verdict === 'nonconforming' ? 'none' : '';
}

function cellLabel(
  characteristic: Characteristic,
  { value, verdict }: CharacteristicVerdict,
  counting: BenchReading | undefined,
  refusal: string | null,
): string {
  if (refusal !== null) return `${characteristic.name}: refused. ${refusal}`;
  if (typeof value === 'boolean') return `${characteristic.name}: ${value ? 'pass' : 'fail'}`;
  if (characteristic.kind === 'attribute' || verdict === 'not judged') return `${characteristic.name}: no reading`;
  const { unit, decimals, lowerLimit, upperLimit } = characteristic;
  const shown = value === null ? 'no value' : readingText(value, unit, decimals);
  const limits = formatLimits(lowerLimit, upperLimit, unit, decimals);
  const waiting = counting?.state === 'waiting' ? ', not sent yet' : '';
  return `${characteristic.name}: ${shown}, ${limits}, ${LOOK_WORDS[lookOf(verdict)].toLowerCase()}${waiting}`;
}

function mergedCell(column: BenchColumn, cells: readonly BenchCell[]): BenchCell {
  const asked = cells.filter(({ unasked, text }) => !unasked || text !== '');
  const judged = asked.filter(({ text }) => text !== '');
  const failing = asked.find(({ look }) => look === 'nok');
  const text = failing ? 'Fail' : mergedText(judged.length, asked.length);
  return {
    key: column.key,
    shape: column.shape,
    text,
    value: null,
    look: failing ? 'nok' : judged.length === asked.length && asked.length > 0 ? 'ok' : 'open',
    unasked: asked.length === 0,
    attempts: Math.max(...cells.map(({ attempts }) => attempts)),
    typed: cells.some(({ typed }) => typed),
    waiting: cells.some(({ waiting }) => waiting),
    refusal: cells.find(({ refusal }) => refusal !== null)?.refusal ?? null,
    label: [text, ...cells.map(({ label }) => label)].filter((part) => part !== '').join('; '),
  };
}

function mergedText(judged: number, asked: number): string {
  if (judged === 0) return '';
  return judged === asked ? 'Pass' : `${judged} of ${asked}`;
}
