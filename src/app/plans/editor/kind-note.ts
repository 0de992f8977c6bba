import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import { type MethodNote } from '#shared/plan/method-notes';

/** How a kind of quantity is measured and what to beware of, as the bench shows it beside the plan's own words. */
@Component({
  selector: 'qr-kind-note',
  template: `
    @if (note().method || note().caution) {
      <p class="label">Shown at the bench for this kind of measurement</p>
      @if (note().method) {
        <p class="small quiet">{{ note().method }}</p>
      }
      @if (note().caution) {
        <p class="small quiet">
          <b>Caution</b>
          {{ note().caution }}
        </p>
      }
    }
  `,
  styles: `
    :host {
      display: grid;
      gap: 4px;
      overflow-wrap: anywhere;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class KindNote {
  readonly note = input.required<MethodNote>();
}
