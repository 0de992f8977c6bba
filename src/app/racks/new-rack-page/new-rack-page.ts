import { ChangeDetectionStrategy, Component, inject, viewChild } from '@angular/core';
import { MatSnackBar } from '@angular/material/snack-bar';
import { Router } from '@angular/router';
import { type Rack } from '#shared/contract/racks';
import { BackLink } from '../../shell/back-link';
import { type HoldsTyping } from '../../shell/leave-guard';
import { RackForm } from '../rack-form/rack-form';

/** Adds a rack and opens it, where its tokens are issued. */
@Component({
  selector: 'qr-new-rack-page',
  imports: [BackLink, RackForm],
  template: `
    <header class="record-head">
      <qr-back-link to="/racks">Racks</qr-back-link>
      <h1>New rack</h1>
    </header>
    <div class="page narrow">
      <section class="sheet pad"><qr-rack-form (saved)="open($event)" /></section>
    </div>
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class NewRackPage implements HoldsTyping {
  private readonly router = inject(Router);
  private readonly snackBar = inject(MatSnackBar);
  private readonly form = viewChild.required(RackForm);

  hasUnsaved(): boolean {
    return this.form().hasUnsaved();
  }

  protected open(rack: Rack): void {
    this.snackBar.open(`Rack ${rack.name} added`);
    void this.router.navigate(['/racks', rack.id], { replaceUrl: true });
  }
}
