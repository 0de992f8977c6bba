import { formatNumber } from '#shared/quantities/format-number';

/** The size of a file as people say it: 812 B, 48 kB, 2.4 MB. */
export function byteCount(bytes: number): string {
  if (bytes < 1000) return `${bytes}\u00a0B`;
  if (bytes < 999_500) return `${formatNumber(bytes / 1000, 0)}\u00a0kB`;
  return `${formatNumber(bytes / 1e6, 1)}\u00a0MB`;
}
