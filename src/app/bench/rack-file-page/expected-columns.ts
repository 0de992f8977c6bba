import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { type Characteristic } from '#shared/contract/plans';
import { holdsWords, typedOf } from './column-meaning';

/** Which columns the file has to have: the unit, and the keys of the plan's characteristics. */
@Component({
  selector: 'qr-expected-columns',
  template: `
    <h3>Columns</h3>
    <div class="scroll-x">
      <table class="mini">
        <thead>
          <tr>
            <th scope="col">Head</th>
            <th scope="col">Holds</th>
          </tr>
        </thead>
        <tbody>
          @for (column of columns(); track column.key) {
            <tr>
              <td class="mono">{{ column.key }}</td>
              <td>{{ column.holds }}</td>
            </tr>
          }
        </tbody>
      </table>
    </div>
    <p class="caption">
      Comma, semicolon or tab between columns; with semicolons numbers may have a decimal comma. A cell left empty is a
      reading not taken. Computed characteristics stay out.
    </p>
  `,
  styles: `
    :host {
      display: block;
      margin-top: 16px;
    }
    td {
      padding-block: 3px;
      overflow-wrap: anywhere;
    }
    td.mono {
      min-width: 80px;
    }
    p {
      margin-top: 8px;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ExpectedColumns {
  readonly characteristics = input.required<readonly Characteristic[]>();
  readonly units = input.required<number>();

  protected readonly columns = computed(() => [
    { key: 'unit', holds: `Number of the unit in draw order, 1 to ${this.units()}` },
    ...typedOf(this.characteristics()).map((each) => ({ key: each.key, holds: holdsWords(each) })),
  ]);
}
