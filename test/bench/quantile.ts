/** The value below which a share of the values lies, 0.5 for the median: the nearest of them, none in between. */
export function quantile(values: readonly number[], share: number): number {
  const sorted = [...values].sort((a, b) => a - b);
  const found = sorted[Math.min(sorted.length - 1, Math.floor(share * sorted.length))];
  if (found === undefined) throw new RangeError('values must hold at least one value.');
  return found;
}

export const median = (values: readonly number[]) => quantile(values, 0.5);

/** Median with the least and the largest value, as "0.62 (0.58 to 0.66)". */
export function spread(values: readonly number[], digits: number): string {
  const [middle, least, most] = [median(values), Math.min(...values), Math.max(...values)];
  return `${middle.toFixed(digits)} (${least.toFixed(digits)} to ${most.toFixed(digits)})`;
}
