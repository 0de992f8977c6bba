import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { type Instrument } from '#shared/contract/instruments';
import { InstrumentDue } from '../ui/marks/instrument-due';
import { VerdictMark } from '../ui/marks/verdict-mark';
import { type VerdictLook } from '../ui/verdict-look';

type Standing = Pick<Instrument, 'status' | 'daysLeft' | 'dailyCheck'>;

/** What keeps an instrument from a reading besides its calibration date; null where nothing does. */
export function obstacleOf({ status, daysLeft, dailyCheck }: Standing): { look: VerdictLook; words: string } | null {
  if (status === 'withdrawn') return { look: 'nok', words: 'withdrawn' };
  if (daysLeft < 0) return null;
  if (dailyCheck === 'failed') return { look: 'nok', words: 'failed today’s check' };
  return dailyCheck === 'due' ? { look: 'hold', words: 'to be checked today' } : null;
}

/** Where an instrument stands: withdrawn, waiting for the check of the day, or how its calibration date lies. */
@Component({
  selector: 'qr-instrument-state',
  imports: [InstrumentDue, VerdictMark],
  template: `
    @if (obstacle(); as found) {
      <span class="obstacle"><qr-verdict-mark [look]="found.look" [size]="14" />{{ found.words }}</span>
    } @else {
      <qr-instrument-due [due]="of().calibrationDue" />
    }
  `,
  styles: `
    .obstacle {
      display: inline-flex;
      gap: 6px;
      align-items: center;
      vertical-align: middle;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class InstrumentState {
  readonly of = input.required<Standing & Pick<Instrument, 'calibrationDue'>>();

  protected readonly obstacle = computed(() => obstacleOf(this.of()));
}
