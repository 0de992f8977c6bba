import { inject, Injectable } from '@angular/core';
import { type Observable, switchMap } from 'rxjs';
import {
  addRevision,
  approveRevision,
  changeRevision,
  type Plan,
  readPlan,
  returnRevision,
  type Revision,
  type RevisionBody,
  submitRevision,
} from '#shared/contract/plans';
import { ApiClient } from '../../data/api';

/** The steps of a revision's life, each by the version the person saw; all yield the plan as it is then. */
@Injectable({ providedIn: 'root' })
export class PlanActs {
  private readonly api = inject(ApiClient);

  read(id: number): Observable<Plan> {
    return this.api.call(readPlan, { params: { id } });
  }

  save(plan: Plan, { revision }: Revision, version: number, body: RevisionBody): Observable<Plan> {
    return this.api.call(changeRevision, { params: { id: plan.id, revision }, body, version });
  }

  submit(plan: Plan, { revision }: Revision, version: number): Observable<Plan> {
    return this.api.call(submitRevision, { params: { id: plan.id, revision }, version });
  }

  /** Saves first, so that what is sent is what is on the screen. */
  saveAndSubmit(plan: Plan, shown: Revision, version: number, body: RevisionBody): Observable<Plan> {
    return this.save(plan, shown, version, body).pipe(
      switchMap((saved) => this.submit(saved, shown, versionOf(saved, shown) ?? version)),
    );
  }

  approve(plan: Plan, { revision, version }: Revision): Observable<Plan> {
    return this.api.call(approveRevision, { params: { id: plan.id, revision }, version });
  }

  giveBack(plan: Plan, { revision, version }: Revision, reason: string): Observable<Plan> {
    return this.api.call(returnRevision, { params: { id: plan.id, revision }, body: { reason }, version });
  }

  draftNext(plan: Plan): Observable<Plan> {
    return this.api.call(addRevision, { params: { id: plan.id } });
  }
}

/** The version of a revision in a plan that came back. */
export function versionOf(plan: Plan, { revision }: Revision): number | undefined {
  return plan.revisions.find((each) => each.revision === revision)?.version;
}
