import { type Clock } from '#server/clock';

/** The clock of the demo's quarter; it stands where it was set and never goes back. */
export class DemoClock implements Clock {
  private instant = 0;

  now(): Date {
    return new Date(this.instant);
  }

  set(moment: Date): void {
    this.instant = Math.max(this.instant, moment.getTime());
  }

  advance(seconds: number): void {
    this.instant += seconds * 1000;
  }
}
