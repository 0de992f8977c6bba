import { type ReadingBody, type ReadingEntry } from '#shared/contract/bench';
import { type Characteristic } from '#shared/contract/plans';

/** A reading that went wrong, and how its repeat is explained. */
export interface Slip {
  entry: ReadingEntry;
  repeat: ReadingBody['repeat'];
}

/** What a loaded output shows, of its true voltage, through a clip that barely touches. */
const THROUGH_BAD_CONTACT = 0.78;

/** The slip that happens with a reading: the probe's factor taken wrong, a clip that slips; none elsewhere. */
export function slipOf(content: Characteristic, entry: ReadingEntry): Slip | undefined {
  if (entry.kind === 'scope')
    return {
      entry: { kind: 'scope', scope: { ...entry.scope, probeFactor: entry.scope.probeFactor * 10 } },
      repeat: { reason: 'wrong-range', note: 'The probe switch was taken to stand at ×10.' },
    };
  if (entry.kind !== 'direct' || content.kind !== 'measured' || content.key !== 'v_loaded') return undefined;
  const text = (Number(entry.text) * THROUGH_BAD_CONTACT).toFixed(content.decimals);
  return {
    entry: { ...entry, text },
    repeat: { reason: 'contact', note: 'One clip of the load had slipped.' },
  };
}
