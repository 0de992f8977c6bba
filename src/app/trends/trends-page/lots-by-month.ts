import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { type YieldRow } from '#shared/contract/yields';
import { elementWidth } from '../../ui/element-width';
import { CHART, labelStep, monthPlaces } from './month-scale';

const MARGIN = 16;
const WIDEST = 44;

/** A bar for each month: all lots decided, the accepted ones dark, with both counts above. The table has the same numbers. */
@Component({
  selector: 'qr-lots-by-month',
  template: `
    <svg [attr.width]="width()" [attr.height]="height" role="img" [attr.aria-label]="sentence()">
      <path class="base" [attr.d]="axis()" />
      @for (bar of bars(); track bar.key) {
        <rect
          class="decided"
          [attr.x]="bar.x"
          [attr.y]="base - bar.all"
          [attr.width]="bar.width"
          [attr.height]="bar.all"
        />
        <rect
          class="accepted"
          [attr.x]="bar.x"
          [attr.y]="base - bar.accepted"
          [attr.width]="bar.width"
          [attr.height]="bar.accepted"
        />
        @if (bar.labelled) {
          <text class="count" [attr.x]="bar.centre" [attr.y]="base - bar.all - 6">{{ bar.label }}</text>
          <text [attr.x]="bar.centre" [attr.y]="base + 16">{{ bar.key }}</text>
        }
      }
    </svg>
  `,
  styleUrl: './chart.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class LotsByMonth {
  readonly months = input.required<readonly YieldRow[]>();

  protected readonly width = elementWidth(600);
  protected readonly base = CHART.above + CHART.height;
  protected readonly height = this.base + CHART.below;

  protected readonly axis = computed(() => `M${MARGIN} ${this.base}H${this.width() - MARGIN}`);

  protected readonly bars = computed(() => {
    const months = this.months();
    const { pitch, at } = monthPlaces(months.length, this.width() - 2 * MARGIN);
    const most = Math.max(1, ...months.map((month) => month.lotsDecided));
    const width = Math.min(pitch * 0.6, WIDEST);
    const step = labelStep(pitch, 62);
    return months.map((month, index) => ({
      key: month.key,
      width,
      centre: MARGIN + at(index),
      x: MARGIN + at(index) - width / 2,
      all: (month.lotsDecided / most) * CHART.height,
      accepted: (month.lotsAccepted / most) * CHART.height,
      label: `${month.lotsAccepted} of ${month.lotsDecided}`,
      labelled: (months.length - 1 - index) % step === 0,
    }));
  });
  protected readonly sentence = computed(() =>
    this.months()
      .map((month) => `${month.key}: ${month.lotsAccepted} of ${month.lotsDecided} lots accepted`)
      .join('; '),
  );
}
