import { ChangeDetectionStrategy, Component, inject, viewChild } from '@angular/core';
import { MatSnackBar } from '@angular/material/snack-bar';
import { Router } from '@angular/router';
import { type Instrument } from '#shared/contract/instruments';
import { BackLink } from '../../shell/back-link';
import { type HoldsTyping } from '../../shell/leave-guard';
import { InstrumentForm } from '../instrument-form/instrument-form';

/** Adds an instrument and opens it. */
@Component({
  selector: 'qr-new-instrument-page',
  imports: [BackLink, InstrumentForm],
  template: `
    <header class="record-head">
      <qr-back-link to="/instruments">Instruments</qr-back-link>
      <h1>New instrument</h1>
    </header>
    <div class="page narrow">
      <section class="sheet pad"><qr-instrument-form (saved)="open($event)" /></section>
    </div>
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class NewInstrumentPage implements HoldsTyping {
  private readonly router = inject(Router);
  private readonly snackBar = inject(MatSnackBar);
  private readonly form = viewChild.required(InstrumentForm);

  hasUnsaved(): boolean {
    return this.form().hasUnsaved();
  }

  protected open(instrument: Instrument): void {
    this.snackBar.open(`Instrument ${instrument.assetNumber} added`);
    void this.router.navigate(['/instruments', instrument.id], { replaceUrl: true });
  }
}
