import {
  ChangeDetectionStrategy,
  Component,
  computed,
  inject,
  input,
  linkedSignal,
  numberAttribute,
} from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MatFormFieldModule } from '@angular/material/form-field';
import { MatSelectModule } from '@angular/material/select';
import { Router } from '@angular/router';
import { listParts } from '#shared/contract/parts';
import { addPlan, type Plan, type RevisionBody } from '#shared/contract/plans';
import { ApiClient, endpointResource } from '../../data/api';
import { type ApiProblem } from '../../data/api-problem';
import { RecordSave } from '../../data/record-save';
import { BackLink } from '../../shell/back-link';
import { type HoldsTyping } from '../../shell/leave-guard';
import { Loaded } from '../../ui/page-state/loaded';
import { PageState } from '../../ui/page-state/page-state';
import { EmptyState } from '../../ui/states/empty-state';
import { MessageNote } from '../../ui/states/message-note';
import { PlanDraft } from '../editor/plan-draft';
import { PlanEditor } from '../editor/plan-editor';

/** Level and AQLs a first draft starts from (common practice, no source). */
const START: RevisionBody = {
  level: 'II',
  classAqls: [
    { class: 'critical', aql: '0.15' },
    { class: 'major', aql: '1.0' },
    { class: 'minor', aql: '2.5' },
  ],
  characteristics: [],
  decisionRule: 'simple',
  coverageFactor: 2,
  warmUpMinutes: null,
  changeNote: '',
};

/** Writes the first draft of the plan of a part that has none. */
@Component({
  selector: 'qr-new-plan-page',
  imports: [
    BackLink,
    EmptyState,
    Loaded,
    MatButton,
    MatFormFieldModule,
    MatSelectModule,
    MessageNote,
    PageState,
    PlanEditor,
  ],
  templateUrl: './new-plan-page.html',
  styleUrl: './new-plan-page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class NewPlanPage implements HoldsTyping {
  private readonly api = inject(ApiClient);
  private readonly router = inject(Router);
  private stored = false;

  /** The part to start with, from the query. */
  readonly part = input(null, {
    transform: (id: string | undefined) => (id === undefined ? null : numberAttribute(id)),
  });

  protected readonly parts = endpointResource(listParts, () => ({}));
  protected readonly draft = new PlanDraft();
  protected readonly saving = new RecordSave();
  protected readonly partId = linkedSignal(() => this.part());
  protected readonly withoutPlan = computed(() =>
    this.parts.hasValue() ? this.parts.value().items.filter((part) => part.plan === null) : [],
  );
  protected readonly chosen = computed(() => this.withoutPlan().find((part) => part.id === this.partId()) ?? null);

  constructor() {
    this.draft.show(START);
  }

  hasUnsaved(): boolean {
    return !this.stored && this.draft.changed();
  }

  protected save(partId: number): void {
    this.saving.run(
      this.api.call(addPlan, { body: { partId, content: this.draft.content() } }),
      (plan) => this.open(plan),
      (problem) => this.refuse(problem),
    );
  }

  private open(plan: Plan): void {
    this.stored = true;
    void this.router.navigate(['/plans', plan.id], { replaceUrl: true });
  }

  /** Faults of the content stand beside its fields, those of the part are said. */
  private refuse({ faults, message }: ApiProblem): void {
    const ofContent = faults.filter((fault) => fault.path[0] === 'content');
    this.draft.refuse(ofContent.map((fault) => ({ ...fault, path: fault.path.slice(1) })));
    const others = faults.filter((fault) => fault.path[0] !== 'content').map((fault) => fault.message);
    this.saving.said.set(ofContent.length === 0 && others.length === 0 ? [message] : others);
  }
}
