import { ChangeDetectionStrategy, Component, input, output } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MessageNote } from './states/message-note';

/** Foot of a list that is read page by page. */
@Component({
  selector: 'qr-load-more',
  imports: [MatButton, MessageNote],
  template: `
    @for (sentence of said(); track $index) {
      <qr-message-note look="nok">{{ sentence }}</qr-message-note>
    }
    @if (hasMore()) {
      <button type="button" matButton="outlined" [disabled]="busy()" disabledInteractive (click)="more.emit()">
        {{ busy() ? 'Loading' : 'Load more' }}
      </button>
    } @else {
      <span class="caption">{{ end() }}</span>
    }
  `,
  styles: `
    :host {
      display: grid;
      gap: 10px;
      justify-items: center;
      padding: 12px 16px;
      border-top: 1px solid var(--qr-line);
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class LoadMore {
  readonly hasMore = input.required<boolean>();
  readonly busy = input(false);
  readonly said = input<readonly string[]>([]);
  /** Said when the list is complete. */
  readonly end = input('');
  readonly more = output();
}
