import { computed, inject, Injectable, signal, untracked } from '@angular/core';
import { GridWalk, type GridMove, type GridPlace } from '#shared/bench/grid-walk';
import { BenchSettings } from '../bench-settings';
import { benchColumns, type BenchStop } from './bench-column';
import { BenchSheet } from './bench-sheet';

/** Where the bench stands: the unit and the characteristic that are being measured. */
@Injectable()
export class BenchCursor {
  private readonly sheet = inject(BenchSheet);
  private readonly settings = inject(BenchSettings);
  private readonly chosen = signal<{ unit: number; key: string } | null>(null);

  /** Whether the attributes share one column. */
  readonly merged = signal(false);
  readonly columns = computed(() => benchColumns(this.sheet.characteristics(), this.sheet.rules(), this.merged()));
  readonly stops = computed(() => this.columns().flatMap(({ stops }) => stops));
  private readonly walk = computed(() => new GridWalk(this.sheet.records().length, this.stops()));

  readonly at = computed(() => this.chosen() ?? this.named({ unit: 1, column: 0 }), {
    equal: (one, other) => one.unit === other.unit && one.key === other.key,
  });
  private readonly column = computed(() => {
    const { key } = this.at();
    const found = this.stops().findIndex(({ characteristic }) => characteristic.key === key);
    return Math.max(found, 0);
  });
  readonly stop = computed(() => this.stopAt(this.column()));
  readonly record = computed(() => this.sheet.recordOf(this.at().unit));

  /** Stands at the first open place of a lot that was just opened. */
  start(): void {
    if (this.chosen() === null) this.goToMissing();
  }

  move(move: GridMove): void {
    this.goTo(this.walk().move(this.place(), move));
  }

  /** Goes to the next or previous characteristic; false at the end of the grid. */
  step(step: 'next' | 'previous'): boolean {
    const place = step === 'next' ? this.walk().next(this.place()) : this.walk().previous(this.place());
    if (place === null) return false;
    this.goTo(place);
    return true;
  }

  /** Goes on once a reading is kept; Tab goes along the row whatever the setting. */
  goOn(order = this.settings.order()): void {
    this.goTo(this.walk().afterKeeping(this.place(), order, (place) => this.isOpen(place)));
  }

  /** Goes to the first reading that is missing; false where none is. */
  goToMissing(): boolean {
    const place = this.firstOpen();
    if (place === null) return false;
    this.goTo(place);
    return true;
  }

  choose(unit: number, key: string): void {
    this.chosen.set({ unit, key });
  }

  private place(): GridPlace {
    return { unit: this.at().unit, column: this.column() };
  }

  private goTo(place: GridPlace): void {
    this.chosen.set(this.named(place));
  }

  private named({ unit, column }: GridPlace): { unit: number; key: string } {
    return { unit, key: this.stopAt(column).characteristic.key };
  }

  private firstOpen(): GridPlace | null {
    return this.walk().firstOpen(untracked(this.settings.order), (place) => this.isOpen(place));
  }

  private isOpen({ unit, column }: GridPlace): boolean {
    const record = this.sheet.records()[unit - 1];
    return (
      record !== undefined && this.sheet.verdictOf(record).missing.includes(this.stopAt(column).characteristic.key)
    );
  }

  private stopAt(column: number): BenchStop {
    const stop = this.stops()[column];
    if (stop === undefined) throw new RangeError(`column ${column} is not in the grid.`);
    return stop;
  }
}
