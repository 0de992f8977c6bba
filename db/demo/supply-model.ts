import { type ElectricalModel } from '#shared/contract/parts';
import { type Chance } from './chance';
import { noLoadVolts, type Rectifier, rectifierOutput } from './rectifier-output';
import { type Production } from './production';

/** What a unit gives, in SI base units: a model of its physics, for the demo only. */
export interface SupplyOutput {
  noLoadVolts: number;
  loadedVolts: number;
  rippleVolts: number;
  /** Peaks of the two half-windings without load; only a centre tap has them. */
  halfPeaks: readonly [number, number] | null;
  noLoadWatts: number;
  currentLimitAmperes: number;
}

/** How far single units stray from their model, as fractions: the model's own numbers, from no source. */
const SPREAD = { peak: 0.006, source: 0.025, drop: 0.03, capacitor: 0.045, tap: 0.004, line: 0.002, output: 0.006 };

/** How much of the difference between unequal halves shows as added ripple. */
const RIPPLE_OF_DIFFERENCE = 0.45;

function given(value: number | null, name: string): number {
  if (value === null) throw new RangeError(`${name} of the part's model is missing.`);
  return value;
}

/** Share of units with a stray weak capacitor, in any delivery. */
const STRAY_SHARE = 0.002;

/** A capacitor within its tolerance, or one of the batch that has lost capacitance. */
function capacitance(
  nominal: number,
  tolerance: number,
  production: Production,
  isBad: boolean,
  chance: Chance,
): number {
  if (isBad) return nominal * chance.about(0.71, 0.02);
  const factor = chance.about(production.capacitorMean, SPREAD.capacitor);
  return nominal * Math.min(1 + tolerance, Math.max(1 - tolerance, factor));
}

function rectifiedUnit(
  model: ElectricalModel,
  topology: Rectifier['topology'],
  production: Production,
  chance: Chance,
): SupplyOutput {
  const isBad = chance.happens(production.badShare);
  const badTap = production.fault === 'bad-tap' && isBad;
  const tap = badTap ? chance.about(0.045, 0.003) : chance.about(0, SPREAD.tap);
  const peakVolts =
    given(model.secondaryPeakVolts, 'secondaryPeakVolts') *
    chance.about(production.peakMean, SPREAD.peak) *
    chance.about(1, SPREAD.line);
  const unit: Rectifier = {
    topology,
    lineHertz: model.lineHertz,
    peakVolts,
    sourceOhms: given(model.sourceOhms, 'sourceOhms') * chance.about(1, SPREAD.source),
    diodeDropVolts: given(model.diodeDropVolts, 'diodeDropVolts') * chance.about(1, SPREAD.drop),
    filterFarads: capacitance(
      given(model.filterFarads, 'filterFarads'),
      given(model.filterTolerance, 'filterTolerance'),
      production,
      (production.fault === 'low-capacitance' && isBad) || chance.happens(STRAY_SHARE),
      chance,
    ),
    loadAmperes: model.ratedAmperes,
  };
  const output = rectifierOutput(unit);
  const difference = topology === 'centre-tap' ? Math.abs(tap) * peakVolts : 0;
  return {
    noLoadVolts: noLoadVolts(unit) + difference / 2,
    loadedVolts: output.meanVolts,
    rippleVolts: output.ripplePeakToPeak + RIPPLE_OF_DIFFERENCE * difference,
    halfPeaks: topology === 'centre-tap' ? [peakVolts * (1 + tap / 2), peakVolts * (1 - tap / 2)] : null,
    noLoadWatts: 0,
    currentLimitAmperes: 0,
  };
}

/** A regulated output holds its voltage; what is left of ripple comes from the switching. */
function switchingUnit({ ratedVolts, ratedAmperes }: ElectricalModel, chance: Chance): SupplyOutput {
  const noLoad = ratedVolts * chance.about(1.002, SPREAD.output);
  const stray = chance.happens(STRAY_SHARE) ? 2.4 : 1;
  return {
    noLoadVolts: noLoad,
    loadedVolts: noLoad - ratedVolts * chance.about(0.008, 0.001),
    rippleVolts: ratedVolts * chance.about(0.0095, 0.0009) * stray,
    halfPeaks: null,
    noLoadWatts: chance.about(0.066, 0.006),
    currentLimitAmperes: ratedAmperes * chance.about(1.28, 0.03),
  };
}

/** One unit of a production, its parts drawn from their tolerances. */
export function supplyUnit(model: ElectricalModel, production: Production, chance: Chance): SupplyOutput {
  const { topology } = model;
  if (topology === 'half-wave' || topology === 'centre-tap' || topology === 'bridge')
    return rectifiedUnit(model, topology, production, chance);
  return switchingUnit(model, chance);
}
