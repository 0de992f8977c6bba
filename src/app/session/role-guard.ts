import { inject } from '@angular/core';
import { type CanMatchFn, type Route, type Routes } from '@angular/router';
import { type Who } from '#shared/contract/endpoint';
import { type Role, ROLE_TITLES } from '#shared/contract/roles';
import { Session } from './session';

/** Matches only for people who hold one of the roles. */
export function roleGuard(...roles: readonly Role[]): CanMatchFn {
  return () => inject(Session).holds(...roles);
}

/**
 * An area that some roles may see: for them its own pages, for others, at the same address, a page that says who may. Who
 * may is what the contract says of the endpoint that the area shows. An area without a path of its own names the `paths`
 * it answers to.
 */
export function areaFor(who: Who, area: Route & { path: string; title: string }, paths = [area.path]): Routes {
  if (typeof who === 'string') return [area];
  const told = { who: whoSentence(who) };
  const loadComponent = () => import('./forbidden-page').then((file) => file.ForbiddenPage);
  const closed = paths.map((path) => ({
    path,
    title: area.title,
    canMatch: [() => !inject(Session).holds(...who)],
    children: [{ path: '**', loadComponent, data: told }],
  }));
  return [{ ...area, canMatch: [roleGuard(...who)] }, ...closed];
}

/** "This page is open to: inspector, quality engineer, auditor." */
function whoSentence(roles: readonly Role[]): string {
  return `This page is open to: ${roles.map((role) => ROLE_TITLES[role].toLowerCase()).join(', ')}.`;
}
