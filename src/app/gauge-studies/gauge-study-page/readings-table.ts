import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { type GaugeStudy } from '#shared/contract/gauge-studies';
import { ScrollRegion } from '../../ui/scroll-region';
import { readingDigits } from '../../ui/values/reading-text';

/** The readings of a study as text: parts down, the trials of each person to the right. */
@Component({
  selector: 'qr-readings-table',
  imports: [ScrollRegion],
  template: `
    <h2>Readings in {{ study().unit }}</h2>
    <div qrScrollRegion="Readings">
      <table class="mini">
        <thead>
          <tr>
            <th scope="col" rowspan="2">Part</th>
            @for (person of study().persons; track $index) {
              <th scope="colgroup" class="first" [attr.colspan]="study().trials">{{ person }}</th>
            }
          </tr>
          <tr>
            @for (person of study().persons; track $index) {
              @for (trial of trials(); track trial) {
                <th scope="col" class="right" [class.first]="trial === 1">{{ trial }}</th>
              }
            }
          </tr>
        </thead>
        <tbody>
          @for (row of rows(); track $index) {
            <tr>
              <th scope="row">{{ row.part }}</th>
              @for (text of row.texts; track $index) {
                <td class="num right" [class.first]="$index % study().trials === 0">{{ text }}</td>
              }
            </tr>
          }
        </tbody>
      </table>
    </div>
  `,
  styleUrl: './readings-table.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ReadingsTable {
  readonly study = input.required<GaugeStudy>();

  protected readonly trials = computed(() => Array.from({ length: this.study().trials }, (_, nth) => nth + 1));
  protected readonly rows = computed(() => {
    const { parts, values, unit, decimals } = this.study();
    return values.map((rows, part) => ({
      part: parts[part] ?? '',
      texts: rows.flat().map((value) => (value === null ? '–' : readingDigits(value, unit, decimals))),
    }));
  });
}
