import { computed, inject, Injectable } from '@angular/core';
import { REPEAT_REASON_TITLES } from '#shared/contract/bench';
import { formatNumber } from '#shared/quantities/format-number';
import { MOST_REPEATS } from '#shared/verdict/counting-reading';
import { LOOK_WORDS, lookOf } from '../../../ui/verdict-look';
import { BenchCursor } from '../../sheet/bench-cursor';
import { BenchSheet } from '../../sheet/bench-sheet';
import { ReadingDraft } from '../../sheet/reading-draft';
import { readingWords } from '../../sheet/reading-words';
import { readingsAt, refusedAt } from '../../sheet/unit-record';

/** What the panel says about the cell in focus: the value typed or kept, its verdict, its earlier readings. */
@Injectable()
export class PanelCell {
  private readonly sheet = inject(BenchSheet);
  private readonly cursor = inject(BenchCursor);
  private readonly draft = inject(ReadingDraft);

  readonly characteristic = computed(() => this.cursor.stop().characteristic);
  readonly judged = computed(() => {
    const verdict = this.draft.preview() ?? this.sheet.verdictOf(this.cursor.record());
    return verdict.characteristics.get(this.cursor.at().key) ?? { value: null, verdict: 'not judged' as const };
  });
  readonly number = computed(() => {
    const { value } = this.judged();
    return typeof value === 'number' ? value : null;
  });
  readonly pass = computed(() => {
    const { value } = this.judged();
    return this.draft.pass() ?? (typeof value === 'boolean' ? value : null);
  });
  readonly look = computed(() => lookOf(this.judged().verdict));
  readonly word = computed(() => LOOK_WORDS[this.look()]);
  readonly readings = computed(() => readingsAt(this.cursor.record(), this.cursor.at().key));
  readonly refused = computed(() => {
    const reading = refusedAt(this.cursor.record(), this.cursor.at().key);
    if (reading === undefined) return null;
    return { id: reading.id, what: readingWords(reading, this.characteristic()), why: reading.refusal };
  });
  readonly title = computed(() => {
    const { name, condition } = this.characteristic();
    return `Unit ${this.cursor.at().unit}, ${lowerFirst(name)}${condition === '' ? '' : ` ${condition}`}`;
  });
  readonly place = computed(() => {
    const { position, carton, setAside } = this.cursor.record();
    const aside = setAside === null ? '' : `, set aside: ${setAside}`;
    return `Position ${formatNumber(position, 0)}, carton ${formatNumber(carton, 0)}${aside}`;
  });
  /** "Repeat 1 of 2: poor contact" while a reading is being repeated. */
  readonly repeating = computed(() => {
    const repeat = this.draft.repeat();
    if (repeat === null) return '';
    return `Repeat ${this.readings().length} of ${MOST_REPEATS}: ${lowerFirst(REPEAT_REASON_TITLES[repeat.reason])}`;
  });
  readonly names = computed(() => new Map(this.sheet.bench().characteristics.map(({ key, name }) => [key, name])));
}

/** A name inside a sentence: its first letter small, unless the second says that it is an abbreviation. */
function lowerFirst(name: string): string {
  return /^[A-Z][a-z]/.test(name) ? name.charAt(0).toLowerCase() + name.slice(1) : name;
}
