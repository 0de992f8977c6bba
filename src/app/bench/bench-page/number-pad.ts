import { ChangeDetectionStrategy, Component, input, output } from '@angular/core';
import { MatButton } from '@angular/material/button';

const KEYS = ['7', '8', '9', '4', '5', '6', '1', '2', '3', '.', '0', '⌫'] as const;

/**
 * Digits for a gloved hand. A key types into the field that has the cursor; where none has, `started` asks for the first
 * field to be filled from the digit.
 */
@Component({
  selector: 'qr-number-pad',
  imports: [MatButton],
  template: `
    @for (key of keys; track key) {
      <button
        type="button"
        matButton="outlined"
        class="key"
        [attr.aria-label]="key === '⌫' ? 'Delete the last digit' : key === '.' ? 'Decimal point' : null"
        (mousedown)="$event.preventDefault()"
        (click)="type(key)"
      >
        {{ key }}
      </button>
    }
    <button type="button" matButton="filled" class="keep" (mousedown)="$event.preventDefault()" (click)="kept.emit()">
      Keep reading
    </button>
  `,
  styleUrl: './number-pad.scss',
  host: { role: 'group', 'aria-label': 'Number pad' },
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class NumberPad {
  /** The element whose fields are typed into. */
  readonly fields = input.required<HTMLElement>();
  readonly started = output<string>();
  readonly kept = output();

  protected readonly keys = KEYS;

  protected type(key: (typeof KEYS)[number]): void {
    const field = document.activeElement;
    const typing = field instanceof HTMLInputElement && field.type === 'text' && this.fields().contains(field);
    if (!typing) {
      if (key !== '⌫') this.started.emit(key);
      return;
    }
    const { selectionStart, selectionEnd, value } = field;
    const end = selectionEnd ?? value.length;
    const start = selectionStart ?? end;
    const from = key === '⌫' && start === end ? Math.max(start - 1, 0) : start;
    field.setRangeText(key === '⌫' ? '' : key, from, end, 'end');
    field.dispatchEvent(new Event('input', { bubbles: true }));
  }
}
