import { type Characteristic } from '#shared/contract/plans';
import { formatLimits } from '#shared/quantities/format-quantity';
import { readingText } from '../../ui/values/reading-text';
import { type BenchSheet } from './bench-sheet';
import { type ReadingDraft } from './reading-draft';

/** What keeping the typed reading would make nonconforming, and whether it would stop the lot; empty where nothing would. */
export function failureWords(sheet: BenchSheet, draft: ReadingDraft): string {
  const preview = draft.preview();
  const failed = draft.newlyFailed();
  if (preview === null || failed.length === 0) return '';
  const what = failed.map((key) => {
    const characteristic = sheet.bench().characteristics.find((each) => each.key === key);
    return nonconformingWords(characteristic, preview.characteristics.get(key)?.value);
  });
  const stops = !sheet.lot().stop && sheet.lotWith([preview]).stop;
  return `${what.join('. ')}.${stops ? ' It reaches the rejection number.' : ''}`;
}

function nonconformingWords(
  characteristic: Characteristic | undefined,
  value: number | boolean | null | undefined,
): string {
  if (characteristic === undefined || characteristic.kind === 'attribute') return 'Nonconforming';
  const { name, unit, decimals, lowerLimit, upperLimit } = characteristic;
  const shown = typeof value === 'number' ? readingText(value, unit, decimals) : 'no value';
  return `Nonconforming: ${name} ${shown}, ${formatLimits(lowerLimit, upperLimit, unit, decimals)}`;
}
