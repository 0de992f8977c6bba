import { type RevisionBody, revisionBody } from '#shared/contract/plans';
import { type Fault } from '#shared/contract/problem';
import { planFaults } from '#shared/plan/plan-faults';

/** What is wrong with a plan's content: its shape as the contract has it, then the rules across its fields. */
export function contentFaults(content: RevisionBody): Fault[] {
  const read = revisionBody.safeParse(content);
  if (read.success) return planFaults(content);
  return read.error.issues.map((issue) => ({
    path: issue.path.filter((step) => typeof step !== 'symbol'),
    message: issue.message,
  }));
}
