import { ChangeDetectionStrategy, Component, inject } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MAT_DIALOG_DATA, MatDialogModule } from '@angular/material/dialog';

/** What a confirming dialog says: the numbers, then the consequence, each as a sentence. */
export interface Confirmation {
  /** A question: "Reject lot L-26-0412?" */
  readonly title: string;
  readonly text: readonly string[];
  /** The verb of the step: "Reject lot". */
  readonly confirm: string;
  readonly destructive?: boolean;
  readonly cancel?: string;
}

/** The dialog behind `Confirm`; the focus starts on Cancel. */
@Component({
  selector: 'qr-confirm-dialog',
  imports: [MatButton, MatDialogModule],
  template: `
    <h2 mat-dialog-title>{{ said.title }}</h2>
    <mat-dialog-content>
      @for (sentence of said.text; track $index) {
        <p>{{ sentence }}</p>
      }
    </mat-dialog-content>
    <mat-dialog-actions>
      <button type="button" class="cancel" matButton [mat-dialog-close]="false">{{ said.cancel ?? 'Cancel' }}</button>
      <button type="button" matButton="filled" [class.destructive]="said.destructive" [mat-dialog-close]="true">
        {{ said.confirm }}
      </button>
    </mat-dialog-actions>
  `,
  styles: `
    p + p {
      margin-top: 8px;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ConfirmDialog {
  protected readonly said = inject<Confirmation>(MAT_DIALOG_DATA);
}
