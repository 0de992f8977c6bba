import { computed, inject, Injectable } from '@angular/core';
import { INSTRUMENT_KIND_TITLES, type Instrument, type InstrumentKind } from '#shared/contract/instruments';
import { BenchSettings } from '../bench-settings';
import { BenchCursor } from './bench-cursor';
import { BenchSheet } from './bench-sheet';

/** The instrument that takes the readings of the characteristic in focus; remembered per kind. */
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
  /** Instruments of that kind, those that may not be used too; withdrawn ones are not offered. */
  readonly offered = computed(() =>
    this.sheet.bench().instruments.filter(({ kind, status }) => kind === this.kind() && status === 'in-service'),
  );
  readonly chosen = computed(() => {
    const kind = this.kind();
    return kind === null ? null : this.inUse(kind);
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
    return this.offered().some(({ usable }) => usable)
      ? `Choose the ${title} that takes this reading.`
      : `No ${title} is in calibration. Readings wait until one is.`;
  });

  choose(instrument: Instrument): void {
    const { instruments } = this.settings;
    this.settings.change(instruments, { ...instruments(), [instrument.kind]: instrument.id });
  }

  /** The one remembered, or the only one there is. */
  private inUse(kind: InstrumentKind): Instrument | null {
    const usable = this.sheet.bench().instruments.filter((each) => each.kind === kind && each.usable);
    const remembered = usable.find(({ id }) => id === this.settings.instruments()[kind]);
    return remembered ?? (usable.length === 1 ? (usable[0] ?? null) : null);
  }
}
