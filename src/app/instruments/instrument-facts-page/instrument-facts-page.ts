import { ChangeDetectionStrategy, Component, effect, inject, input, numberAttribute, viewChild } from '@angular/core';
import { MatSnackBar } from '@angular/material/snack-bar';
import { Router } from '@angular/router';
import { type Instrument, readInstrument } from '#shared/contract/instruments';
import { endpointResource } from '../../data/api';
import { PageTitle } from '../../page-title';
import { BackLink } from '../../shell/back-link';
import { type HoldsTyping } from '../../shell/leave-guard';
import { Loaded } from '../../ui/page-state/loaded';
import { PageState } from '../../ui/page-state/page-state';
import { InstrumentForm } from '../instrument-form/instrument-form';

/** Changes what the register says of an instrument, and goes back to it. */
@Component({
  selector: 'qr-instrument-facts-page',
  imports: [BackLink, InstrumentForm, Loaded, PageState],
  template: `
    <qr-page-state what="The instrument">
      <ng-template [qrLoaded]="instrument" let-instrument>
        @if (instrument) {
          <header class="record-head">
            <qr-back-link [to]="'/instruments/' + instrument.id">{{ instrument.assetNumber }}</qr-back-link>
            <h1>Change instrument</h1>
          </header>
          <div class="page narrow">
            <section class="sheet pad">
              <qr-instrument-form [instrument]="instrument" (saved)="close($event)" />
            </section>
          </div>
        }
      </ng-template>
    </qr-page-state>
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class InstrumentFactsPage implements HoldsTyping {
  private readonly router = inject(Router);
  private readonly snackBar = inject(MatSnackBar);
  private readonly title = inject(PageTitle);
  private readonly form = viewChild(InstrumentForm);

  readonly id = input.required({ transform: numberAttribute });

  protected readonly instrument = endpointResource(readInstrument, () => ({ params: { id: this.id() } }));

  constructor() {
    effect(() => {
      if (this.instrument.hasValue()) this.title.show(this.instrument.value().assetNumber);
    });
  }

  hasUnsaved(): boolean {
    return this.form()?.hasUnsaved() ?? false;
  }

  protected close(instrument: Instrument): void {
    this.snackBar.open(`Instrument ${instrument.assetNumber} saved`);
    void this.router.navigate(['/instruments', instrument.id], { replaceUrl: true });
  }
}
