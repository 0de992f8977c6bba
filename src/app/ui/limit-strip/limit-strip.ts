import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { elementWidth } from '../element-width';
import { readingDigits, readingText } from '../values/reading-text';
import { type VerdictLook } from '../verdict-look';
import { stripGeometry } from './strip-geometry';
import { stripScale } from './strip-scale';
import { stripSentence } from './strip-sentence';

let strips = 0;

/**
 * A reading between its limits. All quantities are in SI base units; `unit` is the characteristic's own. The scale is
 * fixed per characteristic (give `scaleMin` and `scaleMax` where the plan sets them), so that a column of strips reads as
 * a dot plot. `cell` is `width` x 12 px, `panel` takes the width of its place and is 56 px high.
 */
@Component({
  selector: 'qr-limit-strip',
  templateUrl: './limit-strip.html',
  styleUrl: './limit-strip.scss',
  host: { '[class]': 'size()', role: 'img', '[attr.aria-label]': 'sentence()' },
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class LimitStrip {
  readonly size = input<'cell' | 'panel'>('cell');
  readonly value = input.required<number | null>();
  readonly lower = input.required<number | null>();
  readonly upper = input.required<number | null>();
  readonly verdict = input<VerdictLook>('open');
  readonly unit = input('');
  readonly decimals = input(2);
  /** Expanded uncertainty: the whisker's half-length. */
  readonly uncertainty = input(0);
  /** Width of the guard bands; the uncertainty unless given, none under simple acceptance. */
  readonly guard = input<number>();
  readonly scaleMin = input<number>();
  readonly scaleMax = input<number>();
  /** Lowest and highest value the part's rectifier can give; shown in a panel. */
  readonly expected = input<readonly [number, number] | null>(null);
  /** Width of a cell strip in px, 64 to 120. */
  readonly width = input(64);

  private readonly measured = elementWidth(480);

  protected readonly hatch = `qr-hatch-${++strips}`;
  protected readonly full = computed(() => (this.size() === 'cell' ? this.width() : Math.max(this.measured(), 200)));
  private readonly limits = computed(() => ({ lower: this.lower(), upper: this.upper() }));
  private readonly guardWidth = computed(() => this.guard() ?? this.uncertainty());
  private readonly scale = computed(() => stripScale(this.limits(), { min: this.scaleMin(), max: this.scaleMax() }));

  protected readonly drawn = computed(() =>
    stripGeometry({
      limits: this.limits(),
      scale: this.scale(),
      value: this.value(),
      uncertainty: this.uncertainty(),
      guard: this.guardWidth(),
      width: this.full(),
      margin: this.size() === 'cell' ? 3 : 9,
      leastGuard: this.size() === 'cell' && this.guardWidth() > 0 ? 1.6 : 0,
    }),
  );

  protected readonly sentence = computed(() =>
    stripSentence({
      value: this.value(),
      limits: this.limits(),
      unit: this.unit(),
      decimals: this.decimals(),
      verdict: this.verdict(),
    }),
  );

  protected readonly readingLabel = computed(() => {
    const value = this.value();
    return value === null ? '' : readingDigits(value, this.unit(), this.decimals());
  });

  protected readonly limitLabels = computed(() => {
    const named = [
      { word: 'min', limit: this.lower() },
      { word: 'max', limit: this.upper() },
    ];
    return named.flatMap(({ word, limit }) =>
      limit === null
        ? []
        : [{ x: this.at(limit), text: `${word} ${readingText(limit, this.unit(), this.decimals())}` }],
    );
  });

  protected readonly bracket = computed(() => {
    const expected = this.expected();
    if (expected === null) return '';
    const [from, to] = expected.map((end) => Math.min(Math.max(this.at(end), 1), this.full() - 1));
    return `M${from} 35v3H${to}v-3`;
  });

  /** Which way a label grows so that it stays on the strip. */
  protected anchor(x: number): 'start' | 'middle' | 'end' {
    if (x <= 48) return 'start';
    return x < this.full() - 48 ? 'middle' : 'end';
  }

  private at(quantity: number): number {
    const { min, max } = this.scale();
    return ((quantity - min) / (max - min)) * this.full();
  }
}
