import { computed, inject, Injectable, signal } from '@angular/core';
import { MatSnackBar } from '@angular/material/snack-bar';
import {
  changeGaugeStudy,
  closeGaugeStudy,
  type GaugeStudy,
  type GaugeStudyBody,
  readGaugeStudy,
} from '#shared/contract/gauge-studies';
import { cellName } from '#shared/gauge-study/study-cell';
import { ApiClient } from '../../data/api';
import { type ApiProblem } from '../../data/api-problem';
import { RecordSave } from '../../data/record-save';
import { Confirm } from '../../ui/confirm/confirm';
import { type Difference } from '../../ui/conflict-note';
import { ReadingsDraft } from './readings-draft';

/** What is done to an open study on its page: readings are typed and saved, and the study is closed. */
@Injectable()
export class StudyWork {
  private readonly api = inject(ApiClient);
  private readonly confirm = inject(Confirm);
  private readonly snackBar = inject(MatSnackBar);

  readonly saving = new RecordSave();
  readonly draft = signal<ReadingsDraft | null>(null);
  /** The study as somebody else saved it meanwhile. */
  readonly theirs = signal<GaugeStudy | null>(null);
  readonly changed = computed(() => this.draft()?.changed() ?? false);
  readonly differences = computed(() => {
    const theirs = this.theirs();
    const draft = this.draft();
    return theirs === null || draft === null ? [] : differencesOf(draft, new ReadingsDraft(theirs));
  });

  /** Begins with a study as it is stored; what was typed goes. */
  show(study: GaugeStudy): void {
    this.draft.set(new ReadingsDraft(study));
    this.theirs.set(null);
  }

  save(saved: (study: GaugeStudy) => void): void {
    const draft = this.draft();
    if (draft === null || this.saving.busy()) return;
    // A cell that nobody can read would be saved as an empty one.
    if (draft.faults().length > 0) {
      this.saving.said.set(['Mend what is marked first.']);
      return;
    }
    const { id, version, number } = draft.study;
    this.saving.run(
      this.api.call(changeGaugeStudy, { params: { id }, body: bodyOf(draft), version }),
      (study) => {
        saved(study);
        this.snackBar.open(`Readings of ${number} saved`);
      },
      (problem) => this.refused(problem, id),
    );
  }

  /** Goes on from what the other person saved, with what was typed here on top of it. */
  keepMine(): void {
    const theirs = this.theirs();
    const mine = this.draft();
    if (theirs === null || mine === null) return;
    const draft = new ReadingsDraft(theirs);
    draft.place(mine.typed());
    this.draft.set(draft);
    this.theirs.set(null);
  }

  close(study: GaugeStudy, closed: (study: GaugeStudy) => void): void {
    this.confirm
      .ask({
        title: `Close ${study.number}?`,
        text: [`All ${String(study.needed)} readings are entered.`, 'A closed study changes no more.'],
        confirm: 'Close study',
      })
      .subscribe((confirmed) => {
        if (!confirmed) return;
        const { id, version } = study;
        this.saving.run(this.api.call(closeGaugeStudy, { params: { id }, version }), closed, (problem) =>
          this.refused(problem, id),
        );
      });
  }

  private refused(problem: ApiProblem, id: number): void {
    if (problem.status !== 412) {
      this.saving.said.set([problem.message, ...problem.faults.map(({ message }) => message)]);
      return;
    }
    this.saving.run(this.api.call(readGaugeStudy, { params: { id } }), (theirs) => this.theirs.set(theirs));
  }
}

function bodyOf(draft: ReadingsDraft): GaugeStudyBody {
  const { title, instrument, quantity, unit, decimals, lowerLimit, upperLimit } = draft.study;
  const { parts, persons, trials, note } = draft.study;
  return {
    ...{ title, quantity, unit, decimals, lowerLimit, upperLimit, parts, persons, trials, note },
    instrumentId: instrument.id,
    values: draft.values(),
  };
}

/** Cells that were typed here and stand otherwise in what is saved now. */
function differencesOf(mine: ReadingsDraft, theirs: ReadingsDraft): Difference[] {
  return mine
    .typed()
    .map(({ cell, text }) => ({ label: cellName(mine.study, cell), mine: text, theirs: theirs.textAt(cell) }))
    .filter((row) => row.mine !== row.theirs);
}
