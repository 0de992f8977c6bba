import { type LotStatus } from '#shared/contract/lots';

const PLACES: Readonly<Record<LotStatus, { address: string; title: string }>> = {
  arrived: { address: '/arrivals', title: 'Arrivals' },
  cancelled: { address: '/arrivals', title: 'Arrivals' },
  drawn: { address: '/bench', title: 'Bench' },
  measuring: { address: '/bench', title: 'Bench' },
  submitted: { address: '/decision', title: 'Decision' },
  released: { address: '/released', title: 'Released' },
  'on-hold': { address: '/on-hold', title: 'On hold' },
};

/** The station of the line where a lot of this status stands. */
export function placeOf(status: LotStatus): { address: string; title: string } {
  return PLACES[status];
}
