import { type Bench, type ReadingEntry } from '#shared/contract/bench';
import { type Characteristic } from '#shared/contract/plans';
import { type Component, normal } from '#shared/uncertainty/component';
import { type InstrumentRange } from '#shared/uncertainty/instrument-range';
import { readingBudget } from '#shared/uncertainty/reading-budget';
import { type BenchReading } from './bench-reading';
import { rangeById } from './reading-range';

type Needed = Pick<Bench, 'characteristics' | 'instruments' | 'decisionRule' | 'coverageFactor'>;

/**
 * The uncertainty budgets of a lot's readings, as far as its decision rule asks for them. A budget is made once a reading:
 * neither the reading nor the range it was taken on ever changes.
 */
export class ReadingBudgets {
  private readonly known = new WeakMap<BenchReading, readonly Component[]>();
  private readonly characteristics: ReadonlyMap<string, Characteristic>;

  constructor(private readonly lot: Needed) {
    this.characteristics = new Map(lot.characteristics.map((each) => [each.key, each]));
  }

  /** Whether verdicts of this lot rest on uncertainties at all. */
  get asked(): boolean {
    return this.lot.decisionRule !== 'simple';
  }

  /** The budget of a reading; undefined where its uncertainty is not known. */
  of(reading: BenchReading): readonly Component[] | undefined {
    const known = this.known.get(reading);
    if (known !== undefined) return known;
    const made = this.make(reading);
    if (made !== undefined) this.known.set(reading, made);
    return made;
  }

  /** The budget of what is being typed. */
  ofTyped(
    characteristic: Characteristic,
    value: number,
    entry: ReadingEntry,
    range: InstrumentRange,
  ): readonly Component[] {
    const alternatePeaks = characteristic.kind === 'measured' ? characteristic.alternatePeaks : undefined;
    return readingBudget(value, entry, range, alternatePeaks);
  }

  /** A range that was changed since is not among those in use; what the server made of it stands for the whole budget. */
  private make({ characteristicKey, value, entry, rangeId, expandedUncertainty }: BenchReading) {
    const characteristic = this.characteristics.get(characteristicKey);
    if (value === null || characteristic?.kind !== 'measured') return undefined;
    const range = rangeById(this.lot.instruments, rangeId);
    if (range !== undefined) return readingBudget(value, entry, range, characteristic.alternatePeaks);
    if (expandedUncertainty === null) return undefined;
    return [normal('Range of an earlier specification', expandedUncertainty / this.lot.coverageFactor)];
  }
}
