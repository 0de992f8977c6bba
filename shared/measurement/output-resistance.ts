import { demandFinite } from './reading-not-finite';

/** Output voltages in volts at two loads, and the currents of those loads in amperes. */
export interface OutputResistanceInput {
  noLoadVolts: number;
  loadedVolts: number;
  loadAmperes: number;
  /** The current at no load, where a bleeder draws some; 0 A unless given. */
  noLoadAmperes?: number;
}

/**
 * Output resistance: the fall of the output voltage for each ampere drawn, in ohms.
 *
 *     (V no load − V full load) ÷ (I full load − I no load)
 *
 * Source: Boylestad & Nashelsky, Electronic Devices and Circuit Theory (from memory).
 *
 * @throws {RangeError} for a value that is not finite, or a full-load current not above the no-load current
 */
export function outputResistance(input: OutputResistanceInput): number {
  const { noLoadVolts, loadedVolts, loadAmperes, noLoadAmperes = 0 } = input;
  demandFinite({ noLoadVolts, loadedVolts, loadAmperes, noLoadAmperes });
  if (loadAmperes <= noLoadAmperes) throw new RangeError('loadAmperes must be above the no-load current.');
  return (noLoadVolts - loadedVolts) / (loadAmperes - noLoadAmperes);
}
