import { ChangeDetectionStrategy, Component, computed, inject, input } from '@angular/core';
import { MatFormFieldModule } from '@angular/material/form-field';
import { MatSelectModule } from '@angular/material/select';
import { Router } from '@angular/router';
import { listParts } from '#shared/contract/parts';
import { listSuppliers } from '#shared/contract/suppliers';
import { endpointResource } from '../../data/api';

/** Narrows a page to a part, a supplier or both; the choice is `part` and `supplier` in the address. */
@Component({
  selector: 'qr-part-supplier-filter',
  imports: [MatFormFieldModule, MatSelectModule],
  template: `
    <mat-form-field>
      <mat-label>Part</mat-label>
      <mat-select [value]="part() ?? 0" (selectionChange)="choose('part', $event.value)">
        <mat-option [value]="0">All parts</mat-option>
        @for (choice of partChoices(); track choice.id) {
          <mat-option [value]="choice.id">{{ choice.number }}, {{ choice.name }}</mat-option>
        }
      </mat-select>
    </mat-form-field>
    <mat-form-field>
      <mat-label>Supplier</mat-label>
      <mat-select [value]="supplier() ?? 0" (selectionChange)="choose('supplier', $event.value)">
        <mat-option [value]="0">All suppliers</mat-option>
        @for (choice of supplierChoices(); track choice.id) {
          <mat-option [value]="choice.id">{{ choice.name }}</mat-option>
        }
      </mat-select>
    </mat-form-field>
  `,
  styles: `
    :host {
      display: flex;
      flex-wrap: wrap;
      gap: 12px;
    }
    mat-form-field {
      flex: 1 1 200px;
      max-width: 280px;
    }
    @media (max-width: 599px) {
      mat-form-field {
        flex-basis: 140px;
        max-width: none;
      }
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PartSupplierFilter {
  private readonly router = inject(Router);

  readonly part = input.required<number | undefined>();
  readonly supplier = input.required<number | undefined>();

  private readonly parts = endpointResource(listParts, () => ({}));
  private readonly suppliers = endpointResource(listSuppliers, () => ({}));
  protected readonly partChoices = computed(() => (this.parts.hasValue() ? this.parts.value().items : []));
  protected readonly supplierChoices = computed(() => (this.suppliers.hasValue() ? this.suppliers.value().items : []));

  /** Another choice starts the list at its first page. */
  protected choose(name: 'part' | 'supplier', id: number): void {
    const queryParams = { [name]: id || null, after: null };
    void this.router.navigate([], { queryParams, queryParamsHandling: 'merge' });
  }
}
