import { Clipboard } from '@angular/cdk/clipboard';
import { ChangeDetectionStrategy, Component, inject, signal } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MAT_DIALOG_DATA, MatDialogModule } from '@angular/material/dialog';
import { MatFormFieldModule } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { formFieldDefaults } from '../../ui/material-defaults';
import { MessageNote } from '../../ui/states/message-note';

/** A token that was just issued. */
export interface IssuedToken {
  readonly rack: string;
  readonly token: string;
}

/** Shows a new token, once: nothing on the server could show it again. */
@Component({
  selector: 'qr-token-dialog',
  imports: [MatButton, MatDialogModule, MatFormFieldModule, MatInput, MessageNote],
  providers: [formFieldDefaults],
  template: `
    <h2 mat-dialog-title>Token of {{ issued.rack }}</h2>
    <mat-dialog-content>
      <qr-message-note look="hold">
        <b>Put it into the rack now.</b>
        It is not shown again. Whoever has it can send readings as this rack.
      </qr-message-note>
      <div class="token-row">
        <mat-form-field>
          <mat-label>Token</mat-label>
          <input #text matInput class="num token" readonly [value]="issued.token" (focus)="text.select()" />
        </mat-form-field>
        <button type="button" matButton="outlined" (click)="copy()">{{ copied() ? 'Copied' : 'Copy' }}</button>
      </div>
      <p class="small quiet">
        It is sent as a bearer token.
        <a class="link" href="/api/docs#test-rack" target="_blank" rel="noopener">How a rack sends readings</a>
      </p>
    </mat-dialog-content>
    <mat-dialog-actions>
      <button type="button" matButton="filled" mat-dialog-close>Done</button>
    </mat-dialog-actions>
  `,
  styles: `
    .token-row {
      display: grid;
      grid-template-columns: minmax(0, 1fr) auto;
      gap: 10px;
      align-items: end;
      margin: 14px 0 10px;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class TokenDialog {
  private readonly clipboard = inject(Clipboard);

  protected readonly issued = inject<IssuedToken>(MAT_DIALOG_DATA);
  protected readonly copied = signal(false);

  protected copy(): void {
    this.copied.set(this.clipboard.copy(this.issued.token));
  }
}
