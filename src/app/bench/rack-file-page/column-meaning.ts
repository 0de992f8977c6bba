import { type Characteristic } from '#shared/contract/plans';

/** What a column holds: the unit's number, a characteristic by its key, or nothing that is wanted (null). */
export type Meaning = string | null;

/** The unit's number, as the contract names it. */
export const UNIT = 'unit';

/** A characteristic that a file can hold. */
export type TypedCharacteristic = Exclude<Characteristic, { kind: 'computed' }>;

export function typedOf(characteristics: readonly Characteristic[]): TypedCharacteristic[] {
  return characteristics.filter((each): each is TypedCharacteristic => each.kind !== 'computed');
}

/** What a column of a characteristic holds, in words. */
export function holdsWords(characteristic: TypedCharacteristic): string {
  const { name, condition } = characteristic;
  const what = condition === '' ? name : `${name} ${condition}`;
  return characteristic.kind === 'attribute' ? `${what}: pass or fail` : `${what}, in ${characteristic.unit}`;
}

/** Letters and digits alone, without a unit in brackets: "V loaded [V]" and "v_loaded" are one. */
function plain(text: string): string {
  return text
    .toLowerCase()
    .replaceAll(/[[(].*?[\])]/g, '')
    .replaceAll(/[^\p{L}\p{N}]/gu, '');
}

/** What a heading says by itself; undefined where it says nothing that the plan knows. */
function saidBy(header: string, typed: readonly TypedCharacteristic[]): string | undefined {
  const words = plain(header);
  if (words === UNIT || words === 'unitnumber') return UNIT;
  return typed.find(({ key, name }) => key === header || plain(key) === words || plain(name) === words)?.key;
}

/** What is known of columns before anybody says it. */
interface Known {
  characteristics: readonly Characteristic[];
  /** What the rack's files held before, by heading. */
  remembered: Readonly<Record<string, Meaning>>;
}

function rememberedFor(header: string, { remembered }: Known, typed: readonly TypedCharacteristic[]) {
  if (!Object.hasOwn(remembered, header)) return undefined;
  const meaning = remembered[header] ?? null;
  const isKnown = meaning === null || meaning === UNIT || typed.some(({ key }) => key === meaning);
  return isKnown ? meaning : undefined;
}

/**
 * What each column of a file holds, as far as it is known: what the person said, else what was remembered with the rack, else
 * what the heading says by itself. A meaning goes to one column only, the one of which it is known best.
 */
export function columnMeanings(
  headers: readonly string[],
  said: ReadonlyMap<string, Meaning>,
  known: Known,
): Map<string, Meaning> {
  const typed = typedOf(known.characteristics);
  const meanings = new Map<string, Meaning>();
  const taken = new Set<string>();
  const settle = (header: string, meaning: Meaning | undefined) => {
    if (meaning === undefined || meanings.has(header) || (meaning !== null && taken.has(meaning))) return;
    meanings.set(header, meaning);
    if (meaning !== null) taken.add(meaning);
  };
  for (const header of headers) {
    const meaning = said.get(header);
    if (meaning === undefined) continue;
    // What a person says stands, also where it is said of two columns: the fault is shown beside them.
    meanings.set(header, meaning);
    if (meaning !== null) taken.add(meaning);
  }
  for (const header of headers) settle(header, rememberedFor(header, known, typed));
  for (const header of headers) settle(header, saidBy(header, typed));
  return meanings;
}
