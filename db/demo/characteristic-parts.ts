import { type Characteristic } from '#shared/contract/plans';

export type Measured = Extract<Characteristic, { kind: 'measured' }>;
export type Computed = Extract<Characteristic, { kind: 'computed' }>;

/** A characteristic without condition and caution, sampled as its class is. */
export const PLAIN = { condition: '', caution: '', ownLevel: null, ownAql: null };
/** What is usual of a measured characteristic. */
export const MEASURED = { ...PLAIN, measurand: 'other', alternatePeaks: 'worst' } as const;
export const UNLIMITED = { target: null, lowerLimit: null, upperLimit: null };

/** Slow or awkward to measure: few units, at their own level. */
export const FEW_UNITS = { ownLevel: 'S-2', ownAql: '2.5' } as const;
