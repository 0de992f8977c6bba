import { type Plan, type Revision } from '#shared/contract/plans';

/** The revision a page shows: the one asked for, else the one being worked on, else the one in force, else the newest. */
export function chosenRevision(plan: Plan, asked: number | undefined): Revision | undefined {
  const { revisions } = plan;
  return (
    revisions.find((each) => each.revision === asked) ??
    revisions.find((each) => each.status === 'draft' || each.status === 'in-review') ??
    revisions.find((each) => each.status === 'effective') ??
    revisions[0]
  );
}

/** What a revision's changes are counted from: the one in force for a coming revision, else the one before it. */
export function comparedRevision(plan: Plan, shown: Revision): Revision | null {
  const coming = shown.status === 'draft' || shown.status === 'in-review';
  const inForce = plan.revisions.find((each) => each.status === 'effective');
  if (coming && inForce) return inForce;
  return plan.revisions.find((each) => each.revision < shown.revision) ?? null;
}
