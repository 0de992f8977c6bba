import { ChangeDetectionStrategy, Component } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { RouterLink } from '@angular/router';
import { EmptyState } from '../ui/states/empty-state';

/** Stands at an address that leads nowhere. */
@Component({
  selector: 'qr-not-found-page',
  imports: [EmptyState, MatButton, RouterLink],
  template: `
    <div class="page">
      <h1 class="unseen">Not found</h1>
      <qr-empty-state class="sheet" title="There is no such page." text="The address may be cut short or out of date.">
        <a matButton="outlined" routerLink="/">Go to your first station</a>
      </qr-empty-state>
    </div>
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class NotFoundPage {}
