import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { type Instrument, INSTRUMENT_KIND_TITLES } from '#shared/contract/instruments';
import { referenceWords, STATUS_TITLES } from '../instrument-form/instrument-fields';

/** An instrument's values as text. */
@Component({
  selector: 'qr-instrument-facts',
  template: `
    <dl class="kv">
      <dt>Asset number</dt>
      <dd class="mono">{{ instrument().assetNumber }}</dd>
      <dt>Kind</dt>
      <dd>{{ kinds[instrument().kind] }}</dd>
      <dt>Description</dt>
      <dd>{{ instrument().description }}</dd>
      <dt>Serial number</dt>
      <dd class="mono">{{ instrument().serialNumber || 'none' }}</dd>
      <dt>Place</dt>
      <dd>{{ instrument().place || 'none' }}</dd>
      <dt>Calibration due</dt>
      <dd class="mono">{{ instrument().calibrationDue }}</dd>
      <dt>Status</dt>
      <dd>{{ statuses[instrument().status] }}</dd>
      <dt>Daily check</dt>
      <dd>{{ reference() }}</dd>
    </dl>
  `,
  styles: `
    dd {
      overflow-wrap: anywhere;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class InstrumentFacts {
  readonly instrument = input.required<Instrument>();

  protected readonly kinds = INSTRUMENT_KIND_TITLES;
  protected readonly statuses = STATUS_TITLES;
  protected readonly reference = computed(() => referenceWords(this.instrument().dailyReference));
}
