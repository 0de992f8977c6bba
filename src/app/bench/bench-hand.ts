import { LiveAnnouncer } from '@angular/cdk/a11y';
import { inject, Injectable, signal } from '@angular/core';
import { type WalkOrder } from '#shared/bench/grid-walk';
import { mayRepeat } from '#shared/verdict/counting-reading';
import { BenchSettings } from './bench-settings';
import { BenchActs } from './sheet/bench-acts';
import { BenchCursor } from './sheet/bench-cursor';
import { BenchSheet } from './sheet/bench-sheet';
import { type DraftOutcome } from './sheet/draft-outcome';
import { failureWords } from './sheet/failure-words';
import { InstrumentChoice } from './sheet/instrument-choice';
import { PlausibilityCheck } from './sheet/plausibility-check';
import { ReadingDraft } from './sheet/reading-draft';
import { countingAt, readingsAt } from './sheet/unit-record';

type ReadDraft = Extract<DraftOutcome, { state: 'read' }>;

/** What became of an attempt to keep what is typed. */
export type KeepResult = 'kept' | 'passed-by' | 'held' | 'needs-repeat' | 'needs-reason' | 'needs-answer';

/** Keeps and takes back readings, and says so to those who do not see the screen. */
@Injectable()
export class BenchHand {
  private readonly sheet = inject(BenchSheet);
  private readonly acts = inject(BenchActs);
  private readonly cursor = inject(BenchCursor);
  private readonly draft = inject(ReadingDraft);
  private readonly check = inject(PlausibilityCheck);
  private readonly instruments = inject(InstrumentChoice);
  private readonly settings = inject(BenchSettings);
  private readonly announcer = inject(LiveAnnouncer);

  /** Whether this person may measure. */
  readonly mayMeasure = signal(false);

  /**
   * Keeps what is typed and goes on. A reading far from what the part can give is questioned first; a nonconforming one is
   * shown first and kept by the second Enter, unless it was confirmed at the question.
   */
  keep(order: WalkOrder = this.settings.order()): KeepResult {
    const outcome = this.draft.outcome();
    if (outcome.state === 'empty') return this.passBy(order);
    if (outcome.state === 'refused') return this.hold(outcome.message);
    const lacking = this.lacking(outcome);
    if (lacking !== null) return lacking;
    if (this.check.needsAnswer()) return this.question();
    const seen = this.draft.armed() || this.check.confirmation() !== null;
    if (this.draft.newlyFailed().length > 0 && !seen && outcome.entry.kind !== 'attribute') return this.arm();
    this.put(outcome);
    this.cursor.goOn(order);
    this.draft.clear();
    return 'kept';
  }

  /** Whether the cell in focus has a reading, so that another one is a repeat. */
  isRepeat(): boolean {
    return countingAt(this.cursor.record(), this.cursor.at().key) !== undefined;
  }

  /** Why the cell in focus takes no further reading; empty when it does. */
  exhausted(): string {
    const readings = readingsAt(this.cursor.record(), this.cursor.at().key);
    return mayRepeat(readings)
      ? ''
      : `Unit ${this.cursor.at().unit} has had this reading three times. Set the unit aside instead.`;
  }

  /** Says something beside the fields and aloud. */
  hold(message: string): KeepResult {
    this.draft.said.set(message);
    void this.announcer.announce(message, 'assertive');
    return 'held';
  }

  /** Takes the last reading kept here back. */
  withdrawLast(): string {
    const taken = this.acts.withdrawLast();
    if (taken === null) return 'Nothing to take back.';
    this.cursor.choose(taken.unit, taken.key);
    const said = `Unit ${taken.unit}, ${this.cursor.stop().characteristic.name}: reading taken back. It stays on record.`;
    void this.announcer.announce(said, 'polite');
    return said;
  }

  private passBy(order: WalkOrder): KeepResult {
    if (this.draft.started()) return this.hold('The reading is not complete.');
    this.cursor.goOn(order);
    return 'passed-by';
  }

  /** What still has to be said before the reading can be kept; null when nothing has. */
  private lacking({ entry }: ReadDraft): KeepResult | null {
    const lacking = this.exhausted() || this.instruments.lacking() || this.uncertainty();
    if (lacking !== '') return this.hold(lacking);
    const { characteristic } = this.cursor.stop();
    const asksReason = characteristic.kind === 'attribute' && characteristic.failReasons.length > 0;
    if (asksReason && entry.kind === 'attribute' && !entry.pass && entry.reason === '') return 'needs-reason';
    return this.isRepeat() && this.draft.repeat() === null ? 'needs-repeat' : null;
  }

  /** What is wrong with the range, or with there being none under a rule that needs the uncertainty. */
  private uncertainty(): string {
    const range = this.draft.range();
    if (range.state === 'refused') return range.message;
    const measured = this.cursor.stop().characteristic.kind === 'measured';
    if (range.state === 'chosen' || !measured || !this.sheet.budgets().asked) return '';
    return this.instruments.chosen() === null
      ? 'This plan judges with guard bands and names no instrument for this, so its uncertainty is not known. Quality mends the plan.'
      : 'This plan judges with guard bands, and the instrument has no range with an accuracy for this. Quality adds one.';
  }

  private question(): KeepResult {
    this.check.ask();
    void this.announcer.announce(
      `${this.check.found()?.sentence ?? ''} Correct it, or say why it is kept.`,
      'assertive',
    );
    return 'needs-answer';
  }

  private arm(): KeepResult {
    const result = this.hold(`${failureWords(this.sheet, this.draft)} Enter again keeps it.`);
    this.draft.armed.set(true);
    return result;
  }

  private put({ entry, value }: ReadDraft): void {
    const { unit, key } = this.cursor.at();
    const { characteristic } = this.cursor.stop();
    const { name } = characteristic;
    const failed = this.draft.newlyFailed().length > 0;
    const body = {
      unit,
      characteristicKey: key,
      entry,
      instrumentId: this.instruments.chosen()?.id ?? null,
      rangeId: this.instruments.namedFor(characteristic, entry.kind),
      note: this.draft.note(),
      question: this.check.answer(),
      repeat: this.draft.repeat(),
      takenAt: new Date().toISOString(),
    };
    this.acts.keep({ body, measured: entry.kind === 'waveform' && typeof value === 'number' ? value : null });
    const said = `Unit ${unit}, ${name} kept${failed ? ', nonconforming' : ''}.`;
    void this.announcer.announce(said, failed ? 'assertive' : 'polite');
  }
}
