import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { RouterLink } from '@angular/router';
import { type WaveformHead } from '#shared/contract/waveforms';
import { VerdictMark } from '../../ui/marks/verdict-mark';
import { QuantityPipe } from '../../ui/values/quantity-pipe';
import { FINDINGS } from '../finding-words';

/** One waveform in a list: what it was found to be, its ripple, its file; a link to the whole. */
@Component({
  selector: 'qr-waveform-line',
  imports: [QuantityPipe, RouterLink, VerdictMark],
  template: `
    @let head = waveform();
    <qr-verdict-mark [look]="finding().look" [size]="16" />
    <div class="said">
      <a class="link" [routerLink]="['/waveforms', head.id]">
        @if (withUnit()) {
          Unit {{ head.unit }}:
        }
        {{ finding().title }}
      </a>
      @if (head.withdrawn) {
        <span class="small quiet">withdrawn</span>
      }
      <span class="small quiet file">
        <span class="mono">{{ head.values.peakToPeak | quantity: 'V' : { significant: 3 } }} p-p</span>,
        {{ head.fileName }}, {{ head.uploadedBy ?? head.rack ?? '' }}
      </span>
    </div>
    <ng-content />
  `,
  styles: `
    :host {
      display: flex;
      gap: 8px;
      align-items: flex-start;
      padding: 6px 0;
    }
    .said {
      flex: 1;
      min-width: 0;
      display: flex;
      flex-direction: column;
    }
    .file {
      overflow-wrap: anywhere;
    }
    qr-verdict-mark {
      margin-top: 2px;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class WaveformLine {
  readonly waveform = input.required<WaveformHead>();
  /** Whether the unit is said, where the list is not of one unit. */
  readonly withUnit = input(false);

  protected readonly finding = computed(() => FINDINGS[this.waveform().findings[0]?.kind ?? 'nothing-unusual']);
}
