import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { type YieldRow } from '#shared/contract/yields';
import { formatNumber } from '#shared/quantities/format-number';
import { elementWidth } from '../../ui/element-width';
import { shareText } from '../share-text';
import { CHART, labelStep, monthPlaces } from './month-scale';

const MARGIN = 68;

/** Shares of a scale in steps that people read easily: from the highest of these below all points, up to 100 %. */
const FLOORS = [0.99, 0.98, 0.95, 0.9, 0.8, 0.5, 0];

/** The share of conforming units in the samples of each month, as a line; months without units leave a gap. */
@Component({
  selector: 'qr-units-by-month',
  template: `
    <svg [attr.width]="width()" [attr.height]="height" role="img" [attr.aria-label]="sentence()">
      @for (line of grid(); track line.y) {
        <path class="grid" [attr.d]="line.d" />
        <text class="scale" x="60" [attr.y]="line.y + 4">{{ line.label }}</text>
      }
      <path class="line" [attr.d]="path()" />
      @for (point of points(); track point.key) {
        @if (point.y !== null) {
          <circle [attr.cx]="point.x" [attr.cy]="point.y" r="3" />
          @if (point.labelled) {
            <text class="count" [attr.x]="point.x" [attr.y]="point.y - 8">{{ point.label }}</text>
          }
        }
        @if (point.labelled) {
          <text [attr.x]="point.x" [attr.y]="base + 16">{{ point.key }}</text>
        }
      }
    </svg>
  `,
  styleUrl: './chart.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class UnitsByMonth {
  readonly months = input.required<readonly YieldRow[]>();

  protected readonly width = elementWidth(600);
  protected readonly base = CHART.above + CHART.height;
  protected readonly height = this.base + CHART.below;

  private readonly floor = computed(() => {
    const shares = this.months().flatMap(({ unitsConforming, unitsInspected }) =>
      unitsInspected === 0 ? [] : [unitsConforming / unitsInspected],
    );
    const least = Math.min(1, ...shares);
    return FLOORS.find((floor) => floor < least) ?? 0;
  });

  protected readonly grid = computed(() =>
    [0, 0.5, 1].map((part) => {
      const share = this.floor() + (1 - this.floor()) * part;
      const y = this.yOf(share);
      return { y, d: `M${MARGIN} ${y}H${this.width() - 16}`, label: shareText(share * 1000, 1000) };
    }),
  );

  protected readonly points = computed(() => {
    const months = this.months();
    const { pitch, at } = monthPlaces(months.length, this.width() - MARGIN - 16);
    const step = labelStep(pitch, 110);
    return months.map(({ key, unitsConforming, unitsInspected }, index) => ({
      key,
      x: MARGIN + at(index),
      y: unitsInspected === 0 ? null : this.yOf(unitsConforming / unitsInspected),
      label: `${formatNumber(unitsConforming, 0)} of ${formatNumber(unitsInspected, 0)}`,
      labelled: (months.length - 1 - index) % step === 0,
    }));
  });

  protected readonly path = computed(() =>
    this.points()
      .map(({ x, y }, index, points) => {
        if (y === null) return '';
        return `${(points[index - 1]?.y ?? null) === null ? 'M' : 'L'}${x.toFixed(1)} ${y.toFixed(1)}`;
      })
      .join(''),
  );

  protected readonly sentence = computed(() =>
    this.points()
      .map((point) => `${point.key}: ${point.y === null ? 'no units' : `${point.label} units conforming`}`)
      .join('; '),
  );

  private yOf(share: number): number {
    return CHART.above + (1 - (share - this.floor()) / (1 - this.floor())) * CHART.height;
  }
}
