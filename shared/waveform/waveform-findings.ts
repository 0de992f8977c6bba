import { type WaveformAnalysis, type WaveformFinding } from '../contract/waveforms';
import { formatQuantity } from '../quantities/format-quantity';
import { type RecordQuality } from './record-quality';

/** What a waveform is judged against. */
export interface WaveformContext {
  topology: string;
  ratedVolts: number;
  /** Lowest and highest ripple that sound units of the part give, in volts peak to peak; null where it is not known. */
  expectedRipple: { low: number; high: number } | null;
  /** The plan's own limit of the alternate-peak difference in volts, where it has one. */
  alternateLimit: number | null;
}

/**
 * A record with a fiftieth of its samples at one end of the range is cut off there: a rounded top of a ripple lies within
 * its highest hundredth for less (common practice, no source).
 */
export const CLIPPED_SHARE = 0.02;
/** Fewer samples in a period cannot follow it: an eighth of a period moves a sine by 70 % of its amplitude. */
export const LEAST_PER_PERIOD = 8;
/** The capacitor charges for about a tenth of a line cycle; fewer samples in a cycle may miss its top. */
export const LEAST_PER_CYCLE = 40;
/** With fewer levels a ripple is read to no better than an eighth of itself. */
export const LEAST_LEVELS = 8;
/** One line cycle does not show that what differs between its halves comes again. */
export const LEAST_CYCLES = 2;
/** Between one peak and two to the line cycle: a peak that is missed here and there does not make a diode open. */
export const ONE_OR_TWO = 1.5;
/** With more than this to the cycle the peaks are not those of a rectifier. */
export const MOST_PER_CYCLE = 2.2;
/**
 * Halves of a winding are usually wound to within 2 % of each other; peaks that differ by more than that share of the
 * rated voltage do not come of sound halves (common practice, no source). A plan's own limit goes before it.
 */
export const UNEQUAL_SHARE = 0.02;

const volts = (value: number) => formatQuantity(value, 'V', { significant: 3 });
const hertz = (value: number) => formatQuantity(value, 'Hz');
const percent = (share: number) => `${Number((share * 100).toPrecision(2))}\u202f%`;

/** Why the record cannot be judged. */
function recordFaults(quality: RecordQuality): WaveformFinding[] {
  const faults: WaveformFinding[] = [];
  const { flatTop, flatBottom, levels, samplesPerPeriod, samplesPerCycle, lineCycles } = quality;
  const flat = Math.max(flatTop, flatBottom);
  if (levels > 1 && levels >= LEAST_LEVELS && flat >= CLIPPED_SHARE)
    faults.push({
      kind: 'clipped',
      evidence: `${percent(flat)} of the samples lie flat at the ${flatTop >= flatBottom ? 'top' : 'bottom'} of the range.`,
      cause: 'The wave left the screen: choose more volts per division, or move it, and capture it again.',
    });
  if (levels >= LEAST_LEVELS && samplesPerPeriod < LEAST_PER_PERIOD)
    faults.push({
      kind: 'aliased',
      evidence: `What changes most has about ${samplesPerPeriod.toFixed(1)} samples in its period.`,
      cause: 'It is sampled too slowly, or there is nothing but noise: sample faster, or limit the bandwidth.',
    });
  else if (samplesPerCycle < LEAST_PER_CYCLE)
    faults.push({
      kind: 'aliased',
      evidence: `A line cycle has ${Math.floor(samplesPerCycle)} samples; at least ${LEAST_PER_CYCLE} are needed.`,
      cause: 'It is sampled too slowly to show the peaks: sample faster.',
    });
  if (levels < LEAST_LEVELS)
    faults.push({
      kind: 'too-coarse',
      evidence: levels === 1 ? 'All samples have the same value.' : `Only ${levels} different values occur.`,
      cause:
        'The ripple is too small for the scale, or the input is not connected: choose AC coupling and fewer volts per division.',
    });
  if (lineCycles < LEAST_CYCLES)
    faults.push({
      kind: 'too-short',
      evidence: `The record holds ${lineCycles === 0 ? 'no whole line cycle' : 'one whole line cycle'}.`,
      cause: `Capture at least ${LEAST_CYCLES} line cycles: choose more time per division.`,
    });
  return faults;
}

