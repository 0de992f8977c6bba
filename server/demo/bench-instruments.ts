import { type StagedInstrument } from './stage';

/** Oscilloscopes and multimeter of each of the two benches, the first one while it is in use; all else is there once. */
const OF_BENCH = [
  ['OS-03', 'DM-11'],
  ['OS-01', 'OS-02', 'DM-12'],
] as const;

/** The instrument of a kind that is used at a bench on a day: its own, or another one once that is past its calibration date. */
export function benchInstrument(
  instruments: readonly StagedInstrument[],
  bench: 0 | 1,
  kind: string | null,
  day: string,
): number | null {
  if (kind === null) return null;
  const inUse = ({ calibrationDue, usedUntil }: StagedInstrument) =>
    calibrationDue >= day && (usedUntil === null || usedUntil >= day);
  const good = instruments.filter((one) => one.kind === kind && inUse(one));
  const own = OF_BENCH[bench].flatMap((name) => good.filter(({ assetNumber }) => assetNumber === name));
  return (own[0] ?? good[0])?.id ?? null;
}
