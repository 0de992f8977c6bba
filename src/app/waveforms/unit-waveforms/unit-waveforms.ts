import { ChangeDetectionStrategy, Component, computed, input, output } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { type Characteristic } from '#shared/contract/plans';
import { keepWaveform, type WaveformHead } from '#shared/contract/waveforms';
import { formatQuantity } from '#shared/quantities/format-quantity';
import { waveformValue } from '#shared/waveform/waveform-value';
import { may } from '../../session/may';
import { lotWaveforms } from '../lot-waveforms';
import { isReadOff } from '../read-off';
import { WaveformUpload } from '../waveform-upload/waveform-upload';
import { WaveformLine } from './waveform-line';

/** What a waveform gives of a characteristic. */
export interface WaveformReading {
  readonly id: string;
  /** SI base unit. */
  readonly value: number;
}

/** The waveforms of one unit: one more is taken in, and what one gives is taken as a reading. */
@Component({
  selector: 'qr-unit-waveforms',
  imports: [MatButton, WaveformLine, WaveformUpload],
  template: `
    @if (isReadOff()) {
      <details [open]="lines().length > 0">
        <summary class="link">{{ summary() }}</summary>
        @for (line of lines(); track line.head.id) {
          <qr-waveform-line [waveform]="line.head">
            @if (mayWrite() && line.value !== null) {
              <button
                type="button"
                matButton="outlined"
                [attr.aria-label]="'Take ' + line.text + ' as the reading'"
                (click)="taken.emit({ id: line.head.id, value: line.value })"
              >
                Take {{ line.text }}
              </button>
            }
          </qr-waveform-line>
        }
        @if (mayWrite()) {
          <qr-waveform-upload
            [place]="{ lotId: lotId(), unit: unit(), characteristicKey: characteristic().key }"
            (kept)="list.reload()"
          />
        }
      </details>
    }
  `,
  styles: `
    :host {
      display: block;
      font: var(--qr-t-small);
    }
    qr-waveform-upload {
      margin-top: 8px;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class UnitWaveforms {
  readonly lotId = input.required<number>();
  readonly unit = input.required<number>();
  readonly characteristic = input.required<Characteristic>();
  readonly taken = output<WaveformReading>();

  protected readonly mayWrite = may(keepWaveform);
  protected readonly isReadOff = computed(() => isReadOff(this.characteristic()));
  protected readonly list = lotWaveforms(() => (this.isReadOff() ? this.lotId() : undefined));
  protected readonly lines = computed(() => {
    const items = this.list.hasValue() ? this.list.value().items : [];
    return items
      .filter(({ unit, withdrawn }) => unit === this.unit() && withdrawn === null)
      .map((head) => ({ head, ...valueOf(head, this.characteristic()) }));
  });
  protected readonly summary = computed(() => {
    const count = this.lines().length;
    if (count === 0) return 'Take it from a waveform';
    return count === 1 ? 'One waveform of this unit' : `${count} waveforms of this unit`;
  });
}

/** What a waveform gives of a characteristic; null where it gives nothing of the kind. */
function valueOf({ values }: WaveformHead, characteristic: Characteristic): { value: number | null; text: string } {
  if (characteristic.kind !== 'measured') return { value: null, text: '' };
  try {
    const value = waveformValue(values, characteristic);
    return { value, text: formatQuantity(value, characteristic.unit, { significant: 4 }) };
  } catch (error) {
    if (error instanceof RangeError) return { value: null, text: '' };
    throw error;
  }
}
