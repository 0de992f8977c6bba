import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { type WaveformRecord } from '#shared/contract/waveforms';
import { formatQuantity } from '#shared/quantities/format-quantity';
import { secondsText } from './wave-options';

const volts = (value: number | null) => (value === null ? '' : formatQuantity(value, 'V', { significant: 4 }));
const hertz = (value: number | null) => (value === null ? '' : formatQuantity(value, 'Hz'));

/** Everything that was computed of the whole line cycles. */
@Component({
  selector: 'qr-wave-values',
  template: `
    <dl class="kv">
      @for (row of rows(); track row.name) {
        <dt>{{ row.name }}</dt>
        <dd class="num">{{ row.value }}</dd>
      }
    </dl>
    <p class="small quiet">{{ basis() }}</p>
  `,
  styles: `
    :host {
      display: grid;
      gap: 12px;
    }
    dd {
      white-space: nowrap;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class WaveValues {
  readonly record = input.required<WaveformRecord>();

  protected readonly rows = computed(() => {
    const { analysis } = this.record();
    const all = [
      { name: 'Mean', value: volts(analysis.mean) },
      { name: 'Highest', value: volts(analysis.max) },
      { name: 'Lowest', value: volts(analysis.min) },
      { name: 'Peak to peak', value: volts(analysis.peakToPeak) },
      { name: 'Ripple, rms', value: volts(analysis.rmsAc) },
      { name: 'Ripple frequency', value: hertz(analysis.rippleHertz) },
      { name: `Amplitude at ${hertz(analysis.lineHertz)}`, value: volts(analysis.atLine) },
      { name: `Amplitude at ${hertz(2 * analysis.lineHertz)}`, value: volts(analysis.atTwiceLine) },
      { name: 'Peaks in a line cycle', value: String(Number(analysis.peaksPerCycle.toFixed(2))) },
      { name: 'Mean of the odd peaks', value: volts(analysis.oddMean) },
      { name: 'Mean of the even peaks', value: volts(analysis.evenMean) },
      { name: 'Alternate-peak difference', value: volts(analysis.alternateDifference) },
    ];
    return all.filter(({ value }) => value !== '');
  });
  protected readonly basis = computed(() => {
    const { analysis, samples, spacing, interpolated } = this.record();
    const { lineCycles, lineHertz } = analysis;
    const of =
      lineCycles === 0
        ? 'Computed from all samples: the record holds no whole line cycle'
        : `Computed from ${lineCycles} whole ${lineCycles === 1 ? 'cycle' : 'cycles'} of the mains at ${hertz(lineHertz)}`;
    const spaced = interpolated ? ', which were unevenly spaced and are joined by straight lines' : '';
    return `${of}. ${samples.toLocaleString('en').replaceAll(',', '\u202f')} samples, one every ${secondsText(spacing.interval)}${spaced}.`;
  });
}
