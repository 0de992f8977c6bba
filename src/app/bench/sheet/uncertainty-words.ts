import { type ReadingEntry } from '#shared/contract/bench';
import { type Characteristic } from '#shared/contract/plans';
import { scopeEdges } from '#shared/measurement/scope-reading';
import { type DigitalRange, type GraticuleRange, type InstrumentRange } from '#shared/uncertainty/instrument-range';

/** What the uncertainty of a reading consists of, in a few words: "k = 2, scope 3 %, 2 × 0.1 div". */
export function uncertaintyReason(
  range: InstrumentRange,
  entry: ReadingEntry | null,
  characteristic: Characteristic,
  coverageFactor: number,
): string {
  const parts = range.form === 'graticule' ? screenParts(range, entry, characteristic) : displayParts(range);
  return [`k = ${coverageFactor}`, ...parts].join(', ');
}

function screenParts(range: GraticuleRange, entry: ReadingEntry | null, characteristic: Characteristic): string[] {
  const { ofReading, ofFullScale, readingStep } = range;
  const accuracy = `scope ${sum([percent(ofReading), share(ofFullScale, 'of screen')])}`;
  if (entry?.kind !== 'scope') return [accuracy];
  const alternatePeaks = characteristic.kind === 'measured' ? characteristic.alternatePeaks : undefined;
  const edges = scopeEdges(entry.scope, alternatePeaks).length;
  return [accuracy, `${edges} × ${readingStep} div`];
}

function displayParts({ ofReading, ofRange, counts }: DigitalRange): string[] {
  const digits = counts === 0 ? '' : `${counts} ${counts === 1 ? 'count' : 'counts'}`;
  return [sum([share(ofReading, ''), share(ofRange, 'of range'), digits])];
}

function sum(parts: readonly string[]): string {
  return parts.filter((part) => part !== '').join(' + ');
}

function share(fraction: number, of: string): string {
  return fraction === 0 ? '' : `${percent(fraction)} ${of}`.trim();
}

function percent(fraction: number): string {
  return `${Number((fraction * 100).toPrecision(3))}\u00a0%`;
}
