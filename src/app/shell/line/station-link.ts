import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import { RouterLink } from '@angular/router';

/** A node on the line: the live count in a box, the station's name beside it or, on a phone, below. */
@Component({
  selector: 'qr-station-link',
  imports: [RouterLink],
  template: `
    <a [routerLink]="path()" [class.on]="active()" [attr.aria-current]="active() ? 'page' : null">
      <span class="node">
        @if (count()) {
          @for (shown of [{ count: count() }]; track shown.count) {
            <span class="count">{{ shown.count }}</span>
          }
        } @else {
          <svg width="14" height="12" viewBox="0 0 14 12" aria-hidden="true"><path d="M1 8l3-4 3 3 2-5 4 5" /></svg>
        }
      </span>
      <span class="name">{{ name() }}</span>
    </a>
  `,
  styleUrl: './station-link.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class StationLink {
  readonly path = input.required<string>();
  readonly name = input.required<string>();
  readonly count = input('');
  readonly active = input(false);
}
