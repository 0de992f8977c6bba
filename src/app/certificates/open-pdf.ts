import { ChangeDetectionStrategy, Component, computed, inject, input, signal } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { type Certificate, openCertificate, readCertificate } from '#shared/contract/certificates';
import { ApiClient, hrefOf } from '../data/api';
import { openInTab } from '../data/file-tab';
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

  protected open(event: MouseEvent): void {
    const first = this.api.call(readCertificate, { params: { id: this.certificate().id } });
    openInTab(event, this.address(), first, (sentence) => this.refused.set(sentence));
  }
}
