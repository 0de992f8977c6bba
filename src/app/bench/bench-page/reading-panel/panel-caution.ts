import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { MAINS_CAUTIONS, TRAINED_ONLY } from '#shared/plan/mains-cautions';
import { CautionNote } from '../../../ui/states/caution-note';

/** The caution of the characteristic in focus, with the usual ones; it stands as long as the focus is there. */
@Component({
  selector: 'qr-panel-caution',
  imports: [CautionNote],
  template: `
    <qr-caution-note [title]="parts().first">
      @if (!short()) {
        {{ parts().rest }}
      }
      <details>
        <summary>{{ trainedOnly }}</summary>
        @if (short()) {
          {{ parts().rest }}
        }
        <ul>
          @for (sentence of cautions; track sentence) {
            <li>{{ sentence }}</li>
          }
        </ul>
      </details>
    </qr-caution-note>
  `,
  styles: `
    :host {
      display: block;
    }
    summary {
      min-height: 24px;
      color: var(--qr-hold-text);
      font: var(--qr-t-label);
      line-height: 24px;
      cursor: pointer;
    }
    details[open] {
      max-height: 220px;
      overflow-y: auto;
    }
    ul {
      margin: 4px 0;
      padding-left: 16px;
    }
    :host(.short) {
      details:not([open]) {
        display: inline-block;
      }
      qr-caution-note {
        padding-block: 4px;
      }
    }
  `,
  host: { '[class.short]': 'short()' },
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PanelCaution {
  readonly caution = input.required<string>();
  /** Whether the screen is low: the first sentence stands, the rest opens. */
  readonly short = input(false);

  /** The first sentence stands out. */
  protected readonly parts = computed(() => {
    const [, first = this.caution(), rest = ''] = /^(.+?[.:;])\s+(.*)$/s.exec(this.caution()) ?? [];
    return { first, rest };
  });
  protected readonly trainedOnly = TRAINED_ONLY;
  protected readonly cautions = MAINS_CAUTIONS;
}
