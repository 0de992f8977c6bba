import { ChangeDetectionStrategy, Component, inject, input, numberAttribute, viewChild } from '@angular/core';
import { MatSnackBar } from '@angular/material/snack-bar';
import { Router } from '@angular/router';
import { type Lot, readLot } from '#shared/contract/lots';
import { endpointResource } from '../../data/api';
import { BackLink } from '../../shell/back-link';
import { type HoldsTyping } from '../../shell/leave-guard';
import { Loaded } from '../../ui/page-state/loaded';
import { PageState } from '../../ui/page-state/page-state';
import { ReadOnlyNote } from '../../ui/states/read-only-note';
import { LotForm } from '../lot-form/lot-form';

/** Corrects the booking of a lot whose sample is not drawn yet. */
@Component({
  selector: 'qr-correct-page',
  imports: [BackLink, Loaded, LotForm, PageState, ReadOnlyNote],
  template: `
    <qr-page-state what="The lot">
      <ng-template [qrLoaded]="lot" let-lot>
        @if (lot) {
          <header class="record-head">
            <qr-back-link to="/arrivals">Arrivals</qr-back-link>
            <div class="named">
              <span class="caption">Correct lot</span>
              <h1 class="ident-large">{{ lot.number }}</h1>
            </div>
          </header>
          <div class="page">
            @if (lot.status === 'arrived') {
              <qr-lot-form [lot]="lot" (saved)="show($event)" />
            } @else {
              <qr-read-only-note
                >The sample is drawn, or the lot cancelled: its booking stays as it is.</qr-read-only-note
              >
            }
          </div>
        }
      </ng-template>
    </qr-page-state>
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class CorrectPage implements HoldsTyping {
  private readonly router = inject(Router);
  private readonly snackBar = inject(MatSnackBar);
  private readonly form = viewChild(LotForm);

  readonly id = input.required({ transform: numberAttribute });

  protected readonly lot = endpointResource(readLot, () => ({ params: { id: this.id() } }));

  hasUnsaved(): boolean {
    return this.form()?.hasUnsaved() ?? false;
  }

  protected show(lot: Lot): void {
    this.snackBar.open(`Lot ${lot.number} corrected`);
    void this.router.navigate(['/arrivals'], { queryParams: { lot: lot.id } });
  }
}
