import { readBench } from '#shared/contract/bench';
import { type Counts } from '#shared/contract/counts';
import { readAssessment } from '#shared/contract/decision';
import { type Who } from '#shared/contract/endpoint';
import { listLots } from '#shared/contract/lots';
import { type Role } from '#shared/contract/roles';
import { readYields } from '#shared/contract/yields';

/** A station of the line. Who sees it is what the contract says of the endpoint that it shows. */
export interface Station {
  readonly key: 'arrivals' | 'bench' | 'decision' | 'released' | 'on-hold' | 'trends';
  readonly title: string;
  readonly who: Who;
  /** The live count in its node; trends hold no lots. */
  readonly count: keyof Omit<Counts, 'at'> | null;
}

/** In the order of the line, which is also the order of Alt+1 to Alt+6. */
export const STATIONS: readonly Station[] = [
  { key: 'arrivals', title: 'Arrivals', who: listLots.who, count: 'arrivals' },
  { key: 'bench', title: 'Bench', who: readBench.who, count: 'bench' },
  { key: 'decision', title: 'Decision', who: readAssessment.who, count: 'decision' },
  { key: 'released', title: 'Released', who: listLots.who, count: 'released' },
  { key: 'on-hold', title: 'On hold', who: listLots.who, count: 'onHold' },
  { key: 'trends', title: 'Trends', who: readYields.who, count: null },
];

/** Where each role works first, in the order in which a person of several roles starts. */
const FIRST: readonly (readonly [Role, string])[] = [
  ['receiving', '/arrivals'],
  ['inspector', '/arrivals'],
  ['quality', '/decision'],
  ['engineering', '/on-hold'],
  ['auditor', '/audit'],
  ['admin', '/people'],
];

/** The address a person comes to after sign-in. */
export function firstAddress(holds: (role: Role) => boolean): string {
  return FIRST.find(([role]) => holds(role))?.[1] ?? '/account';
}
