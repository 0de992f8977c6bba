import { type Clock } from '#server/clock';

/** A clock that stands still until it is told to go on. */
export class TestClock implements Clock {
  private instant: number;

  constructor(start = '2026-03-12T08:00:00.000Z') {
    this.instant = Date.parse(start);
  }

  now(): Date {
    return new Date(this.instant);
  }

  advance(time: { hours?: number; minutes?: number; seconds?: number }): void {
    const { hours = 0, minutes = 0, seconds = 0 } = time;
    this.instant += ((hours * 60 + minutes) * 60 + seconds) * 1000;
  }
}
