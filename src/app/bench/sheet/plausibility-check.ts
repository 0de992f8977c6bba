import { computed, inject, Injectable, linkedSignal } from '@angular/core';
import { type PlausibilityAnswer, type ReadingEntry } from '#shared/contract/bench';
import { correctedBy } from '#shared/measurement/plausibility';
import { inDisplayUnit } from '#shared/quantities/display-unit';
import { scopeCure } from '../../ui/scope-reader/scope-cure';
import { type ScopeText } from '../../ui/scope-reader/scope-text';
import { readingText } from '../../ui/values/reading-text';
import { BenchSettings } from '../bench-settings';
import { type Confirmation } from '../waiting/bench-act';
import { BenchCursor } from './bench-cursor';
import { BenchSheet } from './bench-sheet';
import { ReadingDraft } from './reading-draft';
import { plausibilityOf } from './reading-plausibility';

/** The likeliest slip of what is typed, mended. */
export type DraftCure = { readonly words: string } & (
  { readonly kind: 'scope'; readonly scope: ScopeText } | { readonly kind: 'direct'; readonly text: string }
);

/** A reading that was questioned before it was kept. */
interface Questioned {
  readonly entry: ReadingEntry;
  readonly value: number;
}

/**
 * Asks about a typed reading that is far from what the part can give, before it is kept. It is corrected or confirmed with a
 * reason; both go on record with the reading.
 */
@Injectable()
export class PlausibilityCheck {
  private readonly sheet = inject(BenchSheet);
  private readonly cursor = inject(BenchCursor);
  private readonly draft = inject(ReadingDraft);
  private readonly settings = inject(BenchSettings);

  /** What the model says of what is typed; null where it says nothing, or nothing is typed. */
  readonly found = computed(() => {
    const outcome = this.draft.outcome();
    if (outcome.state !== 'read') return null;
    return plausibilityOf(this.cursor.stop().characteristic, this.sheet.bench().expected, outcome);
  });
  /** Whether the question stands before the person now; another value withdraws it. */
  readonly asking = linkedSignal({ source: this.draft.outcome, computation: () => false });
  /** The reason for which what is typed is kept all the same. */
  readonly confirmation = linkedSignal<unknown, Confirmation | null>({
    source: this.draft.outcome,
    computation: () => null,
  });
  /** What was questioned last in this cell, before it was changed. */
  private readonly questioned = linkedSignal<unknown, Questioned | null>({
    source: this.draft.place,
    computation: () => null,
  });

  /** Whether what is typed must be corrected or confirmed before it can be kept. */
  readonly needsAnswer = computed(() => this.found()?.state === 'question' && this.confirmation() === null);
  readonly cure = computed<DraftCure | null>(() => {
    const [found, outcome] = [this.found(), this.draft.outcome()];
    if (found === null || found.slip === null || outcome.state !== 'read' || typeof outcome.value !== 'number')
      return null;
    if (outcome.entry.kind === 'scope') {
      const read = { kind: 'read', entry: outcome.entry.scope, volts: outcome.value } as const;
      const cure = scopeCure(read, this.draft.scope(), found.band, found.slip);
      return cure && { kind: 'scope', words: cure.words, scope: cure.entry };
    }
    return outcome.entry.kind === 'direct' ? this.directCure(correctedBy(found.slip, outcome.value)) : null;
  });
  /** "Corrected from 19.00 V p-p", once what was questioned has been changed to what it is now. */
  readonly corrected = computed(() => {
    const [questioned, { characteristic }] = [this.questioned(), this.cursor.stop()];
    if (questioned === null || this.answer()?.answer !== 'corrected' || characteristic.kind === 'attribute') return '';
    return `Corrected from ${readingText(questioned.value, characteristic.unit, characteristic.decimals)}`;
  });
  /** The answer that goes on record with the reading as typed now; null where nothing was asked. */
  readonly answer = computed<PlausibilityAnswer | null>(() => {
    const confirmation = this.confirmation();
    if (this.found()?.state === 'question') return confirmation && { answer: 'confirmed', ...confirmation };
    const questioned = this.questioned();
    if (questioned === null || this.draft.outcome().state !== 'read') return null;
    return { answer: 'corrected', from: questioned.entry, fromValue: questioned.value };
  });

  /** Puts the question before the person. */
  ask(): void {
    this.remember();
    this.asking.set(true);
  }

  /** Takes the offered correction; false where there is none. */
  applyCure(): boolean {
    const cure = this.cure();
    if (cure === null) return false;
    this.remember();
    if (cure.kind === 'scope') this.draft.scope.set(cure.scope);
    else this.draft.text.set(cure.text);
    return true;
  }

  /** Remembers what stands now as questioned, so that a change of it is recorded as its correction. */
  remember(): void {
    const outcome = this.draft.outcome();
    if (this.found()?.state === 'question' && outcome.state === 'read' && typeof outcome.value === 'number')
      this.questioned.set({ entry: outcome.entry, value: outcome.value });
  }

  /** Takes up a reading that the server questioned, to be corrected. */
  resume({ entry, value }: Questioned): void {
    this.draft.resume(entry);
    this.questioned.set({ entry, value });
  }

  private directCure(value: number): DraftCure | null {
    const { characteristic } = this.cursor.stop();
    if (characteristic.kind !== 'measured') return null;
    const digits = String(inDisplayUnit(value, characteristic.unit));
    const text = this.settings.decimalComma ? digits.replace('.', ',') : digits;
    return { kind: 'direct', text, words: `Use ${readingText(value, characteristic.unit, characteristic.decimals)}` };
  }
}
