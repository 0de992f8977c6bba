import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { chanceText, figureText, squaresText } from '#shared/papers/gauge-study-figures';
import { SOURCE_TITLES } from '#shared/papers/gauge-study-words';
import { type VarianceTable } from '#shared/statistics/gauge-study/gauge-study';
import { ScrollRegion } from '../../ui/scroll-region';

/** The table of an analysis of variance; squares in the square of the study's unit. */
@Component({
  selector: 'qr-variance-sheet',
  imports: [ScrollRegion],
  template: `
    <h2>Analysis of variance</h2>
    <div qrScrollRegion="Analysis of variance">
      <table class="mini">
        <thead>
          <tr>
            <th scope="col">Source</th>
            <th scope="col" class="right">Degrees of freedom</th>
            <th scope="col" class="right">Sum of squares, ({{ unit() }})²</th>
            <th scope="col" class="right">Mean square, ({{ unit() }})²</th>
            <th scope="col" class="right">F</th>
            <th scope="col" class="right">p</th>
            <th scope="col" class="against">F divides by</th>
          </tr>
        </thead>
        <tbody>
          @for (row of rows(); track row.source) {
            <tr>
              <th scope="row">{{ row.source }}</th>
              <td class="num right">{{ row.degrees }}</td>
              <td class="num right">{{ row.sum }}</td>
              <td class="num right">{{ row.mean }}</td>
              <td class="num right">{{ row.f }}</td>
              <td class="num right">{{ row.p }}</td>
              <td class="quiet against">{{ row.against }}</td>
            </tr>
          }
        </tbody>
      </table>
    </div>
    <ng-content />
  `,
  styleUrl: './spread-shares.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class VarianceSheet {
  readonly table = input.required<VarianceTable>();
  readonly unit = input.required<string>();

  protected readonly rows = computed(() =>
    this.table().lines.map((line) => ({
      source: SOURCE_TITLES[line.source],
      degrees: line.degreesOfFreedom,
      sum: squaresText(line.sumOfSquares, this.unit()),
      mean: line.meanSquare === null ? '' : squaresText(line.meanSquare, this.unit()),
      f: line.f === null ? '' : figureText(line.f),
      p: line.p === null ? '' : chanceText(line.p),
      against: line.against === null ? '' : SOURCE_TITLES[line.against],
    })),
  );
}
