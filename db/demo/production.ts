import { type Chance } from './chance';

/** What can be wrong with a delivery. */
export type Fault = 'none' | 'low-capacitance' | 'bad-tap' | 'smeared-marking' | 'reversed-plug';

/** What the units of one delivery have in common. */
export interface Production {
  fault: Fault;
  /** Share of the units that have the fault. */
  badShare: number;
  /** Means of the delivery relative to the model: deliveries differ from each other. */
  capacitorMean: number;
  peakMean: number;
  /** Share of units with a blemished marking. */
  smearedShare: number;
}

const BAD_SHARES: Record<Fault, number> = {
  none: 0,
  'low-capacitance': 0.12,
  'bad-tap': 0.7,
  'smeared-marking': 0,
  'reversed-plug': 0,
};

export function productionOf(fault: Fault, chance: Chance): Production {
  return {
    fault,
    badShare: BAD_SHARES[fault],
    capacitorMean: chance.about(1, 0.02),
    peakMean: chance.about(1, 0.003),
    smearedShare: fault === 'smeared-marking' ? 0.2 : 0.006,
  };
}
