import { computed, inject, Injectable, linkedSignal, signal, untracked } from '@angular/core';
import { type ReadingBody, type ReadingEntry } from '#shared/contract/bench';
import { type Characteristic } from '#shared/contract/plans';
import {
  EMPTY_SCOPE,
  heightFields,
  readScopeText,
  type ScopeText,
  scopeTextOf,
  typedFields,
} from '../../ui/scope-reader/scope-text';
import { BenchSettings } from '../bench-settings';
import { BenchCursor } from './bench-cursor';
import { BenchSheet } from './bench-sheet';
import { scopeQuantity } from './bench-reading';
import { type DraftOutcome, EMPTY_DRAFT, understood } from './draft-outcome';
import { InstrumentChoice, type RangeOutcome } from './instrument-choice';
import { countingAt } from './unit-record';

/** A captured file that is taken as the reading, and what it gave in SI base units. */
export interface TakenWaveform {
  readonly id: string;
  readonly value: number;
}

const NO_RANGE: RangeOutcome = { state: 'none' };

/** The reading being typed for the cell in focus. It begins anew wherever the focus goes. */
@Injectable()
export class ReadingDraft {
  private readonly sheet = inject(BenchSheet);
  private readonly cursor = inject(BenchCursor);
  private readonly settings = inject(BenchSettings);
  private readonly instruments = inject(InstrumentChoice);
  /** Counts the readings begun, so that the fields are cleared also where the focus stays. */
  private readonly begun = signal(0);

  /** Changes with every reading begun. */
  readonly place = computed(() => ({ ...this.cursor.at(), begun: this.begun() }));

  readonly text = linkedSignal({ source: this.place, computation: () => '' });
  readonly scope = linkedSignal<unknown, ScopeText>({
    source: this.place,
    computation: () => untracked(() => this.freshScope()),
  });
  readonly waveform = linkedSignal<unknown, TakenWaveform | null>({ source: this.place, computation: () => null });
  readonly pass = linkedSignal<unknown, boolean | null>({ source: this.place, computation: () => null });
  readonly failReason = linkedSignal({ source: this.place, computation: () => '' });
  readonly note = linkedSignal({ source: this.place, computation: () => '' });
  readonly repeat = linkedSignal<unknown, ReadingBody['repeat']>({ source: this.place, computation: () => null });

  /** Something is typed that would be lost. */
  readonly started = computed(() => {
    const heights = heightFields(this.scope().form).some((field) => this.scope()[field] !== '');
    return this.text() !== '' || heights || this.pass() !== null || this.waveform() !== null;
  });
  readonly outcome = computed(() => this.read(this.cursor.stop().characteristic));
  /** The range of what is typed. */
  readonly range = computed(() => {
    const outcome = this.outcome();
    if (outcome.state !== 'read' || typeof outcome.value !== 'number') return NO_RANGE;
    return this.instruments.rangeOf(outcome.value, outcome.entry.kind);
  });
  /** The unit's verdict with what is typed; null while there is no value. */
  readonly preview = computed(() => {
    const outcome = this.outcome();
    if (outcome.state !== 'read') return null;
    const { value, entry } = outcome;
    const worth = { value, budget: this.budgetOf(value, entry) };
    return this.sheet.verdictWith(this.cursor.record(), new Map([[this.cursor.at().key, worth]]));
  });
  /** Characteristics that would fail by keeping what is typed, computed ones too. */
  readonly newlyFailed = computed(() => {
    const before = this.sheet.verdictOf(this.cursor.record()).failed;
    const key = this.cursor.at().key;
    return (this.preview()?.failed ?? []).filter((failed) => failed === key || !before.includes(failed));
  });
  /** The fields of the scope: what is typed, else what was typed for the reading that stands here. */
  readonly scopeShown = computed(() => (this.started() ? this.scope() : (this.keptScope() ?? this.scope())));
  /** The text of a direct reading: what is typed, else what was typed for the reading that stands here. */
  readonly textShown = computed(() => (this.started() ? this.text() : this.keptText()));
  /** Whether Enter was pressed once on a nonconforming reading, so that the next one keeps it. */
  readonly armed = linkedSignal({ source: this.outcome, computation: () => false });
  /** What somebody else has just done in the very cell that is being typed in. */
  readonly meanwhile = linkedSignal({ source: this.place, computation: () => '' });
  /** Why Enter kept nothing. */
  readonly said = linkedSignal({ source: () => [this.outcome(), this.place()], computation: () => '' });

