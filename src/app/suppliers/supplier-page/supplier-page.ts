import { ChangeDetectionStrategy, Component, effect, inject, input, numberAttribute, viewChild } from '@angular/core';
import { MatSnackBar } from '@angular/material/snack-bar';
import { changeSupplier, readSupplier, type Supplier } from '#shared/contract/suppliers';
import { endpointResource } from '../../data/api';
import { PageTitle } from '../../page-title';
import { may } from '../../session/may';
import { BackLink } from '../../shell/back-link';
import { type HoldsTyping } from '../../shell/leave-guard';
import { FigureBlock } from '../../ui/figure-block';
import { Loaded } from '../../ui/page-state/loaded';
import { PageState } from '../../ui/page-state/page-state';
import { ReadOnlyNote } from '../../ui/states/read-only-note';
import { CountPipe } from '../../ui/values/count-pipe';
import { SupplierForm } from '../supplier-form/supplier-form';
import { SupplierFacts } from './supplier-facts';

/** One supplier: a form for those who keep suppliers, the values as text for everybody else. */
@Component({
  selector: 'qr-supplier-page',
  imports: [BackLink, CountPipe, FigureBlock, Loaded, PageState, ReadOnlyNote, SupplierFacts, SupplierForm],
  templateUrl: './supplier-page.html',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class SupplierPage implements HoldsTyping {
  private readonly title = inject(PageTitle);
  private readonly snackBar = inject(MatSnackBar);
  private readonly form = viewChild(SupplierForm);

  readonly id = input.required({ transform: numberAttribute });

  protected readonly supplier = endpointResource(readSupplier, () => ({ params: { id: this.id() } }));
  protected readonly mayChange = may(changeSupplier);

  constructor() {
    effect(() => {
      if (this.supplier.hasValue()) this.title.show(this.supplier.value().name);
    });
  }

  hasUnsaved(): boolean {
    return this.form()?.hasUnsaved() ?? false;
  }

  protected show(supplier: Supplier): void {
    this.supplier.set(supplier);
    this.snackBar.open(`Supplier ${supplier.code} saved`);
  }
}
