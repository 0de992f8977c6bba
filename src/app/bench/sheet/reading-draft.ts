import { computed, inject, Injectable, linkedSignal, signal, untracked } from '@angular/core';
import { readingEntry, type ReadingBody, type ReadingEntry } from '#shared/contract/bench';
import { type Characteristic } from '#shared/contract/plans';
import { EMPTY_SCOPE, heightFields, readScopeText, type ScopeText } from '../../ui/scope-reader/scope-text';
import { BenchSettings } from '../bench-settings';
import { BenchCursor } from './bench-cursor';
import { BenchSheet } from './bench-sheet';
import { entryValue, type ReadingValue, scopeQuantity } from './bench-reading';

/** What is typed so far amounts to. */
export type DraftOutcome =
  | { readonly state: 'empty' }
  | { readonly state: 'refused'; readonly message: string }
  | { readonly state: 'read'; readonly entry: ReadingEntry; readonly value: ReadingValue };

const EMPTY: DraftOutcome = { state: 'empty' };

/** The reading being typed for the cell in focus. It begins anew wherever the focus goes. */
@Injectable()
export class ReadingDraft {
  private readonly sheet = inject(BenchSheet);
  private readonly cursor = inject(BenchCursor);
  private readonly settings = inject(BenchSettings);
  /** Counts the readings begun, so that the fields are cleared also where the focus stays. */
  private readonly begun = signal(0);
  private readonly place = computed(() => ({ ...this.cursor.at(), begun: this.begun() }));

  readonly text = linkedSignal({ source: this.place, computation: () => '' });
  readonly scope = linkedSignal<unknown, ScopeText>({
    source: this.place,
    computation: () => untracked(() => this.freshScope()),
  });
  readonly pass = linkedSignal<unknown, boolean | null>({ source: this.place, computation: () => null });
  readonly failReason = linkedSignal({ source: this.place, computation: () => '' });
  readonly note = linkedSignal({ source: this.place, computation: () => '' });
  readonly repeat = linkedSignal<unknown, ReadingBody['repeat']>({ source: this.place, computation: () => null });

  /** Something is typed that would be lost. */
  readonly started = computed(() => {
    const heights = heightFields(this.scope().form).some((field) => this.scope()[field] !== '');
    return this.text() !== '' || heights || this.pass() !== null;
  });
  readonly outcome = computed(() => this.read(this.cursor.stop().characteristic));
  /** The unit's verdict with what is typed; null while there is no value. */
  readonly preview = computed(() => {
    const outcome = this.outcome();
    if (outcome.state !== 'read') return null;
    return this.sheet.verdictWith(this.cursor.record(), this.cursor.at().key, outcome.value);
  });
  /** Characteristics that would fail by keeping what is typed, computed ones too. */
  readonly newlyFailed = computed(() => {
    const before = this.sheet.verdictOf(this.cursor.record()).failed;
    const key = this.cursor.at().key;
    return (this.preview()?.failed ?? []).filter((failed) => failed === key || !before.includes(failed));
  });
  /** Whether Enter was pressed once on a nonconforming reading, so that the next one keeps it. */
  readonly armed = linkedSignal({ source: this.outcome, computation: () => false });
  /** Why Enter kept nothing. */
  readonly said = linkedSignal({ source: () => [this.outcome(), this.place()], computation: () => '' });

  /** Whether the focus may go elsewhere; where it may not, says why. */
  mayLeave(): boolean {
    if (this.started()) this.said.set('This reading is not kept yet. Enter keeps it, Esc drops it.');
    return !this.started();
  }

  /** Drops what is typed. */
  clear(): void {
    this.begun.update((count) => count + 1);
  }

  private freshScope(): ScopeText {
    const { form, coupling, voltsPerDivision, probeFactor } = this.settings.scope();
    const usual = scopeQuantity(this.cursor.stop().characteristic) === 'ripple' ? 'ac' : 'dc';
    return {
      ...EMPTY_SCOPE,
      form: form === 'halves' ? 'halves' : 'whole',
      coupling: coupling === 'ac' || coupling === 'dc' ? coupling : usual,
      voltsPerDivision: voltsPerDivision ?? '',
      probeFactor: probeFactor ?? '1',
    };
  }

  private read(characteristic: Characteristic): DraftOutcome {
    if (characteristic.kind === 'computed') return EMPTY;
    if (characteristic.kind === 'attribute') return this.readAttribute();
    return characteristic.entryMode === 'scope' ? this.readScope(characteristic) : this.readDirect(characteristic);
  }

  private readAttribute(): DraftOutcome {
    const pass = this.pass();
    if (pass === null) return EMPTY;
    return { state: 'read', entry: { kind: 'attribute', pass, reason: pass ? '' : this.failReason() }, value: pass };
  }

  private readDirect(characteristic: Characteristic): DraftOutcome {
    const text = this.text().trim();
    if (text === '') return EMPTY;
    return understood({ kind: 'direct', text, decimalComma: this.settings.decimalComma }, characteristic);
  }

  private readScope(characteristic: Characteristic): DraftOutcome {
    const outcome = readScopeText(this.scope(), scopeQuantity(characteristic));
    if (outcome.kind === 'empty') return EMPTY;
    if (outcome.kind === 'refused') return { state: 'refused', message: outcome.message };
    return understood({ kind: 'scope', scope: outcome.entry }, characteristic);
  }
}

/** What an entry is worth, or why neither the core nor the server would take it. */
function understood(entry: ReadingEntry, characteristic: Characteristic): DraftOutcome {
  const shaped = readingEntry.safeParse(entry);
  if (!shaped.success) return { state: 'refused', message: shaped.error.issues[0]?.message ?? 'This does not fit.' };
  try {
    return { state: 'read', entry, value: entryValue(entry, characteristic) };
  } catch (thrown) {
    if (thrown instanceof RangeError) return { state: 'refused', message: thrown.message };
    throw thrown;
  }
}
