import { type Routes } from '@angular/router';
import { signedInGuard } from './session/signed-in-guard';

export const routes: Routes = [
  {
    path: 'sign-in',
    title: 'Sign in',
    loadComponent: () => import('./session/sign-in-page/sign-in-page').then((file) => file.SignInPage),
  },
  {
    path: 'link',
    title: 'One-time link',
    loadComponent: () => import('./session/link-page/link-page').then((file) => file.LinkPage),
  },
  { path: '', canMatch: [signedInGuard], loadChildren: () => import('./shell/shell.routes') },
];
