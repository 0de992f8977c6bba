import { inject, Injectable } from '@angular/core';
import { MatSnackBar } from '@angular/material/snack-bar';
import { Subject } from 'rxjs';
import { type BenchCommand } from '#shared/bench/bench-key';
import { type WalkOrder } from '#shared/bench/grid-walk';
import { BenchHand } from '../bench-hand';
import { BenchActs } from '../sheet/bench-acts';
import { BenchCursor } from '../sheet/bench-cursor';
import { type BenchReading } from '../sheet/bench-reading';
import { PlausibilityCheck } from '../sheet/plausibility-check';
import { ReadingDraft, type TakenWaveform } from '../sheet/reading-draft';
import { readingWords } from '../sheet/reading-words';
import { countingAt } from '../sheet/unit-record';
import { type Confirmation } from '../waiting/bench-act';
import { problemOf } from '../../data/api-problem';
import { ConditionNotes } from './condition-notes';
import { BenchQuestions } from './dialogs/bench-questions';

/** What the keys and buttons of the bench do, whichever of them asks. */
@Injectable()
export class DeskCommands {
  private readonly hand = inject(BenchHand);
  private readonly draft = inject(ReadingDraft);
  private readonly cursor = inject(BenchCursor);
  private readonly acts = inject(BenchActs);
  private readonly check = inject(PlausibilityCheck);
  private readonly questions = inject(BenchQuestions);
  private readonly notes = inject(ConditionNotes);
  private readonly snackBar = inject(MatSnackBar);

  /** The focus belongs on the cell again. */
  readonly toGrid = new Subject<void>();
  /** The focus belongs into the panel's first field, which starts with the text given. */
  readonly toPanel = new Subject<string | undefined>();
  /** The focus belongs on the question about what is typed. */
  readonly toQuestion = new Subject<void>();
  /** How to go on once the question is answered. */
  private order: WalkOrder | undefined;

  /** Does what a key in the grid asks for. */
  obey(command: BenchCommand): void {
    if (this.questions.open()) return;
    if (command.does === 'all-keys') this.questions.keys().subscribe(() => this.toGrid.next());
    else if (command.does === 'escape') this.escape();
    else if (this.hand.mayMeasure()) this.measure(command);
  }

  keep(order?: WalkOrder): void {
    const result = this.hand.keep(order);
    if (result === 'kept' || result === 'passed-by') this.toGrid.next();
    // The questioned reading is selected: the next digit replaces it, Enter keeps it.
    if (result === 'held' && this.draft.armed()) this.toPanel.next(undefined);
    if (result === 'needs-repeat') this.askRepeat(() => this.keep(order));
    if (result === 'needs-reason') this.hand.hold('Say what is wrong: press the number of the reason.');
    if (result === 'needs-answer') {
      this.order = order;
      this.toQuestion.next();
    }
  }

  /** Keeps a reading that is far from what the part can give, for a reason. */
  confirm(answer: Confirmation): void {
    this.check.confirmation.set(answer);
    this.keep(this.order);
  }

  /** Goes back from the question to the fields. */
  typeAgain(): void {
    this.check.asking.set(false);
    this.toPanel.next(undefined);
  }

  /** Confirms a reading of a rack that waits for an answer, and goes on. */
  answer(readingId: string, answer: Confirmation): void {
    this.acts.answer(this.cursor.at().unit, readingId, answer);
    this.toGrid.next();
  }

  /** Takes the offered correction, else opens what stands here to be changed. */
  edit(): void {
    if (this.check.applyCure()) return this.toPanel.next(undefined);
    const entry = this.hand.isRepeat() && this.draft.repeat() === null ? this.standingReading()?.entry : null;
    if (!entry || this.draft.started()) return this.toPanel.next(undefined);
    this.askRepeat(() => {
      this.draft.resume(entry);
      this.toPanel.next(undefined);
    });
  }

  /** Takes up a reading that the server refused because somebody else was first, as a repeat. */
  repeatRefused({ id, entry }: BenchReading): void {
    this.askRepeat(() => {
      this.acts.discardRefused(this.cursor.at().unit, id);
      if (entry !== null) this.draft.resume(entry);
      this.toPanel.next(undefined);
    });
  }

  /** Takes up a reading that the server questioned, to be corrected. */
  correctRefused({ id, entry, value }: BenchReading): void {
    this.acts.discardRefused(this.cursor.at().unit, id);
    if (entry !== null && value !== null) this.check.resume({ entry, value });
    this.toPanel.next(undefined);
  }

  /** Keeps what a captured file gave as the reading of the cell. */
  takeWaveform(waveform: TakenWaveform): void {
    if (!this.draft.mayLeave()) return;
    this.draft.waveform.set(waveform);
    this.keep();
  }

