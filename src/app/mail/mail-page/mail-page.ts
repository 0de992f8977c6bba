import { ChangeDetectionStrategy, Component, computed, inject, input } from '@angular/core';
import { Router } from '@angular/router';
import { Segmented } from '../../ui/segmented';
import { OutboxList } from './outbox-list';
import { ReceivedList } from './received-list';

type Box = 'outbox' | 'received';

/** The mail of the site: what was sent or waits, and what the local mail fake has received. */
@Component({
  selector: 'qr-mail-page',
  imports: [OutboxList, ReceivedList, Segmented],
  template: `
    <div class="page">
      <header class="page-head">
        <div>
          <h1>Mail</h1>
          <p>Each message as it was queued, and what became of it</p>
        </div>
        <qr-segmented label="Box" [options]="boxes" [value]="shown()" (valueChange)="open($event)" />
      </header>
      @if (shown() === 'outbox') {
        <qr-outbox-list class="sheet" />
      } @else {
        <qr-received-list class="sheet" />
      }
    </div>
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class MailPage {
  private readonly router = inject(Router);

  /** Which box, from the query. */
  readonly box = input<string>();

  protected readonly boxes = [
    { value: 'outbox', label: 'Outbox' },
    { value: 'received', label: 'Received by the local mail server' },
  ] as const;
  protected readonly shown = computed<Box>(() => (this.box() === 'received' ? 'received' : 'outbox'));

  protected open(box: Box): void {
    void this.router.navigate([], { queryParams: { box: box === 'outbox' ? null : box } });
  }
}
