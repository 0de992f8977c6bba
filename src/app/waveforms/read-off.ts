import { type Characteristic } from '#shared/contract/plans';

/** What can be read off a waveform. */
const READ_OFF: readonly string[] = ['ripple', 'ripple-rms', 'loaded-voltage', 'no-load-voltage', 'frequency'];

/** Whether readings of a characteristic can be taken from a waveform. */
export function isReadOff(characteristic: Characteristic): boolean {
  return characteristic.kind === 'measured' && READ_OFF.includes(characteristic.measurand);
}
