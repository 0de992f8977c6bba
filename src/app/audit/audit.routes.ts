import { type Routes } from '@angular/router';

export default [
  {
    path: '',
    title: 'Audit trail',
    loadComponent: () => import('./audit-page/audit-page').then((file) => file.AuditPage),
  },
] satisfies Routes;
