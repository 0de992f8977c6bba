import { ChangeDetectionStrategy, Component, input } from '@angular/core';

/** A part as a list shows it: its number, then its name in a lighter voice. */
@Component({
  selector: 'qr-part-name',
  template: `<b>{{ of().number }}</b
    >&ngsp;<span class="quiet">{{ of().name }}</span>`,
  styles: `
    :host {
      display: inline-block;
      max-width: 340px;
      overflow-wrap: anywhere;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PartName {
  readonly of = input.required<{ number: string; name: string }>();
}
