import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';

/** The scale of a waiting bar, in hours. */
const FULL = 12;

/** How long something has waited, on a scale of 0 to 12 h, with the target as a tick; the time itself stands beside it. */
@Component({
  selector: 'qr-waiting-bar',
  template: `
    <svg
      [attr.width]="width()"
      height="14"
      [attr.viewBox]="'0 0 ' + width() + ' 14'"
      aria-hidden="true"
      preserveAspectRatio="none"
    >
      <path class="axis" [attr.d]="'M0 7H' + width()" />
      <path class="waited" [class.late]="late()" [attr.d]="'M0 7H' + at(hours())" />
      <path class="target" [attr.d]="'M' + at(target()) + ' 1v12'" />
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
    .waited {
      stroke: var(--qr-primary);
      stroke-width: 4;
    }
    .waited.late {
      stroke: var(--qr-nok-fill);
    }
    .target {
      stroke: var(--qr-ink-2);
      stroke-width: 1.5;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class WaitingBar {
  readonly hours = input.required<number>();
  /** Hours after which the wait is too long. */
  readonly target = input.required<number>();
  /** Width in px. */
  readonly width = input(112);

  protected readonly late = computed(() => this.hours() > this.target());

  protected at(hours: number): number {
    return (Math.min(Math.max(hours, 0), FULL) / FULL) * this.width();
  }
}
