import { ChangeDetectionStrategy, Component, computed, inject, input, signal } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { type Certificate, openCertificate, readCertificate } from '#shared/contract/certificates';
import { ApiClient, hrefOf } from '../data/api';
import { problemOf } from '../data/api-problem';
import { Icon } from '../ui/marks/icon';
import { MessageNote } from '../ui/states/message-note';

/** Opens a certificate's file in a tab of its own, exactly as it was issued. */
@Component({
  selector: 'qr-open-pdf',
  imports: [Icon, MatButton, MessageNote],
  template: `
    @if (certificate().status === 'issuing') {
      <p class="small quiet">The file is being made. It can be opened in a moment.</p>
    } @else {
      <a matButton="outlined" target="_blank" [href]="address()" (click)="open($event)">
        <qr-icon name="paper" [size]="18" />Open PDF
      </a>
      @if (refused()) {
        <qr-message-note look="nok">{{ refused() }}</qr-message-note>
      }
    }
  `,
  styles: `
    :host {
      display: block;
    }
    qr-message-note {
      margin-top: 8px;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class OpenPdf {
  private readonly api = inject(ApiClient);

  readonly certificate = input.required<Certificate>();

  protected readonly address = computed(() => hrefOf(openCertificate, { params: { id: this.certificate().id } }));
  protected readonly refused = signal('');

  /**
   * A link alone cannot renew a session that has run out meanwhile; a call does. The tab is opened at once, because
   * browsers refuse one that comes later than the click.
   */
  protected open(event: MouseEvent): void {
    if (event.ctrlKey || event.metaKey || event.shiftKey) return;
    const tab = window.open('', '_blank');
    if (tab === null) return;
    event.preventDefault();
    this.refused.set('');
    this.api.call(readCertificate, { params: { id: this.certificate().id } }).subscribe({
      next: () => tab.location.replace(this.address()),
      error: (thrown: unknown) => {
        tab.close();
        this.refused.set(problemOf(thrown).message);
      },
    });
  }
}
