import { type Db } from '#db/open-database';
import { parts } from '#db/schema/parts';
import { planRevisions, plans } from '#db/schema/plans';
import { type Caller, mayCall } from '#server/caller';
import { readsDrafts } from '#server/plans/plan-queries';
import { NotFound } from '#server/problems';
import { type ElectricalModel, type Part } from '#shared/contract/parts';
import { readPlan } from '#shared/contract/plans';
import { and, asc, eq } from 'drizzle-orm';

type PartRow = typeof parts.$inferSelect;

/** The columns of a part, as the contract groups them. */
export function partOfRow(row: PartRow): Omit<Part, 'plan'> {
  const { id, version, number, name, form, active, lineHertz, expected, ...model } = row;
  // The table's CHECK lets only these two in.
  const electrical: ElectricalModel = { ...model, lineHertz: lineHertz === 60 ? 60 : 50 };
  return { id, version, number, name, form, active, model: electrical, expected };
}

function withPlan(db: Db) {
  return db
    .select({ part: parts, plan: { id: plans.id, number: plans.number }, effective: planRevisions.revision })
    .from(parts)
    .leftJoin(plans, eq(plans.partId, parts.id))
    .leftJoin(planRevisions, and(eq(planRevisions.planId, plans.id), eq(planRevisions.status, 'effective')));
}
type Row = ReturnType<ReturnType<typeof withPlan>['all']>[number];

/** A plan is named to whoever reads plans, one of which nothing is in force only to whoever reads drafts. */
function partOf({ part, plan, effective }: Row, caller: Caller): Part {
  const isSeen = mayCall(caller, readPlan) && (effective !== null || readsDrafts(caller));
  return { ...partOfRow(part), plan: isSeen && plan ? { ...plan, effectiveRevision: effective } : null };
}

export function listParts(db: Db, caller: Caller): Part[] {
  const rows = withPlan(db).orderBy(asc(parts.number)).all();
  return rows.map((row) => partOf(row, caller));
}

/** @throws {NotFound} */
export function findPart(db: Db, caller: Caller, id: number): Part {
  const row = withPlan(db).where(eq(parts.id, id)).get();
  if (!row) throw new NotFound('This part');
  return partOf(row, caller);
}
