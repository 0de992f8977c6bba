import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { type VerdictLook } from '../verdict-look';
import { VerdictMark } from './verdict-mark';

const DAY = 86_400_000;
const WARNED_BEFORE = 30;

/**
 * Whether an instrument's calibration holds: ring while it does, diamond within 30 days of the due date (common practice,
 * no source), square once it is past and the instrument cannot be chosen.
 */
@Component({
  selector: 'qr-instrument-due',
  imports: [VerdictMark],
  template: `<qr-verdict-mark [look]="look()" [size]="14" /><span>{{ words() }}</span>`,
  styles: `
    :host {
      display: inline-flex;
      align-items: center;
      gap: 6px;
      vertical-align: middle;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class InstrumentDue {
  /** The due date, yyyy-mm-dd; null when the instrument needs no calibration. */
  readonly due = input.required<string | null>();
  readonly today = input(new Date());

  private readonly days = computed(() => {
    const due = this.due();
    if (due === null) return null;
    const day = this.today();
    const midnight = Date.UTC(day.getFullYear(), day.getMonth(), day.getDate());
    return Math.round((Date.parse(`${due.slice(0, 10)}T00:00:00Z`) - midnight) / DAY);
  });

  protected readonly look = computed<VerdictLook>(() => {
    const days = this.days();
    if (days === null) return 'open';
    if (days < 0) return 'nok';
    return days <= WARNED_BEFORE ? 'hold' : 'ok';
  });

  protected readonly words = computed(() => {
    const days = this.days();
    if (days === null) return 'not calibrated';
    if (days < 0) return `expired ${this.due()}`;
    if (days > WARNED_BEFORE) return `due ${this.due()}`;
    if (days === 0) return 'due today';
    return days === 1 ? 'due tomorrow' : `due in ${days} days`;
  });
}
