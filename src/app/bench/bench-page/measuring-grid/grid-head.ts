import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { formatLimits } from '#shared/quantities/format-quantity';
import { ClassGlyph } from '../../../ui/marks/class-glyph';
import { type BenchColumn } from '../../sheet/bench-column';

/** The head of the measuring grid: each characteristic with its limits and its class. */
@Component({
  selector: 'qr-grid-head',
  imports: [ClassGlyph],
  template: `
    <span role="columnheader" class="unit" aria-colindex="1">Unit</span>
    @for (column of shown(); track column.key) {
      <div
        role="columnheader"
        class="column"
        [class.current]="column.current"
        [attr.aria-colindex]="$index + 2"
        [title]="column.title"
      >
        <span class="title">{{ column.title }}</span>
        <small [class.words]="column.words" [title]="column.note">{{ column.note }}</small>
        @if (!column.merged) {
          <qr-class-glyph [of]="column.class" />
        }
      </div>
    }
    <span role="columnheader" class="verdict" [attr.aria-colindex]="columns().length + 2">Unit</span>
  `,
  styleUrl: './grid-head.scss',
  host: { role: 'row', 'aria-rowindex': '1' },
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class GridHead {
  readonly columns = input.required<readonly BenchColumn[]>();
  readonly focusKey = input.required<string>();

  protected readonly shown = computed(() =>
    this.columns().map((column) => ({
      ...column,
      note: noteOf(column),
      words: column.shape === 'attribute' || column.shape === 'attributes',
      merged: column.shape === 'attributes',
      current: column.stops.some(({ characteristic }) => characteristic.key === this.focusKey()),
    })),
  );
}

/** What stands under a title: what is asked of an attribute, else the limits with the signs used in grid heads only. */
function noteOf({ shape, stops }: BenchColumn): string {
  const characteristic = stops[0]?.characteristic;
  if (shape === 'attributes' || characteristic === undefined) return `${stops.length} checks`;
  if (characteristic.kind === 'attribute') return characteristic.requirement;
  const { lowerLimit, upperLimit, unit, decimals } = characteristic;
  return formatLimits(lowerLimit, upperLimit, unit, decimals).replace('max', '≤').replace('min', '≥');
}
