/** Kinds of external supply that the laws tell apart. */
export const SUPPLY_CLASSES = ['basic', 'low', 'multi', 'ac-ac-basic', 'ac-ac-low'] as const;
export type SupplyClass = (typeof SUPPLY_CLASSES)[number];

/** What a law asks of a supply: efficiency as a fraction, no-load power in watts; null where it sets nothing. */
export interface EfficiencyLimits {
  averageEfficiency: number;
  noLoadWattsUs: number | null;
  noLoadWattsEu: number | null;
}

/** A curve of the smaller powers: a line up to 1 W, then a logarithm up to 49 W, then steps. */
interface Curve {
  slope: number;
  offset: number;
  logarithm: number;
  fall: number;
  constant: number;
  upTo250: number;
}

const BASIC: Curve = { slope: 0.5, offset: 0.16, logarithm: 0.071, fall: 0.0014, constant: 0.67, upTo250: 0.88 };
const LOW: Curve = { slope: 0.517, offset: 0.087, logarithm: 0.0834, fall: 0.0014, constant: 0.609, upTo250: 0.87 };
const MULTI: Curve = { slope: 0.497, offset: 0.067, logarithm: 0.075, fall: 0, constant: 0.561, upTo250: 0.86 };
const ABOVE_250 = 0.875;

function curveOf(supply: SupplyClass): Curve {
  if (supply === 'multi') return MULTI;
  return supply === 'low' || supply === 'ac-ac-low' ? LOW : BASIC;
}

function leastEfficiency(supply: SupplyClass, watts: number): number {
  const { slope, offset, logarithm, fall, constant, upTo250 } = curveOf(supply);
  if (watts <= 1) return slope * watts + offset;
  if (watts <= 49) return logarithm * Math.log(watts) - fall * watts + constant;
  return watts <= 250 || supply === 'multi' ? upTo250 : ABOVE_250;
}

function noLoadUs(supply: SupplyClass, watts: number): number {
  if (supply === 'multi') return 0.3;
  if (watts > 250) return 0.5;
  return watts > 49 || supply.startsWith('ac-ac') ? 0.21 : 0.1;
}

/** The European low-voltage column makes no difference between AC and DC; above 250 W the regulation says nothing. */
function noLoadEu(supply: SupplyClass, watts: number): number | null {
  if (watts > 250) return null;
  if (supply === 'multi') return 0.3;
  return watts > 49 || supply === 'ac-ac-basic' ? 0.21 : 0.1;
}

/**
 * The least average active efficiency and the highest no-load power of an external supply.
 *
 * Source: 10 CFR 430.32(w)(1)(ii), from 10 February 2016; Commission Regulation (EU) 2019/1782, Annex II point 1(a) and (b),
 * from 1 April 2020. "low": nameplate below 6 V and at least 550 mA.
 *
 * @param watts nameplate output power
 * @throws {RangeError} for a power that is not above 0
 */
export function efficiencyLimits(supply: SupplyClass, watts: number): EfficiencyLimits {
  if (!(Number.isFinite(watts) && watts > 0)) throw new RangeError('watts must be a number above 0.');
  return {
    averageEfficiency: leastEfficiency(supply, watts),
    noLoadWattsUs: noLoadUs(supply, watts),
    noLoadWattsEu: noLoadEu(supply, watts),
  };
}

/** The class of a supply with one direct output, by its nameplate. Source: as above. */
export function supplyClassOf(ratedVolts: number, ratedAmperes: number): 'basic' | 'low' {
  return ratedVolts < 6 && ratedAmperes >= 0.55 ? 'low' : 'basic';
}
