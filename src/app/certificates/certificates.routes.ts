import { type Routes } from '@angular/router';

export default [
  {
    path: '',
    title: 'Certificates',
    loadComponent: () =>
      import('./certificate-list-page/certificate-list-page').then((file) => file.CertificateListPage),
  },
  {
    path: ':id',
    title: 'Certificate',
    loadComponent: () => import('./certificate-page/certificate-page').then((file) => file.CertificatePage),
  },
] satisfies Routes;
