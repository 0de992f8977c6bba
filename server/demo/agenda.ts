import { type DemoClock } from './demo-clock';

type Act = () => void | Promise<void>;

interface Appointment {
  at: Date;
  act: Act;
}

/** What happens when: acts of many lots are played in the order of their moments, and may add later ones. */
export class Agenda {
  private appointments: Appointment[] = [];

  constructor(private readonly clock: DemoClock) {}

  add(at: Date, act: Act): void {
    const after = this.appointments.findIndex((other) => other.at.getTime() > at.getTime());
    this.appointments.splice(after < 0 ? this.appointments.length : after, 0, { at, act });
  }

  /** The moment of the next act, while something is left to do. */
  next(): Date | undefined {
    return this.appointments[0]?.at;
  }

  /** Plays everything that is due until `until`; what comes later does not happen. */
  async play(until: Date): Promise<void> {
    for (;;) {
      const first = this.appointments.shift();
      if (!first || first.at.getTime() > until.getTime()) return;
      this.clock.set(first.at);
      await first.act();
    }
  }
}
