import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import { CautionNote } from '../../../ui/states/caution-note';
import { MAINS_CAUTIONS, RULES_COME_FIRST, TRAINED_ONLY } from './mains-caution';

/** The caution of the characteristic in focus, with the usual ones; shown as long as the focus is there. */
@Component({
  selector: 'qr-panel-caution',
  imports: [CautionNote],
  template: `
    <qr-caution-note [title]="caution()">
      {{ trainedOnly }}
      <details [open]="open()">
        <summary>Before you measure</summary>
        <ul>
          @for (sentence of cautions; track sentence) {
            <li>{{ sentence }}</li>
          }
        </ul>
      </details>
      <p>{{ rulesComeFirst }}</p>
    </qr-caution-note>
  `,
  styles: `
    :host {
      display: block;
    }
    summary {
      display: inline-block;
      color: var(--qr-primary);
      font-weight: 500;
      text-decoration: underline;
      text-underline-offset: 3px;
      cursor: pointer;
    }
    details {
      display: inline;
    }
    ul {
      margin: 4px 0;
      padding-left: 16px;
    }
    p {
      margin-top: 2px;
      color: var(--qr-ink-2);
      font: var(--qr-t-caption);
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PanelCaution {
  readonly caution = input.required<string>();
  readonly open = input(false);

  protected readonly trainedOnly = TRAINED_ONLY;
  protected readonly cautions = MAINS_CAUTIONS;
  protected readonly rulesComeFirst = RULES_COME_FIRST;
}
