import { ChangeDetectionStrategy, Component, inject, input, output } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MatProgressBar } from '@angular/material/progress-bar';
import { LARGEST_WAVEFORM, type Waveform } from '#shared/contract/waveforms';
import { FileDrop } from '../../ui/file-drop';
import { MessageNote } from '../../ui/states/message-note';
import { WaveformSending, type WaveformPlace } from './waveform-sending';

/** Takes a waveform file by dropping or choosing, shows how far it is, and says why one is refused. */
@Component({
  selector: 'qr-waveform-upload',
  imports: [FileDrop, MatButton, MatProgressBar, MessageNote],
  template: `
    @let progress = sending.progress();
    @if (progress.state === 'sending' || progress.state === 'reading') {
      <div class="way" role="status">
        <span class="name">{{ progress.name }}</span>
        @if (progress.state === 'sending') {
          <mat-progress-bar mode="determinate" aria-label="Sent" [value]="progress.share * 100" />
          <span class="small quiet">{{ percent(progress.share) }} sent</span>
        } @else {
          <mat-progress-bar mode="indeterminate" aria-label="Reading the samples" />
          <span class="small quiet">Reading the samples…</span>
        }
        <button type="button" matButton="outlined" (click)="sending.cancel()">Cancel</button>
      </div>
    } @else {
      <qr-file-drop
        label="Waveform file"
        prompt="Drop the oscilloscope’s CSV file here"
        tooLarge="Capture fewer samples; a few line cycles are enough."
        [most]="most"
        (picked)="send($event)"
      />
      @if (progress.state === 'refused') {
        <qr-message-note look="nok">
          <b>{{ progress.name }}</b> is not kept. {{ progress.reason }}
          <button type="button" class="link" (click)="sending.again(keep)">Send it again</button>
        </qr-message-note>
      }
    }
  `,
  styles: `
    :host {
      display: block;
    }
    .way {
      display: grid;
      grid-template-columns: 1fr auto;
      gap: 6px 12px;
      align-items: center;
      padding: 14px 16px;
      border: 1px solid var(--qr-line-2);
      border-radius: var(--qr-r-control);
    }
    .name {
      overflow-wrap: anywhere;
    }
    mat-progress-bar {
      grid-column: 1 / -1;
      grid-row: 2;
    }
    qr-message-note {
      margin-top: 8px;
    }
  `,
  providers: [WaveformSending],
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class WaveformUpload {
  protected readonly sending = inject(WaveformSending);

  readonly place = input.required<WaveformPlace>();
  readonly kept = output<Waveform>();

  protected readonly most = LARGEST_WAVEFORM;
  protected readonly keep = (waveform: Waveform): void => this.kept.emit(waveform);

  protected send(file: File): void {
    this.sending.send(file, this.place(), this.keep);
  }

  protected percent(share: number): string {
    return `${Math.round(share * 100)}\u202f%`;
  }
}
