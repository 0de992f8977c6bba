import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { RouterLink } from '@angular/router';
import { type Assessment } from '#shared/contract/decision';
import { VerdictMark } from '../../ui/marks/verdict-mark';
import { readingDigits } from '../../ui/values/reading-text';
import { displayUnit } from '#shared/quantities/format-quantity';
import { characteristicRow, type CharacteristicRow } from './characteristic-row';
import { ScrollRegion } from '../../ui/scroll-region';

interface Cell {
  readonly text: string;
  readonly failed: boolean;
  /** Key of the characteristic whose uncertainty budget the value has; none where it is judged by eye. */
  readonly budget?: string;
}

/** Every reading that counts: a row for each unit of the sample, a column for each characteristic; a value opens its budget. */
@Component({
  selector: 'qr-reading-table',
  imports: [RouterLink, ScrollRegion, VerdictMark],
  template: `
    <div class="scroll" qrScrollRegion="Table of readings">
      <table class="table">
        <thead>
          <tr>
            <th scope="col">Unit</th>
            @for (column of columns(); track column.key) {
              <th scope="col" class="right">
                {{ column.name }}<br /><span class="caption">{{ column.unit }}</span>
              </th>
            }
          </tr>
        </thead>
        <tbody>
          @for (row of rows(); track row.unit) {
            <tr>
              <td class="num">{{ row.unit }}</td>
              @for (cell of row.cells; track $index) {
                <td class="num right" [class.failed]="cell.failed">
                  @if (cell.failed) {
                    <qr-verdict-mark look="nok" [size]="12" label="nonconforming" />
                  }
                  @if (cell.budget; as key) {
                    <a
                      class="open"
                      [routerLink]="['/lots', assessment().lot.id, 'units', row.unit, 'budgets', key]"
                      [attr.aria-label]="cell.text + ', uncertainty budget'"
                      >{{ cell.text }}</a
                    >
                  } @else {
                    {{ cell.text }}
                  }
                </td>
              }
            </tr>
          }
        </tbody>
      </table>
    </div>
  `,
  styles: `
    .scroll {
      max-height: 480px;
      overflow: auto;
    }
    .table {
      --qr-table-row: 28px;
    }
    th {
      height: 44px;
    }
    .failed {
      background: var(--qr-nok-tint);
      color: var(--qr-nok-text);
      font-weight: 600;
    }
    .failed qr-verdict-mark {
      display: inline-flex;
      vertical-align: -1px;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ReadingTable {
  readonly assessment = input.required<Assessment>();

  private readonly characteristics = computed(() => this.assessment().characteristics.map(characteristicRow));

  protected readonly columns = computed(() =>
    this.characteristics().map(({ key, name, scale }) => ({
      key,
      name,
      unit: scale === null ? '' : displayUnit(scale.unit).label,
    })),
  );
  protected readonly rows = computed(() => {
    const columns = this.characteristics().map((row) => ({
      row,
      byUnit: new Map(row.readings.map((one) => [one.unit, one])),
    }));
    return this.assessment().units.map(({ unit }) => ({
      unit,
      cells: columns.map(({ row, byUnit }) => cellOf(row, byUnit.get(unit))),
    }));
  });
}

function cellOf(
  { key, scale, failedUnits }: CharacteristicRow,
  reading: CharacteristicRow['readings'][number] | undefined,
): Cell {
  if (reading === undefined || (reading.value === null && reading.pass === null)) return { text: '', failed: false };
  const failed = failedUnits.includes(reading.unit);
  if (scale === null || reading.value === null) return { text: failed ? 'Fail' : 'Pass', failed };
  return { text: readingDigits(reading.value, scale.unit, scale.decimals), failed, budget: key };
}
