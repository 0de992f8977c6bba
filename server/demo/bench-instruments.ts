import { type StagedInstrument } from './stage';

/** Oscilloscope and multimeter of each of the two benches; everything else is there once. */
const OF_BENCH = [
  ['OS-03', 'DM-11'],
  ['OS-02', 'DM-12'],
] as const;

/** The instrument of a kind that is used at a bench on a day: its own, or another one once that is past its calibration date. */
export function benchInstrument(
  instruments: readonly StagedInstrument[],
  bench: 0 | 1,
  kind: string | null,
  day: string,
): number | null {
  if (kind === null) return null;
  const good = instruments.filter((one) => one.kind === kind && one.calibrationDue >= day);
  const own = good.find(({ assetNumber }) => OF_BENCH[bench].some((other) => other === assetNumber));
  return (own ?? good[0])?.id ?? null;
}
