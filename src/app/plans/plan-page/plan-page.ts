import {
  ChangeDetectionStrategy,
  Component,
  computed,
  effect,
  inject,
  input,
  numberAttribute,
  untracked,
} from '@angular/core';
import { Router } from '@angular/router';
import { readPart } from '#shared/contract/parts';
import { changeRevision, type Plan, readPlan } from '#shared/contract/plans';
import { endpointResource } from '../../data/api';
import { PageTitle } from '../../page-title';
import { may } from '../../session/may';
import { type HoldsTyping } from '../../shell/leave-guard';
import { ConflictNote } from '../../ui/conflict-note';
import { Loaded } from '../../ui/page-state/loaded';
import { PageState } from '../../ui/page-state/page-state';
import { MessageNote } from '../../ui/states/message-note';
import { PlanEditor } from '../editor/plan-editor';
import { chosenRevision, comparedRevision } from './chosen-revision';
import { RevisionHead } from './revision-head';
import { RevisionList } from './revision-list';
import { RevisionStanding } from './revision-standing';
import { RevisionWork } from './revision-work';

/** A plan: one of its revisions, edited while it is a draft, and the way to the others. */
@Component({
  selector: 'qr-plan-page',
  imports: [ConflictNote, Loaded, MessageNote, PageState, PlanEditor, RevisionHead, RevisionList, RevisionStanding],
  providers: [RevisionWork],
  templateUrl: './plan-page.html',
  styleUrl: './plan-page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PlanPage implements HoldsTyping {
  private readonly router = inject(Router);
  private readonly title = inject(PageTitle);

  readonly id = input.required({ transform: numberAttribute });
  /** Number of the revision to show, from the query. */
  readonly revision = input<string>();

  protected readonly work = inject(RevisionWork);
  protected readonly plan = endpointResource(readPlan, () => ({ params: { id: this.id() } }));
  protected readonly part = endpointResource(readPart, () =>
    this.plan.hasValue() ? { params: { id: this.plan.value().part.id } } : undefined,
  );
  protected readonly mayChange = may(changeRevision);
  protected readonly shown = computed(() => {
    if (!this.plan.hasValue()) return null;
    const plan = this.plan.value();
    const asked = this.revision();
    const revision = chosenRevision(plan, asked === undefined ? undefined : Number(asked));
    return revision === undefined ? null : { plan, revision, against: comparedRevision(plan, revision) };
  });
  protected readonly editable = computed(() => this.mayChange() && this.shown()?.revision.status === 'draft');

  constructor() {
    effect(() => {
      const shown = this.shown();
      if (shown === null) return;
      untracked(() => {
        this.title.show(shown.plan.number);
        this.work.show(shown.plan, shown.revision);
      });
    });
  }

  hasUnsaved(): boolean {
    return this.editable() && this.work.draft.changed();
  }

  protected take(plan: Plan): void {
    this.plan.set(plan);
  }

  /** Shows a plan with a revision that was not there before. */
  protected open(plan: Plan): void {
    this.plan.set(plan);
    void this.router.navigate([], { queryParams: { revision: plan.openRevision?.revision ?? null } });
  }

  protected takeTheirs(theirs: Plan): void {
    this.work.theirs.set(null);
    this.plan.set(theirs);
  }
}
