import { demandFinite } from './reading-not-finite';

/** Output voltages in volts, the first without load, the second at full load. */
export interface LoadRegulationInput {
  noLoadVolts: number;
  loadedVolts: number;
  /** The reference, where the plan states regulation against the rated voltage instead of the loaded one. */
  ratedVolts?: number;
}

/**
 * Load regulation: how far the output falls when the full load is put on it, as a fraction (0.05 is 5 %).
 *
 *     (V no load − V full load) ÷ V full load
 *
 * Some data sheets divide by the rated voltage: give ratedVolts for that.
 * Source: Boylestad & Nashelsky, Electronic Devices and Circuit Theory; Floyd, Electronic Devices (both from memory).
 *
 * @throws {RangeError} for a value that is not finite, or a reference of 0 V
 */
export function loadRegulation({ noLoadVolts, loadedVolts, ratedVolts }: LoadRegulationInput): number {
  const reference = ratedVolts ?? loadedVolts;
  demandFinite({ noLoadVolts, loadedVolts, ratedVolts: reference });
  if (reference === 0) {
    throw new RangeError(`${ratedVolts === undefined ? 'loadedVolts' : 'ratedVolts'} must not be 0 V.`);
  }
  return (noLoadVolts - loadedVolts) / reference;
}
