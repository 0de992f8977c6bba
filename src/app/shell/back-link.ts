import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import { type Params, RouterLink } from '@angular/router';
import { Icon } from '../ui/marks/icon';

/** The way back from a record to its list; the list's name is the content. */
@Component({
  selector: 'qr-back-link',
  imports: [Icon, RouterLink],
  template: `<a [routerLink]="to()" [queryParams]="query()"><qr-icon name="back" [size]="18" /><ng-content /></a>`,
  styles: `
    a {
      display: inline-flex;
      gap: 8px;
      align-items: center;
      min-height: var(--qr-control);
      color: var(--qr-ink-2);
      text-decoration: none;
    }
    a:hover {
      color: var(--qr-ink);
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class BackLink {
  readonly to = input.required<string>();
  /** The state of the list to come back to. */
  readonly query = input<Params>();
}
