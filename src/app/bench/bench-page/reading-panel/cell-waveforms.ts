import { ChangeDetectionStrategy, Component, input, output } from '@angular/core';
import { type Characteristic } from '#shared/contract/plans';
import { type TakenWaveform } from '../../sheet/reading-draft';

/** The captured waveforms of the unit in focus. What one of them gave is taken as the reading of the cell. */
@Component({
  selector: 'qr-cell-waveforms',
  template: '',
  styles: `
    :host:empty {
      display: none;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class CellWaveforms {
  readonly unit = input.required<number>();
  readonly characteristic = input.required<Characteristic>();
  readonly taken = output<TakenWaveform>();
}
