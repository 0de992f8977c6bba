/** One value that an audit entry records as changed; null where there was or is none. */
export interface EntryChange {
  readonly name: string;
  readonly before: string | null;
  readonly after: string | null;
}

/** What differs between the recorded state before and after, value by value, each under a name in words. */
export function entryChanges(before: unknown, after: unknown): EntryChange[] {
  const [earlier, later] = [leavesOf(before), leavesOf(after)];
  return [...new Set([...earlier.keys(), ...later.keys()])]
    .map((name) => ({ name, before: earlier.get(name) ?? null, after: later.get(name) ?? null }))
    .filter((change) => change.before !== change.after);
}

/** The single values inside a recorded state, by their place in words: "characteristics 3, upper limit". */
function leavesOf(value: unknown, place: readonly string[] = []): Map<string, string> {
  if (value === null || value === undefined) return new Map();
  if (Array.isArray(value)) {
    const plain = value.every((item) => typeof item !== 'object' || item === null);
    if (plain) return new Map([[nameOf(place), value.map(textOf).join(', ')]]);
    return merged(
      value.map((item, index) => leavesOf(item, [...place.slice(0, -1), `${place.at(-1) ?? ''} ${index + 1}`])),
    );
  }
  if (typeof value === 'object') {
    return merged(Object.entries(value).map(([key, item]) => leavesOf(item, [...place, wordsOf(key)])));
  }
  return new Map([[nameOf(place), textOf(value)]]);
}

function merged(maps: readonly Map<string, string>[]): Map<string, string> {
  return new Map(maps.flatMap((map) => [...map]));
}

function nameOf(place: readonly string[]): string {
  return place.length === 0 ? 'value' : place.join(', ').trim();
}

/** "upperLimit" reads "upper limit". */
function wordsOf(key: string): string {
  return key.replace(/([a-z0-9])([A-Z])/g, (_, end: string, start: string) => `${end} ${start.toLowerCase()}`);
}

function textOf(value: unknown): string {
  if (value === true) return 'yes';
  if (value === false) return 'no';
  return value === null ? 'none' : String(value);
}
