import { type EvenSamples, evenSamples } from './even-samples';
import { GrowingSamples } from './growing-samples';
import { NumeralBytes } from './numeral-bytes';
import { tableLayout, type TableLayout } from './table-layout';
import { WaveformNotUnderstood } from './waveform-not-understood';

/** A waveform as it stands in its file. */
export interface ParsedWaveform extends EvenSamples {
  /** Names of the columns that could have been taken. */
  columns: string[];
  /** Name of the one that was. */
  channel: string;
}

/** The most samples that are taken in. */
export const MOST_SAMPLES = 5_000_000;
/** So much of a file shows how its table lies in it. */
const HEAD_BYTES = 65_536;
/** Nothing that is a row of samples is longer. */
const LONGEST_ROW = 65_536;
/** A float holds no more; and no supply of this world gives it. */
const MOST_VOLTS = 1e9;

const BYTE_ORDER_MARK = [0xef, 0xbb, 0xbf];
const LINE_FEED = 10;
const RETURN = 13;
const SPACE = 32;
const QUOTE = 34;

function joined(before: Uint8Array, after: Uint8Array): Uint8Array {
  if (before.length === 0) return after;
  const both = new Uint8Array(before.length + after.length);
  both.set(before);
  both.set(after, before.length);
  return both;
}

/** What is a text in bytes, as far as it is looked at here: not one of two bytes to a letter, and not binary. */
function refuseBinary(bytes: Uint8Array): void {
  const [first, second] = bytes;
  if ((first === 0xff && second === 0xfe) || (first === 0xfe && second === 0xff))
    throw new WaveformNotUnderstood('The file is a text in UTF-16. Save it as UTF-8 or plain text (CSV).');
  if (bytes.includes(0))
    throw new WaveformNotUnderstood('The file is not a text. A waveform is a table (CSV) of times and voltages.');
}

/**
 * Reads a waveform file as it comes, in pieces of any size: two or more columns, the time and one or more voltages, with
 * any delimiter, headings, decimal point or comma.
 */
export class WaveformParser {
  private rest: Uint8Array = new Uint8Array(0);
  private layout: TableLayout | undefined;
  private numerals = new NumeralBytes(0);
  private channel: TableLayout['channels'][number] = { name: '', column: 0, scale: 1 };
  private readonly samples = new GrowingSamples();
  private row = 0;
  private newline = LINE_FEED;
  /** Rows before a sample that are none, so that a sample's row can be told. */
  private readonly rowsSkipped: { sample: number; rows: number }[] = [];

  /**
   * @param wanted name of the column to take; the first beside the time where null
   * @param most how many samples are taken in
   */
  constructor(
    private readonly wanted: string | null = null,
    private readonly most = MOST_SAMPLES,
  ) {}

  /** @throws {WaveformNotUnderstood} with the row at fault */
  push(piece: Uint8Array): void {
    const bytes = joined(this.rest, piece);
    if (!this.layout && bytes.length < HEAD_BYTES) this.rest = bytes;
    else this.read(bytes, false);
  }

  /** @throws {WaveformNotUnderstood} */
  finish(): ParsedWaveform {
    this.read(this.rest, true);
    const { count, seconds, volts } = this.samples;
    if (count < 2) throw new WaveformNotUnderstood('The file has one row of numbers; a waveform has many.');
    const columns = this.layout?.channels.map(({ name }) => name) ?? [];
    const even = evenSamples(seconds, volts, (sample) => this.rowOf(sample));
    return { ...even, columns, channel: this.channel.name };
  }

  private rowOf(sample: number): number {
    const skipped = this.rowsSkipped.filter((one) => one.sample <= sample).reduce((sum, { rows }) => sum + rows, 0);
    return sample + 1 + skipped;
  }

  private read(bytes: Uint8Array, isLast: boolean): void {
    let from = !this.layout && BYTE_ORDER_MARK.every((byte, at) => bytes[at] === byte) ? BYTE_ORDER_MARK.length : 0;
    const layout = this.layout ?? this.begin(bytes, isLast);
    while (from < bytes.length) {
      let to = bytes.indexOf(this.newline, from);
      if (to < 0) {
        if (!isLast) break;
        to = bytes.length;
      }
      this.readRow(layout, bytes, from, to);
      from = to + 1;
    }
    this.rest = bytes.slice(Math.min(from, bytes.length));
    if (this.rest.length > LONGEST_ROW)
      throw new WaveformNotUnderstood('it is too long to be one of a table of samples.', this.row + 1);
  }

