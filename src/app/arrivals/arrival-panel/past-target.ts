import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { Icon } from '../../ui/marks/icon';
import { DurationPipe } from '../../ui/values/duration-pipe';
import { MomentPipe } from '../../ui/values/moment-pipe';

/** Says that a lot has waited too long, or when it is needed. */
@Component({
  selector: 'qr-past-target',
  imports: [DurationPipe, Icon, MomentPipe],
  template: `
    <p [class.late-note]="late()">
      <qr-icon name="clock" [size]="18" />
      <span>
        @if (past() > 0) {
          <b>{{ past() | duration }} past target.</b>&ngsp;
        }
        @if (neededBy(); as moment) {
          @if (missed()) {
            <b>Was needed by {{ moment | moment }}.</b>
          } @else {
            Needed by {{ moment | moment }}.
          }
        }
      </span>
    </p>
  `,
  styles: `
    :host([hidden]) {
      display: none;
    }
    p {
      display: flex;
      gap: 8px;
      font: var(--qr-t-small);
    }
    .late-note {
      padding: 8px 10px;
      border-left: 4px solid var(--qr-nok-fill);
      background: var(--qr-nok-tint);
    }
    .late-note qr-icon {
      color: var(--qr-nok-text);
    }
    b {
      font-weight: 700;
    }
  `,
  host: { '[hidden]': '!late() && !neededBy()' },
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PastTarget {
  /** Hours past the target. */
  readonly past = input.required<number>();
  readonly neededBy = input.required<string | null>();
  readonly now = input.required<Date>();

  protected readonly missed = computed(() => {
    const moment = this.neededBy();
    return moment !== null && Date.parse(moment) < this.now().getTime();
  });
  protected readonly late = computed(() => this.past() > 0 || this.missed());
}
