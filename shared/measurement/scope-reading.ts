/** How an oscilloscope's channel is coupled. */
export type Coupling = 'ac' | 'dc';

/** What a scope reading is of: the ripple on an output, or a level above its baseline. */
export type ScopeQuantity = 'ripple' | 'level';

interface ScopeSettings {
  /** The scale of the channel as set, in volts for one division. */
  voltsPerDivision: number;
  /** How many times the probe divides: 1, 10, 100. */
  probeFactor: number;
  coupling: Coupling;
}

/**
 * A reading taken off the screen: a whole wave, one taller than the screen as its two halves, measured apart, or the heights
 * of the two alternate peaks of a ripple whose peaks differ.
 */
export type ScopeEntry =
  | ({ form: 'whole'; divisions: number } & ScopeSettings)
  | ({ form: 'halves'; upperDivisions: number; lowerDivisions: number } & ScopeSettings)
  | ({ form: 'alternate'; higherDivisions: number; lowerDivisions: number } & ScopeSettings);

/** Which of two alternate peaks counts: the higher one, or their mean. */
export type AlternatePeaks = 'worst' | 'mean';

/** A field of a scope entry. */
export type ScopeField =
  | 'divisions'
  | 'upperDivisions'
  | 'lowerDivisions'
  | 'higherDivisions'
  | 'voltsPerDivision'
  | 'probeFactor'
  | 'coupling';

/** A scope entry that cannot be right; the message is a sentence for the person who typed it. */
export class ScopeEntryRefused extends RangeError {
  override readonly name = 'ScopeEntryRefused';

  constructor(
    readonly field: ScopeField,
    message: string,
  ) {
    super(message);
  }
}

/** No screen is taller; eight divisions are usual and ten occur (common practice, no source). */
export const MOST_DIVISIONS = 10;

const HEIGHT_NAMES = {
  divisions: 'Divisions',
  upperDivisions: 'Divisions of the upper half',
  lowerDivisions: 'Divisions of the lower half',
  higherDivisions: 'Divisions of the higher peak',
} as const;

function height(field: keyof typeof HEIGHT_NAMES, divisions: number): number {
  const name = HEIGHT_NAMES[field];
  if (!Number.isFinite(divisions)) throw new ScopeEntryRefused(field, `${name}: a number is needed.`);
  if (divisions < 0) throw new ScopeEntryRefused(field, `${name}: a height cannot be negative.`);
  if (divisions <= MOST_DIVISIONS) return divisions;
  const advice =
    field === 'divisions'
      ? 'Read the wave as two halves, or choose more volts per division.'
      : 'Choose more volts per division.';
  throw new ScopeEntryRefused(field, `${name}: no screen has more than ${MOST_DIVISIONS}. ${advice}`);
}

function positive(field: 'voltsPerDivision' | 'probeFactor', name: string, value: number): number {
  if (Number.isFinite(value) && value > 0) return value;
  throw new ScopeEntryRefused(field, `${name}: a number above 0 is needed.`);
}

function checkCoupling(coupling: Coupling, quantity: ScopeQuantity): void {
  if (quantity === 'ripple' && coupling !== 'ac') {
    throw new ScopeEntryRefused(
      'coupling',
      'Coupling: ripple is read AC-coupled. Set the channel to AC and read again.',
    );
  }
  if (quantity === 'level' && coupling !== 'dc') {
    throw new ScopeEntryRefused(
      'coupling',
      'Coupling: a DC level is read DC-coupled. Set the channel to DC and read again.',
    );
  }
}

/** Heights read off the screen, in divisions, and how each enters the result. */
function heights(entry: ScopeEntry, alternatePeaks: AlternatePeaks): { divisions: number; weight: number }[] {
  switch (entry.form) {
    case 'whole':
      return [{ divisions: height('divisions', entry.divisions), weight: 1 }];
    case 'halves':
      return [
        { divisions: height('upperDivisions', entry.upperDivisions), weight: 1 },
        { divisions: height('lowerDivisions', entry.lowerDivisions), weight: 1 },
      ];
    case 'alternate': {
      const higher = height('higherDivisions', entry.higherDivisions);
      const lower = height('lowerDivisions', entry.lowerDivisions);
      if (alternatePeaks === 'worst') return [{ divisions: Math.max(higher, lower), weight: 1 }];
      return [higher, lower].map((divisions) => ({ divisions, weight: 1 / 2 }));
    }
  }
}

/**
 * The edges that were read off the graticule, each with the weight at which its error enters the result: two a height, and
 * half as much of each where the mean of two heights counts.
 *
 * @throws {ScopeEntryRefused} naming the field, in words
 */
export function scopeEdges(entry: ScopeEntry, alternatePeaks: AlternatePeaks = 'worst'): number[] {
  return heights(entry, alternatePeaks).flatMap(({ weight }) => [weight, weight]);
}

/**
 * The voltage of a reading taken off an oscilloscope's screen, in volts.
 *
 *     divisions × volts per division × probe factor
 *
 * A wave taller than the screen is read as two halves whose heights add; of two alternate peaks the higher counts, or their mean. The product is rounded to twelve significant
 * digits, so that 3 divisions at 0.1 V give 0.3 V without a trace of binary arithmetic.
 * Common practice, no source.
 *
 * @param options.alternatePeaks which of two alternate peaks counts; the higher one unless the plan says otherwise
 * @param options.quantity what is read, where the coupling is to be checked: ripple is AC-coupled, a DC level never is
 * @throws {ScopeEntryRefused} naming the field, in words
 */
export function scopeVolts(
  entry: ScopeEntry,
  { quantity, alternatePeaks = 'worst' }: { quantity?: ScopeQuantity; alternatePeaks?: AlternatePeaks } = {},
): number {
  if (quantity !== undefined) checkCoupling(entry.coupling, quantity);
  const divisions = heights(entry, alternatePeaks).reduce((sum, each) => sum + each.weight * each.divisions, 0);
  const scale = positive('voltsPerDivision', 'Volts per division', entry.voltsPerDivision);
  const probe = positive('probeFactor', 'Probe factor', entry.probeFactor);
  return Number((divisions * scale * probe).toPrecision(12));
}
