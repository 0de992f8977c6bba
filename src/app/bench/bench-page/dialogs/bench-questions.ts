import { inject, Injectable } from '@angular/core';
import { type ComponentType } from '@angular/cdk/overlay';
import { MatDialog, type MatDialogConfig } from '@angular/material/dialog';
import { defer, finalize, from, map, type Observable, of, switchMap } from 'rxjs';
import { type ReadingBody } from '#shared/contract/bench';
import { AskReason } from '../../../shell/reason-dialog/ask-reason';
import { Confirm } from '../../../ui/confirm/confirm';
import { BenchActs } from '../../sheet/bench-acts';
import { BenchCursor } from '../../sheet/bench-cursor';
import { BenchSheet } from '../../sheet/bench-sheet';
import { PasteDesk } from '../../paste/paste-desk';
import { type PasteQuestion } from '../../paste/paste-dialog';
import { ConditionNotes } from '../condition-notes';
import { UnitRulings } from '../unit-rulings';
import { WarmUp } from '../warm-up';
import { type ConditionsQuestion } from './conditions-dialog';
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
  private readonly notes = inject(ConditionNotes);
  private readonly warmUp = inject(WarmUp);
  private readonly rulings = inject(UnitRulings);
  private readonly pasteDesk = inject(PasteDesk);
  /** Dialogs on their way, as their code is loaded when they are asked for first. */
  private coming = 0;

  /** Whether a question waits for its answer; the keys are not the grid's then. */
  open(): boolean {
    return this.dialog.openDialogs.length + this.coming > 0;
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
    return this.later(() => import('../../../shell/keys-dialog/keys-dialog').then((file) => file.KeysDialog));
  }

  /** What the lot is measured under. */
  conditions(): Observable<unknown> {
    const { lot, conditions } = this.sheet.bench();
    const { notes, warmUp } = this;
    const data: ConditionsQuestion = { lotNumber: lot.number, notes, warmUp, noted: conditions };
    return this.later(() => import('./conditions-dialog').then((file) => file.ConditionsDialog), {
      data,
      width: '620px',
    });
  }

  /** Quality's ruling on the unit in focus. */
  ruling(): Observable<unknown> {
    const data = this.rulings.question();
    return this.later(() => import('./ruling-dialog').then((file) => file.RulingDialog), {
      data,
      autoFocus: 'textarea',
    });
  }

  /** What a pasted text would bring; completes with how many readings were kept. */
  paste(text: string): Observable<unknown> {
    const data: PasteQuestion = { text, desk: this.pasteDesk };
    return this.later(() => import('../../paste/paste-dialog').then((file) => file.PasteDialog), {
      data,
      width: '900px',
      maxWidth: '96vw',
    });
  }

  /** Opens a dialog whose code is loaded only now. */
  private later<Dialog>(load: () => Promise<ComponentType<Dialog>>, config: MatDialogConfig = {}): Observable<unknown> {
    return defer(() => {
      this.coming += 1;
      return from(load()).pipe(
        finalize(() => (this.coming -= 1)),
        switchMap((dialog) => this.dialog.open(dialog, config).afterClosed()),
      );
    });
  }

  private what(): string {
    return `Unit ${this.cursor.at().unit}, ${this.cursor.stop().characteristic.name}`;
  }
}
