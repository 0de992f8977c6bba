import { ChangeDetectionStrategy, Component, input } from '@angular/core';

/** A node on the line: the live count in a box, the station's name beside it or, on a phone, below. */
@Component({
  // eslint-disable-next-line @angular-eslint/component-selector -- a link stays an `a`
  selector: 'a[qrStationLink]',
  template: `
    <span class="node">
      @if (count()) {
        @for (shown of [count()]; track shown) {
          <span class="count">{{ shown }}</span>
        }
      } @else {
        <svg width="14" height="12" viewBox="0 0 14 12" aria-hidden="true"><path d="M1 8l3-4 3 3 2-5 4 5" /></svg>
      }
    </span>
    <span class="name">{{ name() }}</span>
  `,
  styleUrl: './station-link.scss',
  host: { '[class.on]': 'active()', '[attr.aria-current]': "active() ? 'page' : null" },
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class StationLink {
  readonly name = input.required<string>();
  readonly count = input('');
  readonly active = input(false);
}
