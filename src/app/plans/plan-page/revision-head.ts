import { ChangeDetectionStrategy, Component, computed, inject, input, output } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { tap } from 'rxjs';
import { type Plan, type Revision } from '#shared/contract/plans';
import { AskReason } from '../../shell/reason-dialog/ask-reason';
import { Session } from '../../session/session';
import { BackLink } from '../../shell/back-link';
import { Confirm } from '../../ui/confirm/confirm';
import { Mark } from '../../ui/marks/mark';
import { clockTime, MomentPipe } from '../../ui/values/moment-pipe';
import { revisionChanges } from '../revision-changes';
import { STATUS_WORDS } from '../revision-status';
import { PlanActs } from './plan-acts';
import { RevisionWork } from './revision-work';

/** Head of a plan: which revision is shown, of which part, and the steps it may take now. */
@Component({
  selector: 'qr-revision-head',
  imports: [BackLink, Mark, MatButton, MomentPipe],
  templateUrl: './revision-head.html',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class RevisionHead {
  private readonly acts = inject(PlanActs);
  private readonly session = inject(Session);
  private readonly confirm = inject(Confirm);
  private readonly askReason = inject(AskReason);

  readonly plan = input.required<Plan>();
  readonly shown = input.required<Revision>();
  readonly against = input.required<Revision | null>();
  readonly mayChange = input.required<boolean>();
  readonly taken = output<Plan>();
  readonly drafted = output<Plan>();

  protected readonly work = inject(RevisionWork);
  protected readonly statusWords = STATUS_WORDS;
  protected readonly faulty = computed(() => this.work.draft.faults().length > 0);
  protected readonly next = computed(() => (this.plan().revisions[0]?.revision ?? 0) + 1);

  /** Why the person cannot approve; empty when they can. */
  protected readonly objection = computed(() => {
    const own = this.shown().authorId === this.session.me()?.id;
    return own && !this.plan().approveOwn ? 'You wrote this revision; somebody else approves it.' : '';
  });

  protected readonly standing = computed(() => {
    if (this.work.saving.busy()) return 'Saving';
    if (this.shown().status === 'draft' && this.mayChange() && this.work.draft.changed()) return 'Not saved yet';
    const at = this.work.savedAt();
    return at === null ? `Written by ${this.shown().author}` : `Saved ${clockTime(at)}`;
  });

  protected readonly changes = computed(() => {
    const against = this.against();
    if (against === null) return 'First revision';
    const count = revisionChanges(against, this.work.draft.content()).length;
    return `${count === 0 ? 'No changes' : count === 1 ? '1 change' : `${count} changes`} against revision ${against.revision}`;
  });

  protected save(): void {
    this.work.save((plan) => this.taken.emit(plan));
  }

  protected submit(): void {
    this.work.submit((plan) => this.taken.emit(plan));
  }

  protected approve(): void {
    const { revision } = this.shown();
    const earlier = this.plan().effectiveRevision;
    const retires = earlier === null ? [] : [`Revision ${earlier} is retired. Lots that are drawn already keep it.`];
    const text = [
      `Lots of ${this.plan().part.number} drawn from now on are inspected to revision ${revision}.`,
      ...retires,
    ];
    this.confirm
      .ask({ title: `Approve revision ${revision}?`, text, confirm: `Approve revision ${revision}` })
      .subscribe((yes) => {
        if (yes) this.step((plan, shown) => this.acts.approve(plan, shown), `Revision ${revision} is in force`);
      });
  }

  protected giveBack(): void {
    const { revision, author } = this.shown();
    const text = [`It becomes a draft again, and ${author} reads the reason in the audit trail.`];
    this.askReason
      .ask({
        title: `Return revision ${revision} to draft?`,
        text,
        confirm: 'Return to draft',
        take: (reason) =>
          this.acts.giveBack(this.plan(), this.shown(), reason).pipe(tap((plan) => this.taken.emit(plan))),
      })
      .subscribe();
  }

  protected draftNext(): void {
    this.work.step(
      (plan) => this.acts.draftNext(plan),
      `Revision ${this.next()} drafted`,
      (plan) => this.drafted.emit(plan),
    );
  }

  private step(call: Parameters<RevisionWork['step']>[0], said: string): void {
    this.work.step(call, said, (plan) => this.taken.emit(plan));
  }
}
