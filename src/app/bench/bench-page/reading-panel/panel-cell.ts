import { computed, inject, Injectable } from '@angular/core';
import { REPEAT_REASON_TITLES } from '#shared/contract/bench';
import { formatNumber } from '#shared/quantities/format-number';
import { MOST_REPEATS } from '#shared/verdict/counting-reading';
import { LOOK_WORDS, lookOf } from '../../../ui/verdict-look';
import { BenchCursor } from '../../sheet/bench-cursor';
import { BenchSheet } from '../../sheet/bench-sheet';
import { PlausibilityCheck } from '../../sheet/plausibility-check';
import { ReadingDraft } from '../../sheet/reading-draft';
import { plausibilityOf } from '../../sheet/reading-plausibility';
import { countingAt, isOpenQuestion, readingsAt, refusedAt } from '../../sheet/unit-record';

/** What the panel says about the cell in focus: the value typed or kept, its verdict, its earlier readings. */
@Injectable()
export class PanelCell {
  private readonly sheet = inject(BenchSheet);
  private readonly cursor = inject(BenchCursor);
  private readonly draft = inject(ReadingDraft);
  private readonly check = inject(PlausibilityCheck);

  readonly characteristic = computed(() => this.cursor.stop().characteristic);
  readonly judged = computed(() => {
    const verdict = this.draft.preview() ?? this.sheet.verdictOf(this.cursor.record());
    const none = { value: null, verdict: 'not judged', side: null, expandedUncertainty: null } as const;
    return verdict.characteristics.get(this.cursor.at().key) ?? none;
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
  readonly word = computed(() => {
    const { verdict, side } = this.judged();
    return verdict === 'conditional' ? `Conditional, ${side} the limit` : LOOK_WORDS[this.look()];
  });
  readonly readings = computed(() => readingsAt(this.cursor.record(), this.cursor.at().key));
  readonly standing = computed(() => countingAt(this.cursor.record(), this.cursor.at().key));
  readonly refused = computed(() => refusedAt(this.cursor.record(), this.cursor.at().key));
  /** The reading that waits for an answer; none while another one is being typed over it. */
  readonly openQuestion = computed(() => {
    const standing = this.standing();
    return standing !== undefined && isOpenQuestion(standing) && this.draft.repeat() === null ? standing : undefined;
  });
  /** What the part's model says of the value typed or kept; null where there is no model. */
  readonly plausibility = computed(() => {
    if (this.draft.started()) return this.check.found();
    const entry = this.standing()?.entry ?? null;
    return plausibilityOf(this.characteristic(), this.sheet.bench().expected, { value: this.number(), entry });
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
  /** Quality's ruling on the unit, in words. */
  readonly ruling = computed(() => {
    const { ruling } = this.cursor.record();
    return ruling === null ? '' : `Ruled ${ruling.ruling} by ${ruling.by}: ${ruling.reason}`;
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
