import { ChangeDetectionStrategy, Component, signal, viewChild } from '@angular/core';
import { RouterLink } from '@angular/router';
import { type Lot } from '#shared/contract/lots';
import { BackLink } from '../../shell/back-link';
import { type HoldsTyping } from '../../shell/leave-guard';
import { MessageNote } from '../../ui/states/message-note';
import { CountPipe } from '../../ui/values/count-pipe';
import { LotForm } from '../lot-form/lot-form';

/** Books lots in one after the other; the last one's number stays in view to be written on its cartons. */
@Component({
  selector: 'qr-receive-page',
  imports: [BackLink, CountPipe, LotForm, MessageNote, RouterLink],
  template: `
    <header class="record-head">
      <qr-back-link to="/arrivals">Arrivals</qr-back-link>
      <h1>Receive lot</h1>
    </header>
    <div class="page stack">
      @if (booked(); as lot) {
        <qr-message-note look="ok" aria-live="polite">
          <a class="ident-large" routerLink="/arrivals" [queryParams]="{ lot: lot.id }">{{ lot.number }}</a> is booked
          in: {{ lot.countedQuantity | count }} units of {{ lot.part.number }} from {{ lot.supplier.name }}. Ready for
          the next lot of this delivery.
        </qr-message-note>
      }
      <qr-lot-form (saved)="booked.set($event)" />
    </div>
  `,
  styles: `
    qr-message-note {
      max-width: 1120px;
    }
    a {
      color: inherit;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ReceivePage implements HoldsTyping {
  private readonly form = viewChild.required(LotForm);

  protected readonly booked = signal<Lot | null>(null);

  hasUnsaved(): boolean {
    return this.form().hasUnsaved();
  }
}
