import { ChangeDetectionStrategy, Component, inject } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MAT_DIALOG_DATA, MatDialogModule, MatDialogRef } from '@angular/material/dialog';
import { drawSample, type Lot, type LotSampling } from '#shared/contract/lots';
import { ApiClient } from '../../data/api';
import { RecordSave } from '../../data/record-save';
import { SamplingFacts } from '../../lots/evidence/sampling-facts';
import { MessageNote } from '../../ui/states/message-note';
import { CountPipe } from '../../ui/values/count-pipe';

/** A lot whose part has a plan in force. */
export type DrawableLot = Lot & { sampling: LotSampling };

/** Says what the draw fixes, then draws. Closes with the drawn lot. */
@Component({
  selector: 'qr-draw-dialog',
  imports: [CountPipe, MatButton, MatDialogModule, MessageNote, SamplingFacts],
  template: `
    <h2 mat-dialog-title>Draw the sample of {{ lot.number }}?</h2>
    <mat-dialog-content>
      <p>
        {{ lot.sampling.sampleSize | count }} of {{ lot.countedQuantity | count }} units are drawn at random. From then
        on severity, plan revision, n, Ac and Re are fixed, and the booking is no longer corrected or cancelled.
      </p>
      <qr-sampling-facts [sampling]="lot.sampling" />
      @for (sentence of saving.said(); track $index) {
        <qr-message-note look="nok">{{ sentence }}</qr-message-note>
      }
    </mat-dialog-content>
    <mat-dialog-actions>
      <button type="button" class="cancel" matButton mat-dialog-close>Cancel</button>
      <button type="button" matButton="filled" [disabled]="saving.busy()" disabledInteractive (click)="draw()">
        {{ saving.busy() ? 'Drawing' : 'Draw sample' }}
      </button>
    </mat-dialog-actions>
  `,
  styles: `
    qr-sampling-facts,
    qr-message-note {
      display: block;
      margin-top: 14px;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class DrawDialog {
  private readonly api = inject(ApiClient);
  private readonly dialog = inject<MatDialogRef<DrawDialog, Lot>>(MatDialogRef);

  protected readonly lot = inject<DrawableLot>(MAT_DIALOG_DATA);
  protected readonly saving = new RecordSave();

  protected draw(): void {
    const { id, version } = this.lot;
    this.saving.run(this.api.call(drawSample, { params: { id }, version }), (drawn) => this.dialog.close(drawn));
  }
}
