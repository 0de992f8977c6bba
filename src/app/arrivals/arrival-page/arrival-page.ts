import { ChangeDetectionStrategy, Component, inject, input, numberAttribute } from '@angular/core';
import { Router } from '@angular/router';
import { BackLink } from '../../shell/back-link';
import { ArrivalPanel } from '../arrival-panel/arrival-panel';
import { minuteClock } from '../minute-clock';

/** One waiting lot on a page of its own, for screens that have no room beside the queue. */
@Component({
  selector: 'qr-arrival-page',
  imports: [ArrivalPanel, BackLink],
  template: `
    <div class="page narrow">
      <h1 class="unseen">Arrived lot</h1>
      <qr-back-link to="/arrivals">Arrivals</qr-back-link>
      <section class="sheet"><qr-arrival-panel class="pad" [lotId]="id()" [now]="now()" (changed)="leave()" /></section>
    </div>
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ArrivalPage {
  private readonly router = inject(Router);

  readonly id = input.required({ transform: numberAttribute });
  protected readonly now = minuteClock();

  protected leave(): void {
    void this.router.navigate(['/arrivals']);
  }
}
