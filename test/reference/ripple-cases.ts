import index from './data/ripple/index.json' with { type: 'json' };

/** The six simulated supplies of data/ripple (ngspice 39.3; its index.json tells source and definitions). */
export const RIPPLE_CASES = index.cases;
export type RippleCase = (typeof RIPPLE_CASES)[number];

export function topologyOf({ topology }: RippleCase): 'half-wave' | 'centre-tap' | 'bridge' {
  if (topology === 'full-wave centre-tap') return 'centre-tap';
  return topology === 'bridge' ? 'bridge' : 'half-wave';
}
