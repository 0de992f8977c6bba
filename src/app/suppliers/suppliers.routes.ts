import { type Routes } from '@angular/router';
import { addSupplier } from '#shared/contract/suppliers';
import { areaFor } from '../session/role-guard';
import { leaveGuard } from '../shell/leave-guard';

export default [
  {
    path: '',
    title: 'Suppliers',
    loadComponent: () => import('./supplier-list-page/supplier-list-page').then((file) => file.SupplierListPage),
  },
  ...areaFor(addSupplier.who, {
    path: 'new',
    title: 'New supplier',
    canDeactivate: [leaveGuard],
    loadComponent: () => import('./new-supplier-page/new-supplier-page').then((file) => file.NewSupplierPage),
  }),
  {
    path: ':id',
    title: 'Supplier',
    canDeactivate: [leaveGuard],
    loadComponent: () => import('./supplier-page/supplier-page').then((file) => file.SupplierPage),
  },
] satisfies Routes;
