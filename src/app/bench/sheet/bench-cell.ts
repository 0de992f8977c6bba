import { type ExpectedBands } from '#shared/contract/parts';
import { type Characteristic } from '#shared/contract/plans';
import { formatLimits } from '#shared/quantities/format-quantity';
import { type CharacteristicVerdict, type UnitVerdict } from '#shared/verdict/sample-verdict';
import { unjudgedReason } from '#shared/verdict/verdict-reason';
import { readingDigits, readingText } from '../../ui/values/reading-text';
import { lookOf, LOOK_WORDS, type VerdictLook } from '../../ui/verdict-look';
import { type BenchColumn, type BenchStop } from './bench-column';
import { type BenchReading } from './bench-reading';
import { plausibilityOf } from './reading-plausibility';
import { countingAt, isOpenQuestion, readingsAt, refusedAt, type UnitRecord } from './unit-record';

/** What of a reading asks for attention beside its verdict: it waits for an answer, or lies outside the expected band. */
export interface CellMark {
  readonly kind: 'question' | 'outside';
  readonly words: string;
}

/** What one cell of the grid shows. */
export interface BenchCell {
  readonly key: string;
  readonly shape: BenchColumn['shape'];
  readonly text: string;
  readonly value: number | null;
  readonly look: VerdictLook;
  /** U where the decision rule asks for it, in SI base units; else 0. */
  readonly uncertainty: number;
  readonly mark: CellMark | null;
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

/** One unit as its cells need it. */
export interface CellSource {
  readonly record: UnitRecord;
  readonly verdict: UnitVerdict;
  /** The characteristic whose shown value is not kept yet. */
  readonly typedKey: string | null;
  readonly expected: ExpectedBands | null;
}

const NOT_JUDGED: CharacteristicVerdict = { value: null, verdict: 'not judged', side: null, expandedUncertainty: null };

/** The cell of a column for one unit. */
export function benchCell(column: BenchColumn, source: CellSource): BenchCell {
  const cells = column.stops.map((stop) => stopCell(column, stop, source));
  const [first] = cells;
  if (first === undefined) throw new RangeError(`column ${column.key} has no characteristic.`);
  return column.shape === 'attributes' ? mergedCell(column, cells) : first;
}

function stopCell({ shape }: BenchColumn, { characteristic, requiredTo }: BenchStop, source: CellSource): BenchCell {
  const { record, verdict, typedKey } = source;
  const { key } = characteristic;
  const judged = verdict.characteristics.get(key) ?? NOT_JUDGED;
  const counting = countingAt(record, key);
  const refusal = refusedAt(record, key)?.refusal?.message ?? null;
  const typed = key === typedKey;
  const mark = markOf(characteristic, judged, typed ? undefined : counting, source.expected);
  return {
    key,
    shape,
    text: valueText(characteristic, judged),
    value: typeof judged.value === 'number' ? judged.value : null,
    look: lookOf(judged.verdict),
    uncertainty: judged.expandedUncertainty ?? 0,
    mark,
    unasked: record.unit > requiredTo,
    attempts: readingsAt(record, key).length,
    typed,
    waiting: counting?.state === 'waiting',
    refusal,
    label: cellLabel(characteristic, judged, { waiting: counting?.state === 'waiting', refusal, mark }),
  };
}

function markOf(
  characteristic: Characteristic,
  { value }: CharacteristicVerdict,
  counting: BenchReading | undefined,
  expected: ExpectedBands | null,
): CellMark | null {
  if (counting !== undefined && isOpenQuestion(counting)) return { kind: 'question', words: 'waits for an answer' };
  const found = plausibilityOf(characteristic, expected, { value, entry: null });
  return found === null || found.state === 'inside' ? null : { kind: 'outside', words: 'outside the expected band' };
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
  { waiting, refusal, mark }: Pick<BenchCell, 'waiting' | 'refusal' | 'mark'>,
): string {
  if (refusal !== null) return `${characteristic.name}: refused. ${refusal}`;
  if (typeof value === 'boolean') return `${characteristic.name}: ${value ? 'pass' : 'fail'}`;
  const unjudged = unjudgedReason({ verdict, value });
  if (characteristic.kind === 'attribute' || unjudged === 'no reading') return `${characteristic.name}: no reading`;
  const { unit, decimals, lowerLimit, upperLimit } = characteristic;
  const parts = [
    value === null ? 'no value' : readingText(value, unit, decimals),
    formatLimits(lowerLimit, upperLimit, unit, decimals),
    verdict === 'conditional' ? 'conditional' : (unjudged ?? LOOK_WORDS[lookOf(verdict)].toLowerCase()),
    mark?.words ?? '',
    waiting ? 'not sent yet' : '',
  ];
  return `${characteristic.name}: ${parts.filter((part) => part !== '').join(', ')}`;
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
    uncertainty: 0,
    mark: null,
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
