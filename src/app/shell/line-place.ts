import { Injectable, signal } from '@angular/core';
import { type Station } from './stations';

/** The station at which the lot on the page stands; a lot's page sets it, because its address does not tell. */
@Injectable({ providedIn: 'root' })
export class LinePlace {
  readonly station = signal<Station['key'] | null>(null);
}
