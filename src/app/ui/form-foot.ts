import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { Mark } from './marks/mark';
import { MessageNote } from './states/message-note';

/** Foot of a form: what stands in the way of saving, the button that submits it, and other actions as content. */
@Component({
  selector: 'qr-form-foot',
  imports: [MatButton, Mark, MessageNote],
  template: `
    @for (sentence of said(); track $index) {
      <qr-message-note look="nok">{{ sentence }}</qr-message-note>
    }
    <div class="actions">
      <button type="submit" matButton="filled" [disabled]="busy()" disabledInteractive>
        @if (busy()) {
          <qr-mark [busy]="true" />
          Saving
        } @else {
          {{ label() }}
        }
      </button>
      <ng-content />
    </div>
  `,
  styles: `
    :host {
      display: grid;
      gap: 12px;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class FormFoot {
  readonly label = input.required<string>();
  readonly busy = input(false);
  readonly said = input<readonly string[]>([]);
}
