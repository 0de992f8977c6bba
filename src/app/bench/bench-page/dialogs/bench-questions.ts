import { inject, Injectable } from '@angular/core';
import { MatDialog } from '@angular/material/dialog';
import { map, type Observable, of } from 'rxjs';
import { type ReadingBody } from '#shared/contract/bench';
import { AskReason } from '../../../shell/reason-dialog/ask-reason';
import { KeysDialog } from '../../../shell/keys-dialog/keys-dialog';
import { Confirm } from '../../../ui/confirm/confirm';
import { BenchActs } from '../../sheet/bench-acts';
import { BenchCursor } from '../../sheet/bench-cursor';
import { BenchSheet } from '../../sheet/bench-sheet';
import { NoteDialog, type NoteQuestion } from './note-dialog';
import { RepeatDialog, type RepeatQuestion } from './repeat-dialog';
import { submissionWords } from './submission-words';

type Repeat = NonNullable<ReadingBody['repeat']>;

/** What the bench asks in dialogs. */
@Injectable()
export class BenchQuestions {
  private readonly dialog = inject(MatDialog);
  private readonly confirm = inject(Confirm);
  private readonly askReason = inject(AskReason);
  private readonly sheet = inject(BenchSheet);
  private readonly acts = inject(BenchActs);
  private readonly cursor = inject(BenchCursor);

  /** Whether a question waits for its answer; the keys are not the grid's then. */
  open(): boolean {
    return this.dialog.openDialogs.length > 0;
  }

  /** Why a reading is repeated; undefined when it is not. */
  repeat(standing: string): Observable<Repeat | undefined> {
    const data: RepeatQuestion = { what: this.what(), standing };
    return this.dialog.open<RepeatDialog, RepeatQuestion, Repeat>(RepeatDialog, { data }).afterClosed();
  }

  note(note: string): Observable<string | undefined> {
    const data: NoteQuestion = { what: this.what(), note };
    return this.dialog.open<NoteDialog, NoteQuestion, string>(NoteDialog, { data }).afterClosed();
  }

  /** Sets the unit in focus aside with a reason, or takes it back. */
  setAside(): Observable<unknown> {
    const { unit, setAside } = this.cursor.record();
    if (setAside !== null) {
      const question = {
        title: `Take unit ${unit} back?`,
        text: [`It was set aside: ${setAside}.`, 'It is judged by its readings again.'],
        confirm: 'Take back',
      };
      return this.confirm.ask(question).pipe(map((yes) => yes && this.acts.setAside(unit, null)));
    }
    return this.askReason.ask({
      title: `Set unit ${unit} aside?`,
      text: ['It is undecided until quality rules on it; unresolved it counts as nonconforming.'],
      confirm: 'Set aside',
      take: (reason) => of(this.acts.setAside(unit, reason)),
    });
  }

  submit(): Observable<boolean> {
    return this.confirm.ask(submissionWords(this.sheet));
  }

  keys(): Observable<unknown> {
    return this.dialog.open(KeysDialog).afterClosed();
  }

  private what(): string {
    return `Unit ${this.cursor.at().unit}, ${this.cursor.stop().characteristic.name}`;
  }
}
