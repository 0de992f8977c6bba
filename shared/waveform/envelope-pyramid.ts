/** Lowest and highest of even slices of a stretch of samples. */
export interface Envelope {
  low: Float32Array;
  high: Float32Array;
}

/** Samples that one entry of the lowest level stands for. */
const BASE = 16;

/** Lowest and highest of groups of entries, level upon level, each half as long as the one below. */
interface Level {
  span: number;
  low: Float32Array;
  high: Float32Array;
}

function halved({ span, low, high }: Level): Level {
  const length = Math.ceil(low.length / 2);
  const half: Level = { span: span * 2, low: new Float32Array(length), high: new Float32Array(length) };
  for (let at = 0; at < length; at += 1) {
    const first = at * 2;
    const second = Math.min(first + 1, low.length - 1);
    half.low[at] = Math.min(low[first] ?? 0, low[second] ?? 0);
    half.high[at] = Math.max(high[first] ?? 0, high[second] ?? 0);
  }
  return half;
}

/**
 * Answers what lies between two samples of a long waveform in as few steps as there are columns to draw: the lowest and
 * highest of groups are computed once, and looked up when the view moves.
 */
export class EnvelopePyramid {
  private readonly levels: Level[] = [];

  constructor(private readonly volts: Float32Array) {
    const length = Math.ceil(volts.length / BASE);
    let level: Level = { span: BASE, low: new Float32Array(length), high: new Float32Array(length) };
    for (let group = 0; group < length; group += 1) {
      const { low, high } = this.scan(group * BASE, Math.min((group + 1) * BASE, volts.length));
      level.low[group] = low;
      level.high[group] = high;
    }
    this.levels.push(level);
    while (level.low.length > 1) {
      level = halved(level);
      this.levels.push(level);
    }
  }

  /**
   * Lowest and highest of each of `columns` even slices of the samples from `from` up to, and without, `to`.
   *
   * @param columns at least 1; a slice narrower than a sample has the sample it lies in
   */
  between(from: number, to: number, columns: number): Envelope {
    const low = new Float32Array(columns);
    const high = new Float32Array(columns);
    const width = (to - from) / columns;
    for (let column = 0; column < columns; column += 1) {
      const first = Math.floor(from + column * width);
      const last = Math.max(first + 1, Math.ceil(from + (column + 1) * width));
      const found = this.range(Math.max(0, first), Math.min(last, this.volts.length));
      low[column] = found.low;
      high[column] = found.high;
    }
    return { low, high };
  }

  private scan(from: number, to: number): { low: number; high: number } {
    let low = Infinity;
    let high = -Infinity;
    for (let at = from; at < to; at += 1) {
      const value = this.volts[at] ?? 0;
      if (value < low) low = value;
      if (value > high) high = value;
    }
    return { low, high };
  }

  /** Walks from `from` to `to` by the largest groups that begin where it stands and fit. */
  private range(from: number, to: number): { low: number; high: number } {
    let low = Infinity;
    let high = -Infinity;
    let at = from;
    const take = (one: { low: number; high: number }) => {
      low = Math.min(low, one.low);
      high = Math.max(high, one.high);
    };
    while (at < to) {
      const level = this.levels.findLast(({ span }) => at % span === 0 && at + span <= to);
      if (level) {
        const group = at / level.span;
        take({ low: level.low[group] ?? Infinity, high: level.high[group] ?? -Infinity });
        at += level.span;
      } else {
        const next = Math.min(to, (Math.floor(at / BASE) + 1) * BASE);
        take(this.scan(at, next));
        at = next;
      }
    }
    return { low, high };
  }
}
