import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { RouterLink } from '@angular/router';
import { listLots, type LotHead } from '#shared/contract/lots';
import { endpointResource } from '../../data/api';
import { PageLinks } from '../../shell/page-links';
import { SeverityMark } from '../../ui/marks/severity-mark';
import { VerdictChip } from '../../ui/marks/verdict-chip';
import { Loaded } from '../../ui/page-state/loaded';
import { PageState } from '../../ui/page-state/page-state';
import { EmptyState } from '../../ui/states/empty-state';
import { PartName } from '../../ui/part-name';
import { CountPipe } from '../../ui/values/count-pipe';
import { MomentPipe } from '../../ui/values/moment-pipe';
import { addressId } from '../part-supplier-filter/address-id';
import { PartSupplierFilter } from '../part-supplier-filter/part-supplier-filter';

const WORDS = {
  released: {
    title: 'Released',
    what: 'Accepted lots, each with its certificate, newest first',
    none: 'No lots are released.',
    cure: 'A lot comes here when quality has signed that it is accepted.',
  },
  'on-hold': {
    title: 'On hold',
    what: 'Rejected lots, and lots that quality holds, newest first',
    none: 'No lots are on hold.',
    cure: 'A rejected lot waits here for what is to be done with it.',
  },
} as const;

/** The decided lots of one station: released, or on hold. */
@Component({
  selector: 'qr-lot-list-page',
  imports: [
    CountPipe,
    EmptyState,
    Loaded,
    MomentPipe,
    PageLinks,
    PageState,
    PartName,
    PartSupplierFilter,
    RouterLink,
    SeverityMark,
    VerdictChip,
  ],
  templateUrl: './lot-list-page.html',
  styleUrl: './lot-list-page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class LotListPage {
  readonly station = input.required<'released' | 'on-hold'>();
  readonly part = input(undefined, { transform: addressId });
  readonly supplier = input(undefined, { transform: addressId });
  readonly after = input<string>();

  protected readonly lots = endpointResource(listLots, () => ({
    query: { station: this.station(), partId: this.part(), supplierId: this.supplier(), after: this.after() },
  }));
  protected readonly words = computed(() => WORDS[this.station()]);
  protected readonly filtered = computed(() => this.part() !== undefined || this.supplier() !== undefined);

  protected verdict({ status, verdict }: LotHead) {
    if (status === 'released') return { look: 'ok', word: 'Accepted' } as const;
    if (verdict === 'rejected') return { look: 'nok', word: 'Rejected' } as const;
    return { look: 'hold', word: 'Held, acceptable' } as const;
  }
}
