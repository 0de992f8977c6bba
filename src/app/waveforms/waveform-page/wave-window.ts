import { computed, signal } from '@angular/core';

/** Part of the whole that is shown, as fractions of it. */
export interface Share {
  readonly from: number;
  readonly to: number;
}

const WHOLE: Share = { from: 0, to: 1 };
/** How much of what is shown a step moves it, and a zoom leaves of it. */
const STEP = 0.25;
const ZOOM = 0.5;
/** So many samples are shown at least. */
const FEWEST = 32;

/** The part of a waveform that is shown, moved by pointer and by keys alike. */
export class WaveWindow {
  private readonly shown = signal<Share>(WHOLE);

  readonly share = this.shown.asReadonly();
  readonly isWhole = computed(() => this.shown().from <= 0 && this.shown().to >= 1);

  /** @param samples how many there are; fewer than a few dozen are never shown */
  constructor(private readonly samples: () => number) {}

  show(share: Share): void {
    const { from, to } = this.shown();
    if (Math.abs(from - share.from) > 1e-9 || Math.abs(to - share.to) > 1e-9) this.shown.set(this.held(share));
  }

  whole(): void {
    this.shown.set(WHOLE);
  }

  /** Shows half as much, or twice as much, around the middle. */
  zoom(direction: 'in' | 'out'): void {
    const { from, to } = this.shown();
    const half = ((to - from) / 2) * (direction === 'in' ? ZOOM : 1 / ZOOM);
    const middle = (from + to) / 2;
    this.shown.set(this.held({ from: middle - half, to: middle + half }));
  }

  move(direction: 'left' | 'right'): void {
    const { from, to } = this.shown();
    const step = (to - from) * STEP * (direction === 'left' ? -1 : 1);
    this.shown.set(this.held({ from: from + step, to: to + step }));
  }

  /** Within the whole, not narrower than can be drawn, and as wide as it was where it meets an end. */
  private held({ from, to }: Share): Share {
    const width = Math.min(1, Math.max(to - from, FEWEST / Math.max(FEWEST, this.samples())));
    const middle = (from + to) / 2;
    const start = Math.min(Math.max(0, middle - width / 2), 1 - width);
    return { from: start, to: start + width };
  }
}
