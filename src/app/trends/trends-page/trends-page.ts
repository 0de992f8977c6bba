import { ChangeDetectionStrategy, Component, computed, inject, input } from '@angular/core';
import { MatFormFieldModule } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { Router } from '@angular/router';
import { day } from '#shared/contract/fields';
import { readYields } from '#shared/contract/yields';
import { endpointResource } from '../../data/api';
import { addressId } from '../../lots/part-supplier-filter/address-id';
import { PartSupplierFilter } from '../../lots/part-supplier-filter/part-supplier-filter';
import { FigureBlock } from '../../ui/figure-block';
import { Loaded } from '../../ui/page-state/loaded';
import { PageState } from '../../ui/page-state/page-state';
import { EmptyState } from '../../ui/states/empty-state';
import { formatNumber } from '#shared/quantities/format-number';
import { type YieldRow } from '#shared/contract/yields';
import { LotsByMonth } from './lots-by-month';
import { UnitsByMonth } from './units-by-month';
import { YieldTable } from './yield-table';

const addressDay = (text: unknown) => (day.safeParse(text).success ? String(text) : undefined);

/** What was decided: lots and units by month, supplier and part, from the summaries written at each decision. */
@Component({
  selector: 'qr-trends-page',
  imports: [
    EmptyState,
    FigureBlock,
    Loaded,
    LotsByMonth,
    MatFormFieldModule,
    MatInput,
    PageState,
    PartSupplierFilter,
    UnitsByMonth,
    YieldTable,
  ],
  templateUrl: './trends-page.html',
  styleUrl: './trends-page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class TrendsPage {
  private readonly router = inject(Router);

  readonly part = input(undefined, { transform: addressId });
  readonly supplier = input(undefined, { transform: addressId });
  readonly from = input(undefined, { transform: addressDay });
  readonly to = input(undefined, { transform: addressDay });

  protected readonly yields = endpointResource(readYields, () => ({
    query: { partId: this.part(), supplierId: this.supplier(), from: this.from(), to: this.to() },
  }));
  protected readonly narrowed = computed(() =>
    [this.part(), this.supplier(), this.from(), this.to()].some((filter) => filter !== undefined),
  );

  /** Each share stands with the counts it comes from. */
  protected figures(total: YieldRow) {
    const of = (part: number, whole: number) => `${formatNumber(part, 0)} of ${formatNumber(whole, 0)}`;
    return [
      { value: of(total.lotsAccepted, total.lotsDecided), caption: 'lots accepted' },
      { value: of(total.unitsConforming, total.unitsInspected), caption: 'inspected units conforming' },
      { value: formatNumber(total.unitsReleased, 0), caption: 'units released' },
    ];
  }

  protected setPeriod(name: 'from' | 'to', value: string): void {
    void this.router.navigate([], { queryParams: { [name]: value || null }, queryParamsHandling: 'merge' });
  }
}
