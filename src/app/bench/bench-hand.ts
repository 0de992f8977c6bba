import { LiveAnnouncer } from '@angular/cdk/a11y';
import { inject, Injectable, signal } from '@angular/core';
import { type WalkOrder } from '#shared/bench/grid-walk';
import { type Characteristic } from '#shared/contract/plans';
import { formatLimits } from '#shared/quantities/format-quantity';
import { mayRepeat } from '#shared/verdict/counting-reading';
import { readingText } from '../ui/values/reading-text';
import { BenchSettings } from './bench-settings';
import { BenchCursor } from './sheet/bench-cursor';
import { BenchSheet } from './sheet/bench-sheet';
import { InstrumentChoice } from './sheet/instrument-choice';
import { type DraftOutcome, ReadingDraft } from './sheet/reading-draft';
import { countingAt, readingsAt } from './sheet/unit-record';

type ReadDraft = Extract<DraftOutcome, { state: 'read' }>;

/** What became of an attempt to keep what is typed. */
export type KeepResult = 'kept' | 'passed-by' | 'held' | 'needs-repeat' | 'needs-reason';

/** Keeps and takes back readings, and says so to those who do not see the screen. */
@Injectable()
export class BenchHand {
  private readonly sheet = inject(BenchSheet);
  private readonly cursor = inject(BenchCursor);
  private readonly draft = inject(ReadingDraft);
  private readonly instruments = inject(InstrumentChoice);
  private readonly settings = inject(BenchSettings);
  private readonly announcer = inject(LiveAnnouncer);

  /** Whether this person may measure. */
  readonly mayMeasure = signal(false);

  /** Keeps what is typed and goes on; a nonconforming reading is shown first and kept by the second Enter. */
  keep(order: WalkOrder = this.settings.order()): KeepResult {
    const outcome = this.draft.outcome();
    if (outcome.state === 'empty') return this.passBy(order);
    if (outcome.state === 'refused') return this.hold(outcome.message);
    const lacking = this.lacking(outcome);
    if (lacking !== null) return lacking;
    if (this.draft.newlyFailed().length > 0 && !this.draft.armed() && outcome.entry.kind !== 'attribute') {
      return this.arm();
    }
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
    const taken = this.sheet.withdrawLast();
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
    const lacking = this.exhausted() || this.instruments.lacking();
    if (lacking !== '') return this.hold(lacking);
    const { characteristic } = this.cursor.stop();
    const asksReason = characteristic.kind === 'attribute' && characteristic.failReasons.length > 0;
    if (asksReason && entry.kind === 'attribute' && !entry.pass && entry.reason === '') return 'needs-reason';
    return this.isRepeat() && this.draft.repeat() === null ? 'needs-repeat' : null;
  }

  private arm(): KeepResult {
    const preview = this.draft.preview();
    const stops = preview !== null && !this.sheet.lot().stop && this.sheet.lotWith(preview).stop;
    const what = this.draft
      .newlyFailed()
      .map((key) => this.failureWords(key))
      .join('. ');
    const result = this.hold(`${what}. ${stops ? 'It reaches the rejection number. ' : ''}Enter again keeps it.`);
    this.draft.armed.set(true);
    return result;
  }

  private failureWords(key: string): string {
    const characteristic = this.sheet.bench().characteristics.find((each) => each.key === key);
    const value = this.draft.preview()?.characteristics.get(key)?.value;
    if (characteristic === undefined || characteristic.kind === 'attribute') return 'Nonconforming';
    return `Nonconforming: ${valueWords(characteristic, value)}`;
  }

  private put({ entry }: ReadDraft): void {
    const { unit, key } = this.cursor.at();
    const { name } = this.cursor.stop().characteristic;
    const failed = this.draft.newlyFailed().length > 0;
    this.sheet.keep({
      unit,
      characteristicKey: key,
      entry,
      instrumentId: this.instruments.chosen()?.id ?? null,
      note: this.draft.note(),
      repeat: this.draft.repeat(),
      takenAt: new Date().toISOString(),
    });
    const said = `Unit ${unit}, ${name} kept${failed ? ', nonconforming' : ''}.`;
    void this.announcer.announce(said, failed ? 'assertive' : 'polite');
  }
}

function valueWords(
  characteristic: Exclude<Characteristic, { kind: 'attribute' }>,
  value: number | boolean | null | undefined,
): string {
  const { name, unit, decimals, lowerLimit, upperLimit } = characteristic;
  const shown = typeof value === 'number' ? readingText(value, unit, decimals) : 'no value';
  return `${name} ${shown}, ${formatLimits(lowerLimit, upperLimit, unit, decimals)}`;
}
