import { readingEntry, type ReadingEntry } from '#shared/contract/bench';
import { type Characteristic } from '#shared/contract/plans';
import { entryValue, type ReadingValue, type TypedEntry } from './bench-reading';

/** What is typed so far amounts to. */
export type DraftOutcome =
  | { readonly state: 'empty' }
  | { readonly state: 'refused'; readonly message: string }
  | { readonly state: 'read'; readonly entry: ReadingEntry; readonly value: ReadingValue };

export const EMPTY_DRAFT: DraftOutcome = { state: 'empty' };

/** What an entry is worth, or why neither the core nor the server would take it. */
export function understood(entry: TypedEntry, characteristic: Characteristic): DraftOutcome {
  const shaped = readingEntry.safeParse(entry);
  if (!shaped.success) return { state: 'refused', message: shaped.error.issues[0]?.message ?? 'This does not fit.' };
  try {
    return { state: 'read', entry, value: entryValue(entry, characteristic) };
  } catch (thrown) {
    if (thrown instanceof RangeError) return { state: 'refused', message: thrown.message };
    throw thrown;
  }
}
