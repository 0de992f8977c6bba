import { computed, inject, Injectable } from '@angular/core';
import { type ReadingEntry } from '#shared/contract/bench';
import {
  INSTRUMENT_KIND_TITLES,
  type Instrument,
  type InstrumentKind,
  type InstrumentRange,
} from '#shared/contract/instruments';
import { type Characteristic } from '#shared/contract/plans';
import { chosenRange, fittingRanges, type RangedQuantity } from '#shared/uncertainty/range-choice';
import { BenchSettings } from '../bench-settings';
import { BenchCursor } from './bench-cursor';
import { BenchSheet } from './bench-sheet';
import { rangedQuantity } from './reading-range';
import { waitsForCheck, whyUnusable } from './why-unusable';

/** The range of a reading: none known, chosen, or one that cannot have shown the value. */
export type RangeOutcome =
  | { readonly state: 'none' }
  | { readonly state: 'chosen'; readonly range: InstrumentRange }
  | { readonly state: 'refused'; readonly message: string };

/** The instrument that takes the readings of the characteristic in focus, and its range; remembered per kind. */
@Injectable()
export class InstrumentChoice {
  private readonly sheet = inject(BenchSheet);
  private readonly cursor = inject(BenchCursor);
  private readonly settings = inject(BenchSettings);

  /** The kind the plan asks for; null where it asks for none. */
  readonly kind = computed<InstrumentKind | null>(() => {
    const { characteristic } = this.cursor.stop();
    return characteristic.kind === 'computed' ? null : characteristic.instrumentKind;
  });
  /** Instruments of that kind, those that may not be used too, each with the reason. */
  readonly offered = computed(() =>
    this.ofKind(this.kind()).map((instrument) => ({ instrument, why: whyUnusable(instrument) })),
  );
  readonly chosen = computed(() => {
    const kind = this.kind();
    return kind === null ? null : this.inUse(kind);
  });
  /** What only waits for the check of the day: the one remembered, else the only one that could be used. */
  readonly toCheck = computed(() => {
    const kind = this.kind();
    return kind === null || this.chosen() !== null ? null : this.waitingForCheck(kind);
  });
  /** The ranges that read this characteristic, of the chosen instrument, in the order in which one is chosen. */
  readonly ranges = computed(() => {
    const quantity = this.quantity();
    return quantity === null ? [] : fittingRanges(this.chosen()?.ranges ?? [], quantity);
  });
  /** The range named; null where the smallest that holds the value is taken. */
  readonly named = computed(() => {
    const [instrument, quantity] = [this.chosen(), this.quantity()];
    const id = instrument === null || quantity === null ? null : this.namedIn(instrument, quantity);
    return this.ranges().find((range) => range.id === id) ?? null;
  });
  /** Instruments that the readings of this plan are taken with, as chosen now. */
  readonly allInUse = computed(() => {
    const kinds = this.sheet
      .bench()
      .characteristics.map((each) => (each.kind === 'computed' ? null : each.instrumentKind));
    return [...new Set(kinds)]
      .flatMap((kind) => (kind === null ? [] : [this.inUse(kind)]))
      .filter((instrument) => instrument !== null);
  });
  /** What keeps a reading from being kept; empty when nothing does. */
  readonly lacking = computed(() => this.lackingFor(this.cursor.stop().characteristic));
  private readonly quantity = computed(() => rangedQuantity(this.cursor.stop().characteristic));

  choose(instrument: Instrument): void {
    const { instruments } = this.settings;
    this.settings.change(instruments, { ...instruments(), [instrument.kind]: instrument.id });
  }

  /** Names the range that readings are taken on, or lets the smallest be taken (null). */
  chooseRange(id: number | null): void {
    const [instrument, quantity, { ranges }] = [this.chosen(), this.quantity(), this.settings];
    if (instrument === null || quantity === null) return;
    const key = keyOf(instrument, quantity);
    const others = Object.entries(ranges()).filter(([each]) => each !== key);
    const named = id === null ? [] : [[key, id] as const];
    this.settings.change(ranges, Object.fromEntries([...others, ...named]));
  }

  /** The range a value of the characteristic in focus was read on, as the server will take it. */
  rangeOf(value: number, entryKind: ReadingEntry['kind']): RangeOutcome {
    return this.rangeFor(this.cursor.stop().characteristic, value, entryKind);
  }

  /** The instrument that takes the readings of a characteristic. */
  instrumentFor(characteristic: Characteristic): Instrument | null {
    const kind = characteristic.kind === 'computed' ? null : characteristic.instrumentKind;
    return kind === null ? null : this.inUse(kind);
  }

  /** What keeps readings of a characteristic from being kept; empty when nothing does. */
  lackingFor(characteristic: Characteristic): string {
    const kind = characteristic.kind === 'computed' ? null : characteristic.instrumentKind;
    if (kind === null || this.inUse(kind) !== null) return '';
    const title = INSTRUMENT_KIND_TITLES[kind].toLowerCase();
    if (this.ofKind(kind).some(({ usable }) => usable)) return `Choose the ${title} that takes this reading.`;
    const toCheck = this.waitingForCheck(kind);
    if (toCheck !== null) return `Check ${toCheck.assetNumber} against its reference before its first reading today.`;
    return `No ${title} is in calibration. Readings wait until one is.`;
  }

  /** The range a value was read on, as the server will take it. */
  rangeFor(characteristic: Characteristic, value: number, entryKind: ReadingEntry['kind']): RangeOutcome {
    const instrument = this.instrumentFor(characteristic);
    const quantity = rangedQuantity(characteristic, entryKind);
    if (instrument === null || quantity === null) return { state: 'none' };
    try {
      const range = chosenRange(instrument.ranges, this.namedIn(instrument, quantity), value, quantity);
      return range === undefined ? { state: 'none' } : { state: 'chosen', range };
    } catch (thrown) {
      if (thrown instanceof RangeError) return { state: 'refused', message: thrown.message };
      throw thrown;
    }
  }

  /** The id of the range named for such a reading; null where the smallest is to be taken. */
  namedFor(characteristic: Characteristic, entryKind: ReadingEntry['kind']): number | null {
    const instrument = this.instrumentFor(characteristic);
    const quantity = rangedQuantity(characteristic, entryKind);
    return instrument === null || quantity === null ? null : this.namedIn(instrument, quantity);
  }

  private namedIn(instrument: Instrument, quantity: RangedQuantity): number | null {
    const id = this.settings.ranges()[keyOf(instrument, quantity)];
    return fittingRanges(instrument.ranges, quantity).find((range) => range.id === id)?.id ?? null;
  }

  /** The one remembered, or the only one there is. */
  private inUse(kind: InstrumentKind): Instrument | null {
    const usable = this.ofKind(kind).filter((each) => each.usable);
    const remembered = usable.find(({ id }) => id === this.settings.instruments()[kind]);
    return remembered ?? (usable.length === 1 ? (usable[0] ?? null) : null);
  }

  private waitingForCheck(kind: InstrumentKind): Instrument | null {
    const waiting = this.ofKind(kind).filter(waitsForCheck);
    const remembered = waiting.find(({ id }) => id === this.settings.instruments()[kind]);
    return remembered ?? waiting[0] ?? null;
  }

  private ofKind(kind: InstrumentKind | null): Instrument[] {
    return this.sheet.bench().instruments.filter((each) => each.kind === kind);
  }
}

/** Ranges are remembered by instrument, by what is read, and by how. */
function keyOf({ id }: Instrument, { unit, readAs }: RangedQuantity): string {
  return `${id} ${unit} ${readAs}`;
}
