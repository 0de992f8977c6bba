import { ChangeDetectionStrategy, Component, computed, inject, input, output } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MatFormFieldModule } from '@angular/material/form-field';
import { MatSelectModule } from '@angular/material/select';
import { MessageNote } from '../../ui/states/message-note';
import { type PeakDraft } from './peak-draft';
import { secondsText } from './wave-options';
import { WaveWindow } from './wave-window';

/** A step is this share of what is shown; with Shift it is ten times as far. */
const STEP = 1 / 400;
const FAR = 10;

/** Moves, adds and removes peaks with keys and buttons. */
@Component({
  selector: 'qr-peak-mover',
  imports: [MatButton, MatFormFieldModule, MatSelectModule, MessageNote],
  template: `
    <div class="row">
      <mat-form-field subscriptSizing="dynamic">
        <mat-label>Peak</mat-label>
        <mat-select [value]="draft().chosen()" (valueChange)="draft().chosen.set($event)">
          @for (peak of draft().peaks(); track $index) {
            <mat-option [value]="$index">{{ $index + 1 }}, {{ peak.family }}, at {{ at(peak.seconds) }}</mat-option>
          }
        </mat-select>
      </mat-form-field>
      <button type="button" matButton="outlined" aria-label="Move the peak earlier" (click)="draft().move(-step())">
        ← Earlier
      </button>
      <button type="button" matButton="outlined" aria-label="Move the peak later" (click)="draft().move(step())">
        Later →
      </button>
      <button type="button" matButton="outlined" (click)="draft().remove()">Remove</button>
      <button type="button" matButton="outlined" (click)="draft().add(middle())">Add in the middle</button>
    </div>
    <p class="small quiet">
      On the two buttons <kbd>←</kbd> and <kbd>→</kbd> move the peak, with <kbd>Shift</kbd> ten times as far. Zoom in
      for finer steps.
    </p>
    @for (sentence of said(); track sentence) {
      <qr-message-note look="nok">{{ sentence }}</qr-message-note>
    }
    <div class="row">
      <button
        type="button"
        matButton="filled"
        disabledInteractive
        [disabled]="!draft().changed() || draft().indices().length < 2 || busy()"
        (click)="saved.emit()"
      >
        Save peaks
      </button>
      <button type="button" matButton (click)="cancelled.emit()">Cancel</button>
    </div>
  `,
  styles: `
    :host {
      display: grid;
      gap: 10px;
    }
    .row {
      display: flex;
      flex-wrap: wrap;
      gap: 8px;
      align-items: center;
    }
    mat-form-field {
      width: 260px;
      max-width: 100%;
    }
  `,
  host: { '(keydown)': 'press($event)' },
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PeakMover {
  private readonly view = inject(WaveWindow);

  readonly draft = input.required<PeakDraft>();
  /** How many samples the waveform has. */
  readonly samples = input.required<number>();
  readonly busy = input(false);
  readonly said = input<readonly string[]>([]);
  readonly saved = output();
  readonly cancelled = output();

  protected readonly at = secondsText;
  protected readonly step = computed(() => {
    const { from, to } = this.view.share();
    return Math.max(1, Math.round((to - from) * this.samples() * STEP));
  });
  protected readonly middle = computed(() => {
    const { from, to } = this.view.share();
    return Math.round(((from + to) / 2) * (this.samples() - 1));
  });

  protected press(event: KeyboardEvent): void {
    if (event.target instanceof Element && event.target.closest('mat-select')) return;
    const direction = event.key === 'ArrowLeft' ? -1 : event.key === 'ArrowRight' ? 1 : 0;
    if (direction === 0) return;
    event.preventDefault();
    this.draft().move(direction * this.step() * (event.shiftKey ? FAR : 1));
  }
}
