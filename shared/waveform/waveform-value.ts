import { type Characteristic } from '../contract/plans';
import { type WaveformValues } from '../contract/waveforms';

type Measured = Extract<Characteristic, { kind: 'measured' }>;

/** The ripple from the mean of the odd and the even peaks, where the plan asks for it and they differ. */
function rippleOfMeanPeak({ oddMean, evenMean, min, peakToPeak }: WaveformValues): number {
  return oddMean === null || evenMean === null ? peakToPeak : (oddMean + evenMean) / 2 - min;
}

/**
 * What a waveform gives of a characteristic.
 *
 * @returns SI base units: volts, or hertz
 * @throws {RangeError} in words, where a waveform gives nothing of the kind
 */
export function waveformValue(
  values: WaveformValues,
  { name, measurand, alternatePeaks }: Pick<Measured, 'name' | 'measurand' | 'alternatePeaks'>,
): number {
  switch (measurand) {
    case 'ripple':
      return alternatePeaks === 'mean' ? rippleOfMeanPeak(values) : values.peakToPeak;
    case 'ripple-rms':
      return values.rmsAc;
    case 'loaded-voltage':
    case 'no-load-voltage':
      return values.mean;
    case 'frequency':
      if (values.rippleHertz !== null) return values.rippleHertz;
      throw new RangeError('The waveform has no ripple whose frequency could be read.');
    default:
      throw new RangeError(`A waveform of the output does not give ${name}.`);
  }
}
