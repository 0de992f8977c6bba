import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { RouterLink } from '@angular/router';
import { NoPermission } from '../ui/states/no-permission';

/** Stands at the address of an area that the person may not see. */
@Component({
  selector: 'qr-forbidden-page',
  imports: [MatButton, NoPermission, RouterLink],
  template: `
    <div class="page">
      <h1 class="unseen">Not open to you</h1>
      <qr-no-permission class="sheet" [who]="who()">
        <a matButton="outlined" routerLink="/">Go to your first station</a>
      </qr-no-permission>
    </div>
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ForbiddenPage {
  /** Who may, as a sentence; comes from the route. */
  readonly who = input.required<string>();
}
