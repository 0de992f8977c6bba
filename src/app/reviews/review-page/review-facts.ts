import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { RouterLink } from '@angular/router';
import { type Review } from '#shared/contract/calibrations';
import { AsFound } from '../../instruments/calibration/as-found';
import { CertificateFile } from '../../instruments/calibration/certificate-file';
import { PointsTable } from '../../instruments/calibration/points-table';
import { MomentPipe } from '../../ui/values/moment-pipe';
import { doubtWords } from '../doubt-words';

/** What was found, and from when to when readings are in doubt for it. */
@Component({
  selector: 'qr-review-facts',
  imports: [AsFound, CertificateFile, MomentPipe, PointsTable, RouterLink],
  template: `
    @let shown = review();
    @let calibration = shown.calibration;
    <div class="columns">
      <dl class="kv">
        <dt>Instrument</dt>
        <dd>
          <a class="link" [routerLink]="['/instruments', shown.instrument.id]">{{ shown.instrument.assetNumber }}</a>,
          {{ shown.instrument.description }}
        </dd>
        <dt>As found</dt>
        <dd><qr-as-found [of]="calibration.asFound" /></dd>
        <dt>Calibrated</dt>
        <dd>{{ calibration.calibratedOn }} by {{ calibration.laboratory }}</dd>
        <dt>Certificate</dt>
        <dd class="mono">{{ calibration.certificateNumber }}</dd>
        <dt>Adjusted</dt>
        <dd>{{ calibration.adjusted ? 'Yes, left in tolerance' : 'No' }}</dd>
        <dt>In doubt</dt>
        <dd>{{ doubt() }}</dd>
        <dt>Opened</dt>
        <dd>{{ shown.openedAt | moment: 'full' }}, {{ calibration.recordedBy }}</dd>
      </dl>
      <div class="found">
        @if (calibration.points.length > 0) {
          <qr-points-table [points]="calibration.points" [certificateNumber]="calibration.certificateNumber" />
        } @else {
          <p class="small quiet">
            The calibration gives no points, so how near a limit readings lie cannot be weighed against the error.
          </p>
        }
        <qr-certificate-file [instrumentId]="shown.instrument.id" [calibration]="calibration" [readOnly]="true" />
      </div>
    </div>
    <p class="small quiet">
      {{ why() }} Readings that were withdrawn are left out; repeats that stand are counted. What is computed from
      readings is not weighed against the error here; it stands on the page of the lot.
    </p>
  `,
  styles: `
    :host {
      display: grid;
      grid-template-columns: minmax(0, 1fr);
      gap: 12px;
    }
    .columns {
      display: grid;
      grid-template-columns: repeat(auto-fit, minmax(min(420px, 100%), 1fr));
      gap: 16px 32px;
    }
    .found {
      display: grid;
      grid-template-columns: minmax(0, 1fr);
      gap: 12px;
      align-content: start;
      min-width: 0;
    }
    dd {
      overflow-wrap: anywhere;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ReviewFacts {
  readonly review = input.required<Review>();

  protected readonly doubt = computed(() => doubtWords(this.review()));
  protected readonly why = computed(() => {
    const { doubtFrom, calibration } = this.review();
    const from =
      doubtFrom === null
        ? 'No good calibration is known before, so everything it ever read is in doubt'
        : 'In doubt is what it read from the day after its last good calibration';
    const to = calibration.adjusted ? 'up to the day it was adjusted.' : 'up to the day it was withdrawn.';
    return `${from}, ${to}`;
  });
}
