import { inject, Injectable } from '@angular/core';
import { MatSnackBar } from '@angular/material/snack-bar';
import { Subject } from 'rxjs';
import { type BenchCommand } from '#shared/bench/bench-key';
import { type WalkOrder } from '#shared/bench/grid-walk';
import { BenchHand } from '../bench-hand';
import { BenchCursor } from '../sheet/bench-cursor';
import { ReadingDraft } from '../sheet/reading-draft';
import { readingWords } from '../sheet/reading-words';
import { countingAt } from '../sheet/unit-record';
import { BenchQuestions } from './dialogs/bench-questions';

/** What the keys and buttons of the bench do, whichever of them asks. */
@Injectable()
export class DeskCommands {
  private readonly hand = inject(BenchHand);
  private readonly draft = inject(ReadingDraft);
  private readonly cursor = inject(BenchCursor);
  private readonly questions = inject(BenchQuestions);
  private readonly snackBar = inject(MatSnackBar);

  /** The focus belongs on the cell again. */
  readonly toGrid = new Subject<void>();
  /** The focus belongs into the panel's first field, which starts with the text given. */
  readonly toPanel = new Subject<string | undefined>();

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
        return this.toPanel.next(undefined);
      case 'note':
        return this.note();
      case 'repeat':
        return this.repeat();
      case 'set-aside':
        return this.setAside();
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
    const { characteristic } = this.cursor.stop();
    const reading = countingAt(this.cursor.record(), characteristic.key);
    return reading === undefined ? '' : readingWords(reading, characteristic);
  }

  private withdraw(): void {
    if (!this.draft.mayLeave()) return;
    this.snackBar.open(this.hand.withdrawLast());
    this.toGrid.next();
  }
}
