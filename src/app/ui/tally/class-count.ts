import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { type NonconformityClass } from '#shared/sampling/scheme';
import { ClassGlyph } from '../marks/class-glyph';
import { VerdictMark } from '../marks/verdict-mark';

/** More rejection slots than this are drawn as a bar. */
const MOST_PIPS = 12;
const PIP = 13;

/** What one class still allows: how many more nonconforming units reject the lot, and the slots up to that. */
@Component({
  selector: 'qr-class-count',
  imports: [ClassGlyph, VerdictMark],
  templateUrl: './class-count.html',
  styleUrl: './class-count.scss',
  host: { '[class.hit]': 'left() === 0' },
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ClassCount {
  readonly of = input.required<NonconformityClass>();
  readonly found = input.required<number>();
  readonly acceptance = input.required<number>();
  readonly rejection = input.required<number>();
  /** Units that are set aside or conditional; never counted as found. */
  readonly undecided = input(0);
  /** What tells two groups of one class apart, such as the level. */
  readonly note = input('');

  protected readonly left = computed(() => Math.max(this.rejection() - this.found(), 0));
  protected readonly asPips = computed(() => this.rejection() <= MOST_PIPS);

  protected readonly pips = computed(() =>
    Array.from({ length: this.rejection() - 1 }, (_, index) => ({ x: index * PIP, full: index < this.found() })),
  );

  /** The bar that stands for many slots, and the stop at its end. */
  protected readonly bar = computed(() => {
    const length = MOST_PIPS * PIP;
    return { length, full: Math.min(this.found() / this.rejection(), 1) * length };
  });

  protected readonly stop = computed(() => (this.asPips() ? this.pips().length * PIP : this.bar().length + 2));
}
