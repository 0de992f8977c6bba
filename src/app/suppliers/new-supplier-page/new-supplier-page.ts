import { ChangeDetectionStrategy, Component, inject, viewChild } from '@angular/core';
import { MatSnackBar } from '@angular/material/snack-bar';
import { Router } from '@angular/router';
import { type Supplier } from '#shared/contract/suppliers';
import { BackLink } from '../../shell/back-link';
import { type HoldsTyping } from '../../shell/leave-guard';
import { SupplierForm } from '../supplier-form/supplier-form';

/** Adds a supplier and opens it. */
@Component({
  selector: 'qr-new-supplier-page',
  imports: [BackLink, SupplierForm],
  template: `
    <header class="record-head">
      <qr-back-link to="/suppliers">Suppliers</qr-back-link>
      <h1>New supplier</h1>
    </header>
    <div class="page narrow">
      <section class="sheet pad"><qr-supplier-form (saved)="open($event)" /></section>
    </div>
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class NewSupplierPage implements HoldsTyping {
  private readonly router = inject(Router);
  private readonly snackBar = inject(MatSnackBar);
  private readonly form = viewChild.required(SupplierForm);

  hasUnsaved(): boolean {
    return this.form().hasUnsaved();
  }

  protected open(supplier: Supplier): void {
    this.snackBar.open(`Supplier ${supplier.code} added`);
    void this.router.navigate(['/suppliers', supplier.id], { replaceUrl: true });
  }
}
