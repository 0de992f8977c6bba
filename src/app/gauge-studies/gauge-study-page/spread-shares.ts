import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { percentText, sigmaText } from '#shared/papers/gauge-study-figures';
import { negativeSentence, spreadTitle } from '#shared/papers/gauge-study-words';
import { type SpreadAnalysis } from '#shared/statistics/gauge-study/gauge-study';
import { ScrollRegion } from '../../ui/scroll-region';
import { ShareStrip } from './share-strip';

/** What one method splits the spread into: standard deviations, and their shares of the total and of the tolerance. */
@Component({
  selector: 'qr-spread-shares',
  imports: [ScrollRegion, ShareStrip],
  template: `
    <h2>{{ method() }}</h2>
    <div [qrScrollRegion]="method()">
      <table class="mini">
        <thead>
          <tr>
            <th scope="col">Share of the spread</th>
            <th scope="col" class="right">σ, {{ unit() }}</th>
            <th scope="col" class="right" colspan="2">σ of total</th>
            @if (hasTolerance()) {
              <th scope="col" class="right" colspan="2">6σ of tolerance</th>
            }
          </tr>
        </thead>
        <tbody>
          @for (row of rows(); track row.title) {
            <tr [class.sum]="row.isSum">
              <th scope="row">{{ row.title }}</th>
              <td class="num right">{{ row.sigma }}</td>
              <td class="strip"><qr-share-strip [share]="row.ofVariation ?? 0" /></td>
              <td class="num right">{{ percent(row.ofVariation) }}</td>
              @if (hasTolerance()) {
                <td class="strip"><qr-share-strip [share]="row.ofTolerance ?? 0" /></td>
                <td class="num right">{{ percent(row.ofTolerance) }}</td>
              }
            </tr>
          }
        </tbody>
      </table>
    </div>
    @if (!hasTolerance()) {
      <p class="caption">The share of tolerance needs a lower and an upper limit.</p>
    }
    @if (negative()) {
      <p class="caption">{{ negative() }}</p>
    }
    <ng-content />
  `,
  styleUrl: './spread-shares.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class SpreadShares {
  readonly method = input.required<string>();
  readonly analysis = input.required<SpreadAnalysis>();
  readonly unit = input.required<string>();

  protected readonly percent = percentText;
  protected readonly hasTolerance = computed(() =>
    this.analysis().shares.some(({ ofTolerance }) => ofTolerance !== null),
  );
  protected readonly negative = computed(() => negativeSentence(this.analysis()));
  protected readonly rows = computed(() =>
    this.analysis().shares.map(({ spread, sigma, ofVariation, ofTolerance }) => ({
      ...{ ofVariation, ofTolerance },
      title: spreadTitle(spread, this.analysis()),
      sigma: sigmaText(sigma, this.unit()),
      isSum: spread === 'gauge' || spread === 'total',
    })),
  );
}
