import { ChangeDetectionStrategy, Component } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { RouterLink } from '@angular/router';
import { addSupplier, listSuppliers } from '#shared/contract/suppliers';
import { endpointResource } from '../../data/api';
import { may } from '../../session/may';
import { Icon } from '../../ui/marks/icon';
import { Loaded } from '../../ui/page-state/loaded';
import { PageState } from '../../ui/page-state/page-state';
import { EmptyState } from '../../ui/states/empty-state';
import { CountPipe } from '../../ui/values/count-pipe';

/** All suppliers, with how many of their lots were decided and accepted. */
@Component({
  selector: 'qr-supplier-list-page',
  imports: [CountPipe, EmptyState, Icon, Loaded, MatButton, PageState, RouterLink],
  templateUrl: './supplier-list-page.html',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class SupplierListPage {
  protected readonly suppliers = endpointResource(listSuppliers, () => ({}));
  protected readonly mayAdd = may(addSupplier);
}
