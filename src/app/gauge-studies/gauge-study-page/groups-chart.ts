import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { inDisplayUnit } from '#shared/quantities/display-unit';
import { formatNumber } from '#shared/quantities/format-number';
import { Chart } from '../../ui/chart/chart';
import { ChartTable } from '../../ui/chart/chart-table';
import { groupOptions, type GroupsOfReadings } from './group-options';

/** Readings of each part or of each person, with their mean. */
@Component({
  selector: 'qr-groups-chart',
  imports: [Chart, ChartTable],
  template: `
    <h2>{{ title() }}</h2>
    <qr-chart [label]="sentence()" [options]="options()">
      <ng-template qrChartTable>
        <div class="scroll-x">
          <table class="mini">
            <thead>
              <tr>
                <th scope="col">{{ of() }}</th>
                <th scope="col" class="right">Lowest</th>
                <th scope="col" class="right">Mean</th>
                <th scope="col" class="right">Highest</th>
              </tr>
            </thead>
            <tbody>
              @for (row of rows(); track $index) {
                <tr>
                  <th scope="row">{{ row.name }}</th>
                  <td class="num right">{{ row.lowest }}</td>
                  <td class="num right">{{ row.mean }}</td>
                  <td class="num right">{{ row.highest }}</td>
                </tr>
              }
            </tbody>
          </table>
        </div>
      </ng-template>
    </qr-chart>
  `,
  styleUrl: './spread-shares.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class GroupsChart {
  readonly title = input.required<string>();
  /** What a group is: Part, Person. */
  readonly of = input.required<string>();
  readonly groups = input.required<GroupsOfReadings>();

  protected readonly options = computed(() => groupOptions(this.groups()));
  protected readonly rows = computed(() => {
    const { names, groups, unit, decimals } = this.groups();
    const text = (value: number) => formatNumber(inDisplayUnit(value, unit), decimals);
    return groups.map(({ readings, mean }, nth) => ({
      name: names[nth] ?? '',
      lowest: text(Math.min(...readings)),
      mean: text(mean),
      highest: text(Math.max(...readings)),
    }));
  });
  protected readonly sentence = computed(() => {
    const rows = this.rows();
    const means = this.groups().groups.map(({ mean }) => mean);
    const low = rows[means.indexOf(Math.min(...means))];
    const high = rows[means.indexOf(Math.max(...means))];
    return `${this.title()}: the lowest mean is ${low?.mean ?? ''} at ${low?.name ?? ''}, the highest ${high?.mean ?? ''} at ${high?.name ?? ''}.`;
  });
}
