import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { stripGeometry } from './strip-geometry';
import { stripScale } from './strip-scale';

/** One reading of the rug. */
export interface RugReading {
  readonly value: number;
  readonly nonconforming: boolean;
}

const WIDTH = 246;

/** All readings of a sample as ticks between the limits; nonconforming ones are squares. SI base units. */
@Component({
  selector: 'qr-limit-rug',
  template: `
    <svg width="246" height="30" viewBox="0 0 246 30" aria-hidden="true">
      <path class="axis" d="M0 15H246" />
      <rect class="band" [attr.x]="drawn().band.x" y="8" [attr.width]="drawn().band.width" height="14" />
      @for (limit of drawn().limits; track $index) {
        <rect class="limit" [attr.x]="limit - 0.75" y="5" width="1.5" height="20" />
      }
      <path class="ticks" [attr.d]="ticks()" />
      @for (x of squares(); track $index) {
        <rect class="square" [attr.x]="x - 4.5" y="10.5" width="9" height="9" rx="1" />
      }
    </svg>
  `,
  styles: `
    :host {
      display: inline-block;
      vertical-align: middle;
    }
    .axis {
      stroke: var(--qr-line);
    }
    .band {
      fill: var(--qr-band);
    }
    .limit {
      fill: var(--qr-limit);
    }
    .ticks {
      stroke: var(--qr-ink);
      stroke-opacity: 0.75;
    }
    .square {
      fill: var(--qr-nok-fill);
    }
  `,
  host: { role: 'img', '[attr.aria-label]': 'label()' },
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class LimitRug {
  readonly readings = input.required<readonly RugReading[]>();
  readonly lower = input.required<number | null>();
  readonly upper = input.required<number | null>();
  readonly scaleMin = input<number>();
  readonly scaleMax = input<number>();

  private readonly limits = computed(() => ({ lower: this.lower(), upper: this.upper() }));
  private readonly scale = computed(() => stripScale(this.limits(), { min: this.scaleMin(), max: this.scaleMax() }));

  protected readonly drawn = computed(() =>
    stripGeometry({
      limits: this.limits(),
      scale: this.scale(),
      value: null,
      uncertainty: 0,
      guard: 0,
      width: WIDTH,
      margin: 0,
      leastGuard: 0,
    }),
  );
  protected readonly ticks = computed(() =>
    this.places(false)
      .map((x) => `M${x.toFixed(1)} 8v14`)
      .join(''),
  );
  protected readonly squares = computed(() => this.places(true));
  protected readonly label = computed(() => {
    const outside = this.squares().length;
    return `${this.readings().length} readings, ${outside === 0 ? 'all within the limits' : `${outside} outside`}`;
  });

  private places(nonconforming: boolean): number[] {
    const { min, max } = this.scale();
    return this.readings()
      .filter((reading) => reading.nonconforming === nonconforming)
      .map(({ value }) => Math.min(Math.max(((value - min) / (max - min)) * WIDTH, 5), WIDTH - 5));
  }
}
