import { ChangeDetectionStrategy, Component, inject, signal } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { verifyAudit } from '#shared/contract/audit';
import { ApiClient, type Reply } from '../../data/api';
import { RecordSave } from '../../data/record-save';
import { MessageNote } from '../../ui/states/message-note';
import { CountPipe } from '../../ui/values/count-pipe';

/** Recomputes the hash chain of the audit trail and says whether it holds. */
@Component({
  selector: 'qr-chain-check',
  imports: [CountPipe, MatButton, MessageNote],
  template: `
    @for (sentence of checking.said(); track $index) {
      <qr-message-note look="nok">{{ sentence }}</qr-message-note>
    }
    @if (result(); as found) {
      @if (found.intact) {
        <qr-message-note look="ok">
          {{ found.entries | count }} entries, chain intact. Head
          <span class="mono" [title]="found.head">{{ found.head.slice(0, 16) }}</span>
        </qr-message-note>
      } @else {
        <qr-message-note look="nok">
          The chain is broken at entry {{ found.firstBroken }}: it or one before it was changed outside this program.
        </qr-message-note>
      }
    }
    <button type="button" matButton="outlined" [disabled]="checking.busy()" (click)="check()">
      {{ checking.busy() ? 'Checking' : result() ? 'Check again' : 'Check the chain' }}
    </button>
  `,
  styles: `
    :host {
      display: flex;
      flex-wrap: wrap;
      gap: 8px 12px;
      align-items: center;
      margin-left: auto;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ChainCheck {
  private readonly api = inject(ApiClient);

  protected readonly checking = new RecordSave();
  protected readonly result = signal<Reply<typeof verifyAudit> | null>(null);

  protected check(): void {
    this.checking.run(this.api.call(verifyAudit, {}), (found) => this.result.set(found));
  }
}
