import { type ElectricalModel } from '#shared/contract/parts';
import { type PartBody } from './demo-bodies';

/** What the plan of a part asks for, in SI base units; a limit of null leaves its characteristic out. */
export interface PartLimits {
  noLoadVolts: readonly [lower: number, upper: number];
  loadedVolts: readonly [lower: number, upper: number];
  rippleVolts: number;
  regulation: number;
  balance: number | null;
  noLoadWatts: number | null;
  currentLimitAmperes: readonly [lower: number, upper: number] | null;
}

/** A part of the demo: what is booked into the catalogue, what its plan asks for, and who supplies it. */
export interface DemoPart {
  body: PartBody;
  limits: PartLimits;
  /** Codes of the suppliers. */
  suppliers: readonly string[];
  /** Usual sizes of its lots. */
  lotSizes: readonly number[];
}

type Rectified = Pick<ElectricalModel, 'topology' | 'ratedVolts' | 'ratedAmperes'> & {
  peakVolts: number;
  sourceOhms: number;
  microfarads: number;
};

/** A transformer supply on 230 V, 50 Hz; capacitors of +/-20 % are usual (common practice, no source). */
export function rectified({ topology, ratedVolts, ratedAmperes, ...rest }: Rectified): ElectricalModel {
  return {
    topology,
    lineVolts: 230,
    lineHertz: 50,
    ratedVolts,
    ratedAmperes,
    secondaryPeakVolts: rest.peakVolts,
    sourceOhms: rest.sourceOhms,
    diodeDropVolts: 0.85,
    filterFarads: rest.microfarads * 1e-6,
    filterTolerance: 0.2,
    filterEsrOhms: 0.05,
  };
}

export function switching(ratedVolts: number, ratedAmperes: number): ElectricalModel {
  return {
    topology: 'switch-mode',
    lineVolts: 230,
    lineHertz: 50,
    ratedVolts,
    ratedAmperes,
    secondaryPeakVolts: null,
    sourceOhms: null,
    diodeDropVolts: null,
    filterFarads: null,
    filterTolerance: null,
    filterEsrOhms: null,
  };
}
