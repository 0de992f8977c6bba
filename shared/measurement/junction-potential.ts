import { demandFinite } from './reading-not-finite';

/** What a diode test shows a junction to be. */
export type JunctionKind =
  'shorted' | 'germanium or Schottky' | 'silicon' | 'light-emitting or several in series' | 'open';

/**
 * Names the kind of junction by its potential in volts at the small current of a diode test.
 *
 * Below 0.05 V shorted; 0.05 to 0.45 V germanium or Schottky (0.2 to 0.3 V usual); to 0.9 V silicon (0.6 to 0.7 V usual);
 * to 2.5 V several junctions or a light-emitting diode; above, or no reading, open. Common practice, no source.
 *
 * @throws {RangeError} for a value that is not finite
 */
export function junctionKind(volts: number): JunctionKind {
  demandFinite({ volts });
  const size = Math.abs(volts);
  if (size < 0.05) return 'shorted';
  if (size <= 0.45) return 'germanium or Schottky';
  if (size <= 0.9) return 'silicon';
  return size <= 2.5 ? 'light-emitting or several in series' : 'open';
}