  /** Goes to the next characteristic; what is typed is kept first. */
  step(): void {
    if (this.draft.started()) this.keep('by-unit');
    else if (this.cursor.step('next')) this.toGrid.next();
  }

  judge(pass: boolean): void {
    if (this.cursor.stop().characteristic.kind !== 'attribute') {
      this.hand.hold('P and F judge attributes. Type a value here.');
      return;
    }
    this.draft.failReason.set('');
    this.draft.pass.set(pass);
    this.keep();
  }

  /** The reason of a failure is chosen, which keeps it. */
  fail(reason: string): void {
    this.draft.pass.set(false);
    this.draft.failReason.set(reason);
    this.keep();
  }

  repeat(): void {
    if (!this.hand.isRepeat()) this.hand.hold('Nothing is kept here that could be repeated.');
    else this.askRepeat(() => this.toPanel.next(undefined));
  }

  note(): void {
    if (this.cursor.stop().typed)
      this.questions.note(this.draft.note()).subscribe((note) => {
        if (note !== undefined) this.draft.note.set(note);
        this.toGrid.next();
      });
  }

  setAside(): void {
    if (this.draft.mayLeave()) this.questions.setAside().subscribe(() => this.toGrid.next());
  }

  /** Notes what the lot is measured under. */
  conditions(): void {
    if (this.draft.mayLeave()) this.questions.conditions().subscribe(() => this.toGrid.next());
  }

  /** The warm-up that the plan asks for begins now. */
  startWarmUp(): void {
    this.notes.startWarmUp().subscribe({ error: (thrown: unknown) => this.hand.hold(problemOf(thrown).message) });
    this.toGrid.next();
  }

  /** Readings out of a spreadsheet are seen before they are kept. */
  paste(text: string): void {
    if (!this.hand.mayMeasure() || this.questions.open() || !this.draft.mayLeave()) return;
    this.questions.paste(text).subscribe(() => this.toGrid.next());
  }

  /** Quality rules on the unit in focus. */
  rule(): void {
    if (this.draft.mayLeave()) this.questions.ruling().subscribe(() => this.toGrid.next());
  }

  /** Drops what is typed; with nothing typed the focus leaves the grid. */
  escape(): void {
    const typed = this.draft.started() || this.draft.repeat() !== null;
    this.draft.clear();
    if (typed) this.toGrid.next();
    else this.toPanel.next(undefined);
  }

  /** Leaves the panel's fields without keeping. */
  leavePanel(): void {
    this.draft.clear();
    this.toGrid.next();
  }

  /** Starts a reading from its first character. */
  start(text: string): void {
    const { characteristic } = this.cursor.stop();
    if (characteristic.kind === 'attribute') this.chooseReason(text, characteristic.failReasons);
    else if (characteristic.kind === 'computed') this.hand.hold('This is computed from other readings.');
    else if (this.hand.isRepeat() && this.draft.repeat() === null) this.askRepeat(() => this.toPanel.next(text));
    else this.toPanel.next(text);
  }

  private measure(command: BenchCommand): void {
    switch (command.does) {
      case 'type':
        return this.start(command.text);
      case 'keep':
        return this.keep();
      case 'pass':
      case 'fail':
        return this.judge(command.does === 'pass');
      case 'edit':
        return this.edit();
      case 'note':
        return this.note();
      case 'repeat':
        return this.repeat();
      case 'set-aside':
        return this.setAside();
      case 'conditions':
        return this.conditions();
      case 'withdraw':
        this.withdraw();
    }
  }

  private chooseReason(digit: string, reasons: readonly string[]): void {
    const reason = reasons[Number(digit) - 1];
    if (this.draft.pass() === false && reason !== undefined) this.fail(reason);
    else this.hand.hold('P passes, F fails.');
  }

  private askRepeat(then: () => void): void {
    const exhausted = this.hand.exhausted();
    if (exhausted !== '') {
      this.draft.clear();
      this.hand.hold(exhausted);
      return;
    }
    this.questions.repeat(this.standing()).subscribe((repeat) => {
      if (repeat === undefined) return this.leavePanel();
      this.draft.repeat.set(repeat);
      then();
    });
  }

  /** What stands in the cell now, in words. */
  private standing(): string {
    const reading = this.standingReading();
    return reading === undefined ? '' : readingWords(reading, this.cursor.stop().characteristic);
  }

  private standingReading(): BenchReading | undefined {
    return countingAt(this.cursor.record(), this.cursor.at().key);
  }

  private withdraw(): void {
    if (!this.draft.mayLeave()) return;
    this.snackBar.open(this.hand.withdrawLast());
    this.toGrid.next();
  }
}
