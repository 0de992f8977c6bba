import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { type ExpectedBand } from '#shared/measurement/plausibility';
import { elementWidth } from '../element-width';

/** The ruler runs from 10 mV to 100 V. */
const FIRST = -2;
const LAST = 2;
const DECADES = [
  { decade: -2, text: '10 mV' },
  { decade: -1, text: '100 mV' },
  { decade: 0, text: '1 V' },
  { decade: 1, text: '10 V' },
  { decade: 2, text: '100 V' },
];
const GHOSTS = [
  { factor: 0.1, text: '÷ 10' },
  { factor: 10, text: '× 10' },
];

/**
 * A reading on a logarithmic ruler, where a slip by ten is exactly one decade: ghosts at a tenth and ten times the reading
 * fall on the expected band when it was one. Volts.
 */
@Component({
  selector: 'qr-scope-ruler',
  templateUrl: './scope-ruler.html',
  styleUrl: './scope-ruler.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ScopeRuler {
  readonly volts = input.required<number | null>();
  readonly expected = input<ExpectedBand | null>(null);

  protected readonly width = elementWidth(352);

  protected readonly marks = computed(() =>
    DECADES.map(({ decade, text }) => ({
      x: this.at(10 ** decade),
      text,
      anchor: decade === FIRST ? 'start' : decade === LAST ? 'end' : 'middle',
    })),
  );

  protected readonly minors = computed(() =>
    DECADES.slice(0, -1)
      .flatMap(({ decade }) => [2, 3, 4, 5, 6, 7, 8, 9].map((digit) => this.at(digit * 10 ** decade)))
      .map((x) => `M${x.toFixed(1)} 28.5v5`)
      .join(''),
  );

  protected readonly box = computed(() => {
    const expected = this.expected();
    if (expected === null) return null;
    const x = this.at(expected.low);
    // A band narrower than a pixel or two is still a place on the ruler.
    return { x, width: Math.max(this.at(expected.high) - x, 2) };
  });

  protected readonly tick = computed(() => {
    const volts = this.volts();
    return volts === null || volts <= 0 ? null : { x: this.at(volts), slip: !this.inBand(volts) };
  });

  protected readonly ghosts = computed(() => {
    const volts = this.volts();
    if (volts === null || volts <= 0) return [];
    return GHOSTS.map(({ factor, text }) => ({ volts: volts * factor, text }))
      .filter((ghost) => ghost.volts >= 10 ** FIRST && ghost.volts <= 10 ** LAST)
      .map((ghost) => ({
        x: this.at(ghost.volts),
        text: ghost.text,
        hit: this.expected() !== null && this.inBand(ghost.volts),
      }));
  });

  private inBand(volts: number): boolean {
    const expected = this.expected();
    return expected === null || (volts >= expected.low && volts <= expected.high);
  }

  private at(volts: number): number {
    const share = (Math.log10(volts) - FIRST) / (LAST - FIRST);
    return Math.min(Math.max(share, 0), 1) * this.width();
  }
}
