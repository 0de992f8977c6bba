/** What always stands in view: who may measure, and to what every caution defers. */
export const TRAINED_ONLY = 'Trained persons only. Site rules come first.';

/**
 * The usual cautions of measuring mains-powered supplies, as they stand beside every measurement whose plan or kind states a
 * caution. Common practice, no source; the last sentences say to what they defer.
 */
export const MAINS_CAUTIONS: readonly string[] = [
  'Never lift the protective earth of an instrument.',
  'The earth lead of an oscilloscope probe goes to no live conductor, and to the output minus only where the output is isolated; otherwise use a rated differential probe.',
  'An isolating transformer removes the protection of a residual-current device behind it.',
  'Discharge filter capacitors, also after an insulation test, and check before touching.',
  'A withstand tester needs its interlock and an assistant who knows the emergency stop.',
  'Parts may be hot. An opened adapter does not go back to stock.',
  'Local electrical-safety rules, the procedures of the site and licensed practice take precedence over this program.',
  'A certificate states that the sampled lot conforms to its plan; it is no product-safety approval.',
];
