import { computed, inject, Injectable, signal } from '@angular/core';
import { MatSnackBar } from '@angular/material/snack-bar';
import { type Observable } from 'rxjs';
import { type Plan, type Revision } from '#shared/contract/plans';
import { type ApiProblem } from '../../data/api-problem';
import { RecordSave } from '../../data/record-save';
import { type Difference } from '../../ui/conflict-note';
import { PlanDraft } from '../editor/plan-draft';
import { revisionChanges } from '../revision-changes';
import { PlanActs, versionOf } from './plan-acts';

/** The work on one revision of a plan: its draft, its steps, and what happens when somebody else was first. */
@Injectable()
export class RevisionWork {
  private readonly acts = inject(PlanActs);
  private readonly snackBar = inject(MatSnackBar);
  private readonly current = signal<{ plan: Plan; revision: Revision } | null>(null);
  private version = 0;

  readonly draft = new PlanDraft();
  readonly saving = new RecordSave();
  readonly savedAt = signal<Date | null>(null);
  /** The plan as somebody else left it, while the person decides whose draft holds. */
  readonly theirs = signal<Plan | null>(null);
  readonly differences = computed<Difference[]>(() => {
    const shown = this.current()?.revision;
    const theirs = this.theirs()?.revisions.find((each) => each.revision === shown?.revision);
    if (theirs === undefined) return [];
    return revisionChanges(theirs, this.draft.content()).map(({ what, before, after }) => ({
      label: what,
      mine: after ?? '',
      theirs: before ?? '',
    }));
  });

  /** Shows a revision; one whose stored state is on the screen already is left alone. */
  show(plan: Plan, revision: Revision): void {
    const shown = this.current()?.revision;
    const same = shown?.id === revision.id && this.version === revision.version;
    this.current.set({ plan, revision });
    if (same) return;
    if (shown?.id !== revision.id) this.savedAt.set(null);
    this.version = revision.version;
    this.draft.show(revision);
  }

  save(taken: (plan: Plan) => void): void {
    const sent = this.draft.content();
    this.run(
      (plan, revision) => this.acts.save(plan, revision, this.version, sent),
      (plan) => this.stored(plan, sent, taken),
    );
  }

  submit(taken: (plan: Plan) => void): void {
    const sent = this.draft.content();
    const changed = this.draft.changed();
    this.run(
      (plan, revision) =>
        changed
          ? this.acts.saveAndSubmit(plan, revision, this.version, sent)
          : this.acts.submit(plan, revision, this.version),
      (plan) => this.stored(plan, sent, taken),
    );
  }

  /** Any other step; `said` tells that it was done. */
  step(call: (plan: Plan, revision: Revision) => Observable<Plan>, said: string, taken: (plan: Plan) => void): void {
    this.run(call, (plan) => {
      this.snackBar.open(said);
      taken(plan);
    });
  }

  keepMine(): void {
    const [theirs, current] = [this.theirs(), this.current()];
    if (theirs !== null && current !== null) this.version = versionOf(theirs, current.revision) ?? this.version;
    this.theirs.set(null);
  }

  private stored(plan: Plan, sent: ReturnType<PlanDraft['content']>, taken: (plan: Plan) => void): void {
    const shown = this.current()?.revision;
    this.draft.markStored(sent);
    this.version = (shown && versionOf(plan, shown)) ?? this.version;
    this.savedAt.set(new Date());
    taken(plan);
  }

  private run(call: (plan: Plan, revision: Revision) => Observable<Plan>, done: (plan: Plan) => void): void {
    const current = this.current();
    if (current === null || this.saving.busy()) return;
    this.saving.run(call(current.plan, current.revision), done, (problem) => this.fail(problem, current.plan.id));
  }

  private fail(problem: ApiProblem, id: number): void {
    if (problem.status === 412) {
      this.saving.run(this.acts.read(id), (plan) => this.theirs.set(plan));
      return;
    }
    this.draft.refuse(problem.faults);
    if (problem.faults.length === 0) this.saving.said.set([problem.message]);
  }
}
