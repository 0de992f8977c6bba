import { LiveAnnouncer } from '@angular/cdk/a11y';
import { computed, effect, inject, Injectable, signal } from '@angular/core';
import { momentText } from '../../ui/values/moment-pipe';
import { BenchSheet } from '../sheet/bench-sheet';

const MINUTE = 60_000;

/** The warm-up that the plan asks for before units are measured: started by anybody at the lot, seen by all. */
@Injectable()
export class WarmUp {
  private readonly sheet = inject(BenchSheet);
  private readonly announcer = inject(LiveAnnouncer);
  private readonly now = signal(Date.now());

  /** Minutes the plan asks for; null where it asks for none. */
  readonly minutes = computed(() => (this.sheet.opened() ? this.sheet.bench().warmUpMinutes : null));
  /** When it ends, in ms; null while it is not started or not asked for. */
  readonly endsAt = computed(() => {
    const [minutes, conditions] = [this.minutes(), this.sheet.opened() ? this.sheet.bench().conditions : null];
    const startedAt = conditions?.warmUpStartedAt ?? null;
    return minutes === null || startedAt === null ? null : Date.parse(startedAt) + minutes * MINUTE;
  });
  readonly state = computed(() => {
    const endsAt = this.endsAt();
    if (this.minutes() === null) return 'not-asked';
    if (endsAt === null) return 'not-started';
    return endsAt > this.now() ? 'running' : 'done';
  });
  /** The time left as 9:05; empty while it does not run. */
  readonly left = computed(() => {
    const seconds = Math.ceil(((this.endsAt() ?? 0) - this.now()) / 1000);
    if (this.state() !== 'running') return '';
    return `${Math.floor(seconds / 60)}:${String(seconds % 60).padStart(2, '0')}`;
  });
  /** What to know before a reading is taken now; empty once units are warm. */
  readonly caution = computed(() => {
    if (this.state() === 'not-started')
      return `The plan asks for ${minutesText(this.minutes())} of warm-up; it is not started.`;
    if (this.state() !== 'running') return '';
    return `The warm-up lasts until ${momentText(new Date(this.endsAt() ?? 0), 'auto', new Date())}.`;
  });

  constructor() {
    effect((onCleanup) => {
      if (this.state() !== 'running') return;
      this.now.set(Date.now());
      const timer = setInterval(() => this.tick(), 1000);
      onCleanup(() => clearInterval(timer));
    });
  }

  /** What is to be said of a reading taken at a moment; empty where it was taken on a warm unit. */
  wordsAt(takenAt: string): string {
    if (this.minutes() === null) return '';
    const endsAt = this.endsAt();
    return endsAt !== null && Date.parse(takenAt) >= endsAt ? '' : 'before the end of the warm-up';
  }

  private tick(): void {
    this.now.set(Date.now());
    if (this.state() === 'done') void this.announcer.announce('The warm-up is over.', 'polite');
  }
}

function minutesText(minutes: number | null): string {
  return minutes === 1 ? '1 minute' : `${minutes} minutes`;
}