  /** Finds out how the table lies in the file. */
  private begin(bytes: Uint8Array, isWhole: boolean): TableLayout {
    const head = bytes.subarray(0, HEAD_BYTES);
    if (head.length === 0) throw new WaveformNotUnderstood('The file is empty.');
    refuseBinary(head);
    if (!head.includes(LINE_FEED) && head.includes(RETURN)) this.newline = RETURN;
    const lines = new TextDecoder().decode(head).split(this.newline === RETURN ? '\r' : /\r?\n/);
    // The last one may be cut off.
    if (!isWhole || head.length < bytes.length) lines.pop();
    this.layout = tableLayout(lines);
    this.numerals = new NumeralBytes(this.layout.decimal.charCodeAt(0));
    this.channel = this.chosen(this.layout);
    return this.layout;
  }

  private chosen({ channels }: TableLayout): TableLayout['channels'][number] {
    const chosen = this.wanted === null ? channels[0] : channels.find(({ name }) => name === this.wanted);
    if (chosen) return chosen;
    const names = channels.map(({ name }) => `“${name}”`).join(', ');
    throw new WaveformNotUnderstood(`The file has no column “${this.wanted ?? ''}”. It has ${names}.`);
  }

  private readRow(layout: TableLayout, bytes: Uint8Array, from: number, end: number): void {
    this.row += 1;
    let to = end;
    if (to > from && bytes[to - 1] === RETURN) to -= 1;
    if (this.row <= layout.headRows || this.isBlank(bytes, from, to)) {
      this.skip();
      return;
    }
    const seconds = this.field(layout, bytes, from, to, layout.time.column) * layout.time.scale;
    const volts = this.field(layout, bytes, from, to, this.channel.column) * this.channel.scale;
    if (seconds < this.samples.last)
      throw new WaveformNotUnderstood('time goes backwards; the samples must stand in the order of time.', this.row);
    if (Math.abs(volts) > MOST_VOLTS)
      throw new WaveformNotUnderstood('the voltage is larger than any supply gives.', this.row);
    if (this.samples.count === this.most)
      throw new WaveformNotUnderstood(
        `The file has more than ${this.most.toLocaleString('en').replaceAll(',', '\u202f')} samples.`,
      );
    this.samples.add(seconds, volts);
  }

  private skip(): void {
    const sample = this.samples.count;
    const latest = this.rowsSkipped.at(-1);
    if (latest?.sample === sample) latest.rows += 1;
    else this.rowsSkipped.push({ sample, rows: 1 });
  }

  private isBlank(bytes: Uint8Array, from: number, to: number): boolean {
    for (let at = from; at < to; at += 1) if ((bytes[at] ?? 0) > SPACE) return false;
    return true;
  }

  /** The number in one column of a row. @throws {WaveformNotUnderstood} where there is none */
  private field(layout: TableLayout, bytes: Uint8Array, from: number, to: number, column: number): number {
    const delimiter = layout.delimiter.charCodeAt(0);
    let start = from;
    if (delimiter === SPACE) while (start < to && bytes[start] === SPACE) start += 1;
    for (let passed = 0; passed < column; passed += 1) {
      let next = start;
      while (next < to && bytes[next] !== delimiter) next += 1;
      if (next === to) throw new WaveformNotUnderstood('it has fewer columns than the rows above it.', this.row);
      start = next + 1;
      if (delimiter === SPACE) while (start < to && bytes[start] === SPACE) start += 1;
    }
    let end = start;
    while (end < to && bytes[end] !== delimiter) end += 1;
    const isPadding = (byte = 0) => byte === SPACE || byte === QUOTE || byte === 9;
    while (start < end && isPadding(bytes[start])) start += 1;
    while (end > start && isPadding(bytes[end - 1])) end -= 1;
    const value = this.numerals.read(bytes, start, end);
    if (Number.isFinite(value)) return value;
    throw new WaveformNotUnderstood(
      this.notANumber(bytes.subarray(start, Math.min(end, start + 30)), column),
      this.row,
    );
  }

  private notANumber(bytes: Uint8Array, column: number): string {
    const text = new TextDecoder().decode(bytes);
    const what = column === this.layout?.time.column ? 'time' : 'voltage';
    return text === '' ? `the ${what} is missing.` : `“${text}” stands where the ${what} should be.`;
  }
}
