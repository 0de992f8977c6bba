import { scopeEdges, type AlternatePeaks, type ScopeEntry } from '../measurement/scope-reading';
import { rectangular, type Component } from './component';
import { type DigitalRange, type GraticuleRange, type InstrumentRange } from './instrument-range';

/**
 * How a value was read; null and other kinds are digits as they stood on a display. Of a captured file the resolution of its
 * samples in volts, where it is known.
 */
export type ReadEntry =
  | { kind: 'scope'; scope: ScopeEntry }
  | { kind: 'waveform'; resolution?: number }
  | { kind: 'direct' | 'attribute' }
  | null;

/** The 1-2-5 sequence of volts per division, from 1 mV to 100 V. */
const SCALES = [-3, -2, -1, 0, 1].flatMap((power) => [1, 2, 5].map((step) => step * 10 ** power)).concat(100);

/**
 * The accuracy of a range: the share of the reading is its gain error, all else its zero error, and both are the same for
 * every reading of the origin.
 */
function accuracy({ name, ofReading }: InstrumentRange, value: number, constant: number, origin: string): Component {
  const gain = ofReading * value;
  return rectangular(`Accuracy of ${name}`, Math.abs(gain) + constant, origin, gain);
}

/** A peak-to-peak value out of a captured file lies between two samples, each read to the file's resolution. */
function sampleResolution(entry: ReadEntry): Component[] {
  if (entry?.kind !== 'waveform' || entry.resolution === undefined) return [];
  const half = entry.resolution / 2;
  return ['Higher', 'Lower'].map((edge) => rectangular(`${edge} sample, resolution of the file`, half));
}

function digitalBudget(value: number, entry: ReadEntry, range: DigitalRange): Component[] {
  const { ofRange, counts, fullScale, resolution } = range;
  const own = accuracy(range, value, ofRange * fullScale + counts * resolution, `range ${range.id}`);
  if (entry?.kind === 'waveform') return [own, ...sampleResolution(entry)];
  return [own, rectangular('Resolution of the display', resolution / 2)];
}

/** The smallest scale, in volts per division, on which a screen shows a wave of this height. */
export function smallestScale(height: number, screenDivisions: number): number {
  return SCALES.find((scale) => scale * screenDivisions >= Math.abs(height)) ?? 100;
}

/** Volts for one division at the tip of the probe; of a captured file the smallest scale that shows the wave. */
function voltsPerDivision(value: number, entry: ReadEntry, { screenDivisions }: GraticuleRange): number {
  if (entry?.kind === 'scope') return entry.scope.voltsPerDivision * entry.scope.probeFactor;
  return smallestScale(value, screenDivisions);
}

function graticuleBudget(
  value: number,
  entry: ReadEntry,
  range: GraticuleRange,
  alternatePeaks: AlternatePeaks,
): Component[] {
  const division = voltsPerDivision(value, entry, range);
  const constant = range.ofFullScale * range.screenDivisions * division;
  // Each scale of the attenuator has an error of its own, so that readings of two scales share nothing.
  const own = accuracy(range, value, constant, `range ${range.id} at ${division} V per division`);
  if (entry?.kind !== 'scope') return [own, ...sampleResolution(entry)];
  const edges = scopeEdges(entry.scope, alternatePeaks);
  const step = String(range.readingStep);
  return [
    own,
    ...edges.map((weight, index) =>
      rectangular(
        `Edge ${index + 1} of ${edges.length}, read to ${step} division`,
        (weight * range.readingStep * division) / 2,
      ),
    ),
  ];
}

/**
 * The uncertainty budget of one reading: the accuracy specification of its range, whose terms add linearly to one
 * half-width, and the resolution of the display or of the graticule at each edge.
 *
 *     a = share of reading · |x| + share of range · full scale + counts · resolution        u = a / √3
 *     resolution δ: u = δ / √12        graticule step r at each edge: u = r · V/div · probe / √12
 *
 * The accuracy is one component whose origin is the range (for a screen: the range at one scale), so that two readings of it
 * share one gain error, which follows the value with its sign, and one zero error. Resolutions are each reading's own.
 *
 * Source: JCGM 100:2008, 4.3.7 and F.2.2.1; EA-4/02 S9. Half a minor division as reading step: common practice, no source.
 *
 * @param value in the SI base unit of the range
 * @throws {RangeError} for a value that is not finite
 */
export function readingBudget(
  value: number,
  entry: ReadEntry,
  range: InstrumentRange,
  alternatePeaks: AlternatePeaks = 'worst',
): Component[] {
  if (!Number.isFinite(value)) throw new RangeError('value must be a number.');
  return range.form === 'digital'
    ? digitalBudget(value, entry, range)
    : graticuleBudget(value, entry, range, alternatePeaks);
}
