import { ChangeDetectionStrategy, Component, computed, inject, input, signal } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { type GaugeStudy, printGaugeStudy, readGaugeStudy } from '#shared/contract/gauge-studies';
import { ApiClient, hrefOf } from '../../data/api';
import { openInTab } from '../../data/file-tab';
import { Icon } from '../../ui/marks/icon';
import { MessageNote } from '../../ui/states/message-note';

/** Opens a study with its results as PDF, in a tab of its own. */
@Component({
  selector: 'qr-study-pdf',
  imports: [Icon, MatButton, MessageNote],
  template: `
    <a matButton="outlined" target="_blank" [href]="address()" (click)="open($event)">
      <qr-icon name="paper" [size]="18" />Open PDF
    </a>
    @if (refused()) {
      <qr-message-note look="nok">{{ refused() }}</qr-message-note>
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class StudyPdf {
  private readonly api = inject(ApiClient);

  readonly study = input.required<GaugeStudy>();

  protected readonly address = computed(() => hrefOf(printGaugeStudy, { params: { id: this.study().id } }));
  protected readonly refused = signal('');

  protected open(event: MouseEvent): void {
    const first = this.api.call(readGaugeStudy, { params: { id: this.study().id } });
    openInTab(event, this.address(), first, (sentence) => this.refused.set(sentence));
  }
}
