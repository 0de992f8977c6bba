import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { RouterLink } from '@angular/router';

/** The ways to the next page of a list and back to its first; the place in the list is `after` in the address. */
@Component({
  selector: 'qr-page-links',
  imports: [MatButton, RouterLink],
  template: `
    @if (after()) {
      <a matButton="outlined" [routerLink]="[]" [queryParams]="{ after: null }" queryParamsHandling="merge"
        >First page</a
      >
    }
    @if (next(); as cursor) {
      <a matButton="outlined" [routerLink]="[]" [queryParams]="{ after: cursor }" queryParamsHandling="merge"
        >Next page</a
      >
    }
  `,
  styles: `
    :host {
      display: flex;
      justify-content: flex-end;
      gap: 8px;
      padding: 12px 16px;
    }
    :host([hidden]) {
      display: none;
    }
  `,
  host: { role: 'navigation', 'aria-label': 'Pages', '[hidden]': '!after() && !next()' },
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PageLinks {
  /** Cursor of the page that is shown; undefined on the first. */
  readonly after = input<string>();
  /** Cursor of the next page; null on the last. */
  readonly next = input.required<string | null>();
}
