import { scopeEdges, type AlternatePeaks, type ScopeEntry } from '../measurement/scope-reading';
import { rectangular, type Component } from './component';
import { type DigitalRange, type GraticuleRange, type InstrumentRange } from './instrument-range';

/** How a value was read; null and other kinds are digits as they stood on a display. */
export type ReadEntry = { kind: 'scope'; scope: ScopeEntry } | { kind: 'direct' | 'waveform' | 'attribute' } | null;

/** The 1-2-5 sequence of volts per division, from 1 mV to 100 V. */
const SCALES = [-3, -2, -1, 0, 1].flatMap((power) => [1, 2, 5].map((step) => step * 10 ** power)).concat(100);

/** The origin that all readings of one range share: its error is the same for each of them. */
function originOf({ id }: InstrumentRange): string {
  return `range ${id}`;
}

function digitalBudget(value: number, range: DigitalRange): Component[] {
  const { ofReading, ofRange, counts, fullScale, resolution } = range;
  const halfWidth = ofReading * Math.abs(value) + ofRange * fullScale + counts * resolution;
  return [
    rectangular(`Accuracy of ${range.name}`, halfWidth, originOf(range)),
    rectangular('Resolution of the display', resolution / 2),
  ];
}

/** Volts for one division at the tip of the probe; of a captured file the smallest scale that shows the wave. */
function voltsPerDivision(value: number, entry: ReadEntry, { screenDivisions }: GraticuleRange): number {
  if (entry?.kind === 'scope') return entry.scope.voltsPerDivision * entry.scope.probeFactor;
  return SCALES.find((scale) => scale * screenDivisions >= Math.abs(value)) ?? 100;
}

function graticuleBudget(
  value: number,
  entry: ReadEntry,
  range: GraticuleRange,
  alternatePeaks: AlternatePeaks,
): Component[] {
  const division = voltsPerDivision(value, entry, range);
  const halfWidth = range.ofReading * Math.abs(value) + range.ofFullScale * range.screenDivisions * division;
  const accuracy = rectangular(`Accuracy of ${range.name}`, halfWidth, originOf(range));
  if (entry?.kind !== 'scope') return [accuracy];
  const edges = scopeEdges(entry.scope, alternatePeaks);
  const step = String(range.readingStep);
  return [
    accuracy,
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
  return range.form === 'digital' ? digitalBudget(value, range) : graticuleBudget(value, entry, range, alternatePeaks);
}
