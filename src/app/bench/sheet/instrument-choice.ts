import { computed, inject, Injectable } from '@angular/core';
import { type ReadingEntry } from '#shared/contract/bench';
import {
  INSTRUMENT_KIND_TITLES,
  type Instrument,
  type InstrumentKind,
  type InstrumentRange,
} from '#shared/contract/instruments';
import { chosenRange, fittingRanges } from '#shared/uncertainty/range-choice';
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
    this.sheet
      .bench()
      .instruments.filter(({ kind }) => kind === this.kind())
      .map((instrument) => ({ instrument, why: whyUnusable(instrument) })),
  );
  readonly chosen = computed(() => {
    const kind = this.kind();
    return kind === null ? null : this.inUse(kind);
  });
  /** What only waits for the check of the day: the one remembered, else the only one that could be used. */
  readonly toCheck = computed(() => {
    const waiting = this.offered().flatMap(({ instrument }) => (waitsForCheck(instrument) ? [instrument] : []));
    const kind = this.kind();
    if (kind === null || this.chosen() !== null) return null;
    const remembered = waiting.find(({ id }) => id === this.settings.instruments()[kind]);
    return remembered ?? waiting[0] ?? null;
  });
  /** The ranges that read this characteristic, of the chosen instrument, in the order in which one is chosen. */
  readonly ranges = computed(() => {
    const quantity = this.quantity();
    return quantity === null ? [] : fittingRanges(this.chosen()?.ranges ?? [], quantity);
  });
  /** The range named; null where the smallest that holds the value is taken. */
  readonly named = computed(() => {
    const id = this.settings.ranges()[this.rangeKey()];
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
  readonly lacking = computed(() => {
    const kind = this.kind();
    if (kind === null || this.chosen() !== null) return '';
    const title = INSTRUMENT_KIND_TITLES[kind].toLowerCase();
    if (this.offered().some(({ instrument }) => instrument.usable))
      return `Choose the ${title} that takes this reading.`;
    const toCheck = this.toCheck();
    if (toCheck !== null) return `Check ${toCheck.assetNumber} against its reference before its first reading today.`;
    return `No ${title} is in calibration. Readings wait until one is.`;
  });
  private readonly quantity = computed(() => rangedQuantity(this.cursor.stop().characteristic));
  private readonly rangeKey = computed(() => {
    const { unit, readAs } = this.quantity() ?? {};
    return `${this.chosen()?.id} ${unit} ${readAs}`;
  });

  choose(instrument: Instrument): void {
    const { instruments } = this.settings;
    this.settings.change(instruments, { ...instruments(), [instrument.kind]: instrument.id });
  }

  /** Names the range that readings are taken on, or lets the smallest be taken (null). */
  chooseRange(id: number | null): void {
    const { ranges } = this.settings;
    const others = Object.entries(ranges()).filter(([key]) => key !== this.rangeKey());
    const named = id === null ? [] : [[this.rangeKey(), id] as const];
    this.settings.change(ranges, Object.fromEntries([...others, ...named]));
  }

  /** The range a value was read on, as the server will take it. */
  rangeOf(value: number, entryKind: ReadingEntry['kind']): RangeOutcome {
    const instrument = this.chosen();
    const quantity = rangedQuantity(this.cursor.stop().characteristic, entryKind);
    if (instrument === null || quantity === null) return { state: 'none' };
    try {
      const range = chosenRange(instrument.ranges, this.namedFor(entryKind), value, quantity);
      return range === undefined ? { state: 'none' } : { state: 'chosen', range };
    } catch (thrown) {
      if (thrown instanceof RangeError) return { state: 'refused', message: thrown.message };
      throw thrown;
    }
  }

  /** The range that goes with an entry; a captured file is measured on whichever holds it. */
  namedFor(entryKind: ReadingEntry['kind']): number | null {
    return entryKind === 'waveform' ? null : (this.named()?.id ?? null);
  }

  /** The one remembered, or the only one there is. */
  private inUse(kind: InstrumentKind): Instrument | null {
    const usable = this.sheet.bench().instruments.filter((each) => each.kind === kind && each.usable);
    const remembered = usable.find(({ id }) => id === this.settings.instruments()[kind]);
    return remembered ?? (usable.length === 1 ? (usable[0] ?? null) : null);
  }
}
