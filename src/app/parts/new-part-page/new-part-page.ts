import { ChangeDetectionStrategy, Component, inject, viewChild } from '@angular/core';
import { MatSnackBar } from '@angular/material/snack-bar';
import { Router } from '@angular/router';
import { type Part } from '#shared/contract/parts';
import { BackLink } from '../../shell/back-link';
import { type HoldsTyping } from '../../shell/leave-guard';
import { PartForm } from '../part-form/part-form';

/** Adds a part and opens it. */
@Component({
  selector: 'qr-new-part-page',
  imports: [BackLink, PartForm],
  template: `
    <header class="record-head">
      <qr-back-link to="/parts">Parts</qr-back-link>
      <h1>New part</h1>
    </header>
    <div class="page narrow">
      <section class="sheet pad"><qr-part-form (saved)="open($event)" /></section>
    </div>
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class NewPartPage implements HoldsTyping {
  private readonly router = inject(Router);
  private readonly snackBar = inject(MatSnackBar);
  private readonly form = viewChild.required(PartForm);

  hasUnsaved(): boolean {
    return this.form().hasUnsaved();
  }

  protected open(part: Part): void {
    this.snackBar.open(`Part ${part.number} added`);
    void this.router.navigate(['/parts', part.id], { replaceUrl: true });
  }
}