  private readonly standing = computed(() => {
    const entry = countingAt(this.cursor.record(), this.cursor.at().key)?.entry;
    return this.repeat() === null ? entry : undefined;
  });
  private readonly keptScope = computed(() => {
    const entry = this.standing();
    return entry?.kind === 'scope' ? scopeTextOf(entry.scope, entry.typed) : null;
  });
  private readonly keptText = computed(() => {
    const entry = this.standing();
    return entry?.kind === 'direct' ? entry.text : '';
  });

  /** Whether the focus may go elsewhere; where it may not, says why. */
  mayLeave(): boolean {
    if (this.started()) this.said.set('This reading is not kept yet. Enter keeps it, Esc drops it.');
    return !this.started();
  }

  /** Drops what is typed. */
  clear(): void {
    this.begun.update((count) => count + 1);
  }

  /** Puts an entry back into the fields, to be changed. */
  resume(entry: ReadingEntry): void {
    if (entry.kind === 'scope') this.scope.set(scopeTextOf(entry.scope, entry.typed));
    if (entry.kind === 'direct') this.text.set(entry.text);
  }

  private budgetOf(value: number | boolean, entry: ReadingEntry) {
    const range = this.range();
    if (range.state !== 'chosen' || typeof value !== 'number') return undefined;
    return this.sheet.budgets().ofTyped(this.cursor.stop().characteristic, value, entry, range.range);
  }

  private freshScope(): ScopeText {
    const { form, coupling, voltsPerDivision, probeFactor } = this.settings.scope();
    const usual = scopeQuantity(this.cursor.stop().characteristic) === 'ripple' ? 'ac' : 'dc';
    return {
      ...EMPTY_SCOPE,
      form: form === 'halves' || form === 'alternate' ? form : 'whole',
      coupling: coupling === 'ac' || coupling === 'dc' ? coupling : usual,
      voltsPerDivision: voltsPerDivision ?? '',
      probeFactor: probeFactor ?? '1',
    };
  }

  private read(characteristic: Characteristic): DraftOutcome {
    const waveform = this.waveform();
    if (characteristic.kind === 'computed') return EMPTY_DRAFT;
    if (characteristic.kind === 'attribute') return this.readAttribute();
    if (waveform !== null)
      return { state: 'read', entry: { kind: 'waveform', waveformId: waveform.id }, value: waveform.value };
    return characteristic.entryMode === 'scope' ? this.readScope(characteristic) : this.readDirect(characteristic);
  }

  private readAttribute(): DraftOutcome {
    const pass = this.pass();
    if (pass === null) return EMPTY_DRAFT;
    return { state: 'read', entry: { kind: 'attribute', pass, reason: pass ? '' : this.failReason() }, value: pass };
  }

  private readDirect(characteristic: Characteristic): DraftOutcome {
    const text = this.text().trim();
    if (text === '') return EMPTY_DRAFT;
    return understood({ kind: 'direct', text, decimalComma: this.settings.decimalComma }, characteristic);
  }

  private readScope(characteristic: Extract<Characteristic, { kind: 'measured' }>): DraftOutcome {
    const { decimalComma } = this.settings;
    const { alternatePeaks } = characteristic;
    const how = { quantity: scopeQuantity(characteristic), alternatePeaks, decimalComma };
    const outcome = readScopeText(this.scope(), how);
    if (outcome.kind === 'empty') return EMPTY_DRAFT;
    if (outcome.kind === 'refused') return { state: 'refused', message: outcome.message };
    return understood({ kind: 'scope', scope: outcome.entry, typed: typedFields(this.scope()) }, characteristic);
  }
}
