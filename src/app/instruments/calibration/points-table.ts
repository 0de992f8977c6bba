import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { type CalibrationPoint } from '#shared/contract/calibrations';
import { VerdictMark } from '../../ui/marks/verdict-mark';
import { ScrollRegion } from '../../ui/scroll-region';
import { pointDigits, pointError, pointText } from './point-error';

/** The points of a calibration: what was applied, what the instrument showed, and how far off it was and might be. */
@Component({
  selector: 'qr-points-table',
  imports: [ScrollRegion, VerdictMark],
  template: `
    <div [qrScrollRegion]="'Points of calibration ' + certificateNumber()">
      <table class="mini">
        <thead>
          <tr>
            <th scope="col">Point</th>
            <th scope="col" class="right">Reference</th>
            <th scope="col" class="right">As found</th>
            <th scope="col" class="right">Error</th>
            <th scope="col" class="right">Allowed</th>
            <th scope="col"><span class="unseen">Result</span></th>
          </tr>
        </thead>
        <tbody>
          @for (row of rows(); track $index) {
            <tr>
              <td class="point">{{ row.point }}</td>
              <td class="num right">{{ row.reference }}</td>
              <td class="num right">{{ row.found }}</td>
              <td class="num right" [class.beyond]="!row.isWithin">{{ row.error }}</td>
              <td class="num right">± {{ row.limit }}</td>
              <td class="mark">
                <qr-verdict-mark [look]="row.isWithin ? 'ok' : 'nok'" [size]="14" />
                <span class="unseen">{{ row.isWithin ? 'within' : 'beyond' }}</span>
              </td>
            </tr>
          }
        </tbody>
      </table>
    </div>
  `,
  styles: `
    div {
      position: relative;
    }
    td {
      white-space: nowrap;
    }
    td.point {
      min-width: 110px;
      white-space: normal;
      overflow-wrap: anywhere;
    }
    td.beyond {
      color: var(--qr-nok-text);
      font-weight: 600;
    }
    td.mark {
      width: 24px;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PointsTable {
  readonly points = input.required<readonly CalibrationPoint[]>();
  readonly certificateNumber = input.required<string>();

  protected readonly rows = computed(() =>
    this.points().map((one) => {
      const { text, isWithin } = pointError(one);
      return {
        point: one.point,
        reference: pointText(one.reference, one.unit, pointDigits(one.reference, one.limit)),
        found: pointText(one.found, one.unit, pointDigits(one.found, one.limit)),
        error: text,
        limit: pointText(one.limit, one.unit),
        isWithin,
      };
    }),
  );
}
