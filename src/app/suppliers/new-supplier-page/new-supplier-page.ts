import { ChangeDetectionStrategy, Component, inject, viewChild } from '@angular/core';
import { MatSnackBar } from '@angular/material/snack-bar';
import { Router } from '@angular/router';
import { type Supplier } from '#shared/contract/suppliers';
import { type HoldsTyping } from '../../shell/leave-guard';
import { RecordHead } from '../../ui/record-head';
import { SupplierForm } from '../supplier-form/supplier-form';

/** Adds a supplier and opens it. */
@Component({
  selector: 'qr-new-supplier-page',
  imports: [RecordHead, SupplierForm],
  template: `
    <qr-record-head back="Suppliers" kind="Supplier" title="New supplier" />
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