/** What peaks say of the two halves, where the part has two. */
function halvesFinding(
  { peaksPerCycle, rippleHertz, alternateDifference, lineCycles }: WaveformAnalysis,
  { topology, ratedVolts, alternateLimit }: WaveformContext,
): WaveformFinding | null {
  if (topology !== 'centre-tap' && topology !== 'bridge') return null;
  if (peaksPerCycle === 0 || peaksPerCycle > MOST_PER_CYCLE) return null;
  const isTap = topology === 'centre-tap';
  if (peaksPerCycle < ONE_OR_TWO)
    return {
      kind: 'one-half-open',
      evidence: `One peak in a line cycle over ${lineCycles} cycles, where two are due; the ripple has ${rippleHertz === null ? 'no frequency of its own' : hertz(rippleHertz)}.`,
      cause: `One half does not conduct: an open diode, an open ${isTap ? 'half-winding' : 'path of the bridge'}, or halves so unequal that the lower one never conducts. Beyond the droop of the capacitor these look alike.`,
    };
  const limit = alternateLimit ?? UNEQUAL_SHARE * ratedVolts;
  if (alternateDifference === null || alternateDifference <= limit) return null;
  const stated = alternateLimit === null ? `${percent(UNEQUAL_SHARE)} of the rated voltage` : 'the limit of the plan';
  return {
    kind: isTap ? 'unequal-halves' : 'unequal-paths',
    evidence: `Both halves conduct, and their peaks are ${volts(alternateDifference)} apart, more than ${stated} (${volts(limit)}).`,
    cause: isTap
      ? 'The halves of the winding are unequal, or a diode of one half drops more than the other.'
      : 'The paths of the bridge are unequal: diodes that differ, a bad joint, or an unsymmetrical mains.',
  };
}

/** What the size of the ripple says, where the peaks agree. */
function sizeFinding({ peakToPeak }: WaveformAnalysis, { expectedRipple }: WaveformContext): WaveformFinding {
  if (expectedRipple === null)
    return {
      kind: 'nothing-unusual',
      evidence: `The ripple is ${volts(peakToPeak)} peak to peak; what this part ought to give is not known.`,
      cause: 'Nothing points to a fault of the rectifier.',
    };
  const { low, high } = expectedRipple;
  const band = `${volts(low)} to ${volts(high)}`;
  const seen = `The ripple is ${volts(peakToPeak)} peak to peak; sound units of this part give ${band}.`;
  if (peakToPeak > high)
    return {
      kind: 'capacitance-low-or-load-high',
      evidence: seen,
      cause: 'The filter capacitance is low, or the load draws more than the rated current.',
    };
  if (peakToPeak < low)
    return {
      kind: 'load-missing',
      evidence: seen,
      cause: 'The load is missing, or draws less than the rated current.',
    };
  return { kind: 'nothing-unusual', evidence: seen, cause: 'Nothing points to a fault of the rectifier.' };
}

/**
 * What a waveform is found to be, the first that holds: a record that cannot be judged (with all that is wrong with it),
 * a half that does not conduct, halves that differ, a ripple too large or too small. The strongest line component alone
 * decides nothing: unequal halves have it at the line frequency as an open one has.
 */
export function waveformFindings(
  analysis: WaveformAnalysis,
  quality: RecordQuality,
  context: WaveformContext,
): WaveformFinding[] {
  const faults = recordFaults(quality);
  if (faults.length > 0) return faults;
  return [halvesFinding(analysis, context) ?? sizeFinding(analysis, context)];
}
