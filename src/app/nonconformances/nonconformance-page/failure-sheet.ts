import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import { type Failure } from '#shared/contract/nonconformances';
import { LimitStrip } from '../../ui/limit-strip/limit-strip';
import { ClassGlyph } from '../../ui/marks/class-glyph';
import { LimitsPipe } from '../../ui/values/limits-pipe';
import { ReadingPipe } from '../../ui/values/reading-pipe';
import { ScrollRegion } from '../../ui/scroll-region';

/** One characteristic that failed, with its limits and the readings outside them, as they stood at the rejection. */
@Component({
  selector: 'qr-failure-sheet',
  imports: [ClassGlyph, LimitStrip, LimitsPipe, ReadingPipe, ScrollRegion],
  template: `
    @let shown = failure();
    <section class="sheet">
      <div class="head">
        <h3>{{ shown.name }}</h3>
        <qr-class-glyph [of]="shown.class" />
        <span class="actions" [class.num]="shown.unit !== null">
          @if (shown.unit !== null) {
            {{ { lower: shown.lowerLimit, upper: shown.upperLimit } | limits: shown.unit : shown.decimals }}
          } @else {
            {{ shown.requirement }}
          }
        </span>
      </div>
      <div [qrScrollRegion]="shown.name">
        <table class="table">
          <thead>
            <tr>
              <th scope="col">Unit no.</th>
              @if (shown.unit !== null) {
                <th scope="col">Against the limit</th>
              }
              <th scope="col" [class.right]="shown.unit !== null">Reading</th>
              <th scope="col" class="right">Attempt</th>
            </tr>
          </thead>
          <tbody>
            @for (reading of shown.readings; track $index) {
              <tr>
                <td class="num">{{ reading.unit }}</td>
                @if (shown.unit !== null) {
                  <td>
                    <qr-limit-strip
                      verdict="nok"
                      [width]="120"
                      [value]="reading.value"
                      [lower]="shown.lowerLimit"
                      [upper]="shown.upperLimit"
                      [unit]="shown.unit"
                      [decimals]="shown.decimals"
                    />
                  </td>
                  <td class="num right">{{ reading.value | reading: shown.unit : shown.decimals }}</td>
                } @else {
                  <td>Fail{{ reading.reason ? ', ' + reading.reason : '' }}</td>
                }
                <td class="num right">{{ reading.attempt }}</td>
              </tr>
            }
          </tbody>
        </table>
      </div>
    </section>
  `,
  styles: `
    .head .num {
      white-space: normal;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class FailureSheet {
  readonly failure = input.required<Failure>();
}
