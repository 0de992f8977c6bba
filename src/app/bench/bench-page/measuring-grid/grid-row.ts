import { ChangeDetectionStrategy, Component, computed, input, output } from '@angular/core';
import { type ExpectedBands } from '#shared/contract/parts';
import { type UnitVerdict } from '#shared/verdict/sample-verdict';
import { LimitStrip } from '../../../ui/limit-strip/limit-strip';
import { VerdictMark } from '../../../ui/marks/verdict-mark';
import { LOOK_WORDS, lookOf } from '../../../ui/verdict-look';
import { benchCell } from '../../sheet/bench-cell';
import { type BenchColumn, limitsOf } from '../../sheet/bench-column';
import { type UnitRecord } from '../../sheet/unit-record';

/** One unit in the measuring grid. Drawn again only when its record, its verdict or its part of the focus changes. */
@Component({
  selector: 'qr-grid-row',
  imports: [LimitStrip, VerdictMark],
  templateUrl: './grid-row.html',
  styleUrl: './grid-row.scss',
  host: { role: 'row', '[attr.aria-rowindex]': 'record().unit + 1', '[class.current]': 'focusKey() !== null' },
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class GridRow {
  readonly record = input.required<UnitRecord>();
  readonly verdict = input.required<UnitVerdict>();
  readonly columns = input.required<readonly BenchColumn[]>();
  /** Width of the limit strips in px. */
  readonly stripWidth = input(64);
  /** The characteristic in focus, where this unit is the one being measured. */
  readonly focusKey = input<string | null>(null);
  /** The characteristic whose value is typed and not kept yet. */
  readonly typedKey = input<string | null>(null);
  /** Whether the next Enter keeps a nonconforming reading. */
  readonly armed = input(false);
  /** What the part can give, for the marks of what lies outside of it. */
  readonly expected = input<ExpectedBands | null>(null);
  /** Who has just filled a cell of this unit, by characteristic: initials. */
  readonly fresh = input<ReadonlyMap<string, string> | null>(null);
  readonly chosen = output<string>();

  private readonly source = computed(() => ({
    record: this.record(),
    verdict: this.verdict(),
    typedKey: this.typedKey(),
    expected: this.expected(),
  }));
  protected readonly cells = computed(() =>
    this.columns().map((column) => {
      const cell = benchCell(column, this.source());
      const stop = column.stops.find(({ characteristic }) => characteristic.key === this.focusKey());
      return {
        ...cell,
        column,
        focused: stop !== undefined,
        computed: column.stops.every(({ typed }) => !typed),
        fresh: this.freshOf(column),
        ...limitsOf(column),
      };
    }),
  );
  protected readonly look = computed(() => lookOf(this.verdict().verdict));
  protected readonly word = computed(() => {
    const { setAside, ruling } = this.record();
    if (ruling !== null) return `Ruled ${ruling.ruling} by ${ruling.by}: ${ruling.reason}`;
    return setAside === null ? LOOK_WORDS[this.look()] : `Set aside: ${setAside}`;
  });

  private freshOf({ stops }: BenchColumn): string {
    const fresh = this.fresh();
    return stops.map(({ characteristic }) => fresh?.get(characteristic.key) ?? '').find((by) => by !== '') ?? '';
  }

  /** A click lands on the characteristic in focus, or on the first of a shared column. */
  protected choose(column: BenchColumn): void {
    const [first] = column.stops;
    const inside = column.stops.find(({ characteristic }) => characteristic.key === this.focusKey()) ?? first;
    if (inside !== undefined) this.chosen.emit(inside.characteristic.key);
  }
}
