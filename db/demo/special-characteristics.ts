import { type Characteristic } from '#shared/contract/plans';
import { MAINS_CAUTION, OPEN_FRAME_CAUTION } from './cautions';
import { type Computed, FEW_UNITS, type Measured, MEASURED, PLAIN, UNLIMITED } from './characteristic-parts';
import { type DemoPart } from './demo-part';

function halfPeak(half: 1 | 2): Measured {
  return {
    kind: 'measured',
    ...MEASURED,
    ...UNLIMITED,
    ...FEW_UNITS,
    key: `half${half}_peak`,
    measurand: 'half-winding-peak',
    name: `Peak of half-winding ${half}`,
    class: 'minor',
    condition: '230 V, no load',
    method: `Differential probe from the centre tap to end ${half} of the winding. Read the peak.`,
    caution: OPEN_FRAME_CAUTION,
    unit: 'V',
    decimals: 2,
    entryMode: 'direct',
    instrumentKind: 'oscilloscope',
  };
}

/** Balance needs the two half-windings, which an open frame lets be reached. */
export function balance({ limits }: DemoPart): Characteristic[] {
  if (limits.balance === null) return [];
  const computed: Computed = {
    kind: 'computed',
    ...PLAIN,
    ...UNLIMITED,
    ...FEW_UNITS,
    key: 'balance',
    name: 'Transformer balance',
    class: 'minor',
    method: 'Computed from the peaks of the two half-windings.',
    unit: '%',
    decimals: 1,
    upperLimit: limits.balance,
    formula: { key: 'transformer-balance', inputs: { half1: 'half1_peak', half2: 'half2_peak' }, constants: {} },
  };
  return [halfPeak(1), halfPeak(2), computed];
}

/** The limit of external supplies up to 49 W. Source: Commission Regulation (EU) 2019/1782, Annex II, point 1(a). */
export function noLoadPower({ limits }: DemoPart): Characteristic[] {
  if (limits.noLoadWatts === null) return [];
  const measured: Measured = {
    kind: 'measured',
    ...MEASURED,
    ...UNLIMITED,
    ownLevel: 'S-4',
    ownAql: '2.5',
    key: 'no_load_power',
    measurand: 'input-power',
    name: 'No-load power',
    class: 'major',
    condition: '230 V, no load',
    method: 'Power meter in the mains lead, mean over 60 s. Limit: Regulation (EU) 2019/1782, Annex II.',
    caution: MAINS_CAUTION,
    unit: 'mW',
    decimals: 0,
    upperLimit: limits.noLoadWatts,
    entryMode: 'direct',
    instrumentKind: 'power-meter',
  };
  return [measured];
}

export function currentLimit({ limits }: DemoPart): Characteristic[] {
  if (limits.currentLimitAmperes === null) return [];
  const [lowerLimit, upperLimit] = limits.currentLimitAmperes;
  const measured: Measured = {
    kind: 'measured',
    ...MEASURED,
    ownLevel: 'S-4',
    ownAql: '2.5',
    key: 'current_limit',
    measurand: 'current',
    name: 'Current limit',
    class: 'major',
    condition: 'output down 5 %',
    method: 'Raise the load slowly until the output has dropped by 5 %. Read the current.',
    caution: OPEN_FRAME_CAUTION,
    unit: 'A',
    decimals: 2,
    target: null,
    lowerLimit,
    upperLimit,
    entryMode: 'direct',
    instrumentKind: 'electronic-load',
  };
  return [measured];
}
