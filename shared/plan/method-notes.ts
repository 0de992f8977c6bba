import { type Characteristic, type Measurand } from '../contract/plans';

/** How a kind of quantity is measured, and what there is to beware of while it is. */
export interface MethodNote {
  /** In a few sentences; empty where nothing general can be said. */
  method: string;
  /** Its first sentence stands out; empty where the measurement touches no energy. */
  caution: string;
}

/** To what every measurement on live parts defers. */
const LICENSED = 'Local electrical-safety rules and licensed practice come first.';

/**
 * Method notes and cautions of each kind of measurement: shown at the bench where it is made, beside the plan's own words, and
 * in the plan. Common practice, no source.
 */
export const METHOD_NOTES: Readonly<Record<Measurand, MethodNote>> = {
  ripple: {
    method:
      'Couple the channel AC and read from trough to crest at the output terminals, with the rated load on. A wave taller than the screen is read as two halves, top and bottom apart, and added. Of a switch-mode part limit the bandwidth to 20 MHz, use the shortest tip ground and the capacitors that the plan names.',
    caution: `The probe’s earth lead is the protective earth. Clip it to the output minus only where the output is isolated. ${LICENSED}`,
  },
  'ripple-rms': {
    method:
      'Read true rms, AC coupled, or take it from whole line cycles of a captured wave. A meter that averages and scales for a sine reads a sawtooth wrong.',
    caution: `The probe’s earth lead is the protective earth. Clip it to the output minus only where the output is isolated. ${LICENSED}`,
  },
  'loaded-voltage': {
    method:
      'Measure DC at the output terminals, not at the load, so that the drop of the leads does not count. The load is set and the warm-up done before the reading.',
    caution: `Part and load get hot. Touch neither. ${LICENSED}`,
  },
  'no-load-voltage': {
    method:
      'Connect nothing but the meter. The filter capacitor charges to the peak; wait until the reading stands still, and read DC.',
    caution: `Without a load the filter stays charged. Discharge it through a resistor and check before touching. ${LICENSED}`,
  },
  'half-winding-peak': {
    method:
      'Read each half against the centre tap, DC coupled, with one probe setting for both. Both channel baselines must coincide before two channels are compared. The unit is opened for it and does not go back to stock.',
    caution: `The unit is open and its mains side is live. Only trained persons measure here, one hand away from the circuit. ${LICENSED}`,
  },
  current: {
    method:
      'Put the meter in series, on a range above the current that is expected, or read the electronic load. A fuse in the meter adds resistance; read the voltage at the terminals, not behind it.',
    caution: `Change the connection only with the supply off. ${LICENSED}`,
  },
  'input-power': {
    method:
      'Measure true power with the meter’s voltage leads at the part’s side of its current path when little is drawn, at the supply side when much is. Average over whole line cycles; for no-load power wait until it is steady.',
    caution: `The test leads carry mains voltage. Use the adapter with shrouded terminals, never bare leads. ${LICENSED}`,
  },
  'output-power': {
    method:
      'Voltage at the output terminals times the current through the load, both read at the same time, after the warm-up.',
    caution: `Part and load get hot. Touch neither. ${LICENSED}`,
  },
  'insulation-resistance': {
    method:
      'Short the mains pins together and the output pins together, apply the test voltage between them and read after the time that the plan names. Nothing else is connected.',
    caution: `The tester applies a high voltage. Keep hands off the unit during the test, and discharge it afterwards before touching. ${LICENSED}`,
  },
  'junction-potential': {
    method:
      'Diode test in both directions with the unit off: silicon reads about 0.6 to 0.7 V forward, germanium and Schottky 0.2 to 0.3 V. The same low value both ways is a short, none both ways an open junction. Other parts in parallel change the reading.',
    caution: `Only with the mains unplugged and the filter discharged. Check both before the leads are put on. ${LICENSED}`,
  },
  frequency: {
    method:
      'Trigger on the ripple and count over many periods. Full-wave ripple has twice the frequency of the line, half-wave ripple the same.',
    caution: '',
  },
  temperature: {
    method:
      'Fix the sensor to the place that the plan names and wait until the reading stands still at the rated load. Note the ambient; a rise is judged against it.',
    caution: `Surfaces may be hot enough to burn. Fix the sensor with the supply off, outside live parts. ${LICENSED}`,
  },
  dimension: { method: 'Read at right angles to the scale, with the unit unplugged.', caution: '' },
  other: { method: '', caution: '' },
};

const NO_NOTE: MethodNote = { method: '', caution: '' };

/** The note of a characteristic's kind of measurement; an empty one for what is computed or judged by eye. */
export function methodNote(characteristic: Characteristic): MethodNote {
  return characteristic.kind === 'measured' ? METHOD_NOTES[characteristic.measurand] : NO_NOTE;
}

/** The caution that stands while a characteristic is measured: the plan's own words, or else that of its kind. */
export function cautionOf(characteristic: Characteristic): string {
  return characteristic.caution === '' ? methodNote(characteristic).caution : characteristic.caution;
}
