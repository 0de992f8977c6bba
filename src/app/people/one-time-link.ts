import { Clipboard } from '@angular/cdk/clipboard';
import { ChangeDetectionStrategy, Component, inject, input, signal } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MatFormFieldModule } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { MomentPipe } from '../ui/values/moment-pipe';
import { MessageNote } from '../ui/states/message-note';

/** A one-time link to hand over: shown now and never again. */
@Component({
  selector: 'qr-one-time-link',
  imports: [MatButton, MatFormFieldModule, MatInput, MessageNote, MomentPipe],
  template: `
    <qr-message-note look="hold">
      <b>Hand this link to {{ name() }} yourself.</b>
      It sets a password once, until {{ expires() | moment: 'full' }}, and is not shown again.
    </qr-message-note>
    <div class="link-row">
      <mat-form-field>
        <mat-label>One-time link</mat-label>
        <input #text matInput class="num" readonly [value]="link()" (focus)="text.select()" />
      </mat-form-field>
      <button type="button" matButton="outlined" (click)="copy()">{{ copied() ? 'Copied' : 'Copy' }}</button>
    </div>
  `,
  styles: `
    :host {
      display: grid;
      gap: 10px;
    }
    .link-row {
      display: grid;
      grid-template-columns: minmax(0, 1fr) auto;
      gap: 10px;
      align-items: end;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class OneTimeLink {
  private readonly clipboard = inject(Clipboard);

  readonly name = input.required<string>();
  readonly link = input.required<string>();
  readonly expires = input.required<string>();

  protected readonly copied = signal(false);

  protected copy(): void {
    this.copied.set(this.clipboard.copy(this.link()));
  }
}
