import { ChangeDetectionStrategy, Component, computed, inject, input } from '@angular/core';
import { summary } from '#shared/statistics/summary';
import { readingDigits } from '../../../ui/values/reading-text';
import { type BenchColumn } from '../../sheet/bench-column';
import { BenchSheet } from '../../sheet/bench-sheet';

/** The summary under the measuring grid: mean and standard deviation of each characteristic, over what is kept. */
@Component({
  selector: 'qr-grid-foot',
  template: `
    <span role="rowheader" class="unit" aria-colindex="1"
      ><span class="mean" aria-hidden="true">x</span><span class="unseen">Mean</span></span
    >
    @for (column of shown(); track column.key) {
      <span role="gridcell" class="column" [class.words]="column.count" [attr.aria-colindex]="$index + 2">
        @if (column.count) {
          <span>{{ column.count }}</span>
        } @else {
          <span class="number">{{ column.mean }}</span>
          @if (column.spread) {
            <span class="spread">s {{ column.spread }}</span>
          }
        }
      </span>
    }
    <span role="gridcell" class="end" [attr.aria-colindex]="columns().length + 2"></span>
  `,
  styleUrl: './grid-foot.scss',
  host: { role: 'row', '[attr.aria-rowindex]': 'sheet.records().length + 2' },
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class GridFoot {
  protected readonly sheet = inject(BenchSheet);

  readonly columns = input.required<readonly BenchColumn[]>();

  protected readonly shown = computed(() => {
    const first = this.columns().findIndex(({ shape }) => shape === 'attribute' || shape === 'attributes');
    return this.columns().map((column, index) => ({
      key: column.key,
      count: index === first ? `${this.sheet.judgedUnits()} of ${this.sheet.records().length}` : '',
      ...this.summed(column),
    }));
  });

  private summed({ stops: [stop] }: BenchColumn): { mean: string; spread: string } {
    const characteristic = stop?.characteristic;
    if (characteristic === undefined || characteristic.kind === 'attribute') return { mean: '', spread: '' };
    const { key, unit, decimals } = characteristic;
    const values = this.sheet
      .verdicts()
      .map((verdict) => verdict.characteristics.get(key)?.value)
      .filter((value) => typeof value === 'number');
    if (values.length === 0) return { mean: '', spread: '' };
    const { mean, s } = summary(values);
    return {
      mean: readingDigits(mean, unit, decimals),
      spread: s === null ? '' : readingDigits(s, unit, decimals + 1),
    };
  }
}
