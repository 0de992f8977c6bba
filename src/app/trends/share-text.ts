import { formatNumber } from '#shared/quantities/format-number';

const SPACE = '\u00a0';

/**
 * A part of a whole in percent with one decimal. What is not all never reads 100 %, and what is not none never reads 0 %.
 * Empty when there is no whole.
 */
export function shareText(part: number, whole: number): string {
  if (whole === 0) return '';
  const tenths = Math.round((part / whole) * 1000);
  const shown = part === whole || part === 0 ? tenths : Math.min(Math.max(tenths, 1), 999);
  return `${formatNumber(shown / 10, 1)}${SPACE}%`;
}
