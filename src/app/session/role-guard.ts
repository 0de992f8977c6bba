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
 * may is what the contract says of the endpoint that the area shows.
 */
export function areaFor(who: Who, area: Route & { title: string }): Routes {
  if (typeof who === 'string') return [area];
  return [
    { ...area, canMatch: [roleGuard(...who)] },
    {
      path: area.path,
      title: area.title,
      children: [
        { path: '**', loadComponent: () => import('./forbidden-page').then((file) => file.ForbiddenPage), data: { who: whoSentence(area.title, who) } },
      ],
    },
  ];
}

/** "Decision is for: inspector, quality engineer, auditor." */
function whoSentence(title: string, roles: readonly Role[]): string {
  return `${title} is for: ${roles.map((role) => ROLE_TITLES[role].toLowerCase()).join(', ')}.`;
}
