import { type Routes } from '@angular/router';
import { addSupplier, listSuppliers } from '#shared/contract/suppliers';
import { roleGuard } from '../session/role-guard';
import { leaveGuard } from '../shell/leave-guard';

export default [
  {
    path: '',
    title: 'Suppliers',
    canActivate: [roleGuard(listSuppliers.who)],
    loadComponent: () => import('./supplier-list-page/supplier-list-page').then((page) => page.SupplierListPage),
  },
  {
    path: 'new',
    title: 'New supplier',
    canActivate: [roleGuard(addSupplier.who)],
    canDeactivate: [leaveGuard],
    loadComponent: () => import('./new-supplier-page/new-supplier-page').then((page) => page.NewSupplierPage),
  },
  {
    path: ':id',
    title: 'Supplier',
    canActivate: [roleGuard(listSuppliers.who)],
    canDeactivate: [leaveGuard],
    loadComponent: () => import('./supplier-page/supplier-page').then((page) => page.SupplierPage),
  },
] satisfies Routes;
