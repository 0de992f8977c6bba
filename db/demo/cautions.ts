/** Every caution ends by deferring to the rules of the place. */
const DEFERRING = 'Local electrical-safety rules and the site’s own procedures take precedence over this text.';

export const MAINS_CAUTION = `Mains inside. Trained persons only; keep the cover on and the instrument’s protective earth connected. ${DEFERRING}`;

export const SCOPE_CAUTION = `Mains inside. Clip the probe’s earth to the output minus only where the output is isolated, never to a live conductor; otherwise use a rated differential probe. Never lift the oscilloscope’s protective earth. ${DEFERRING}`;

export const OPEN_FRAME_CAUTION = `Live parts are open to touch. Mount the unit in the guarded fixture, close the guard before switching on, use a rated differential probe on the windings. Discharge the filter capacitors and check before touching. ${DEFERRING}`;

export const INSULATION_CAUTION = `500 V DC on the terminals. Keep hands off until the tester shows that it has discharged the unit, then check. ${DEFERRING}`;

export const HOT_CAUTION = `The case and the transformer get hot; let the unit cool before handling it. Mains inside. ${DEFERRING}`;
