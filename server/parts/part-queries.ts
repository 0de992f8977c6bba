import { type Db } from '#db/open-database';
import { parts } from '#db/schema/parts';
import { planRevisions, plans } from '#db/schema/plans';
import { NotFound } from '#server/problems';
import { type ElectricalModel, type Part } from '#shared/contract/parts';
import { and, asc, eq } from 'drizzle-orm';

type PartRow = typeof parts.$inferSelect;

/** The columns of a part, as the contract groups them. */
export function partOfRow(row: PartRow): Omit<Part, 'plan'> {
  const { id, version, number, name, form, active, lineHertz, ...model } = row;
  // The table's CHECK lets only these two in.
  const electrical: ElectricalModel = { ...model, lineHertz: lineHertz === 60 ? 60 : 50 };
  return { id, version, number, name, form, active, model: electrical };
}

function withPlan(db: Db) {
  return db
    .select({ part: parts, plan: { id: plans.id, number: plans.number }, effective: planRevisions.revision })
    .from(parts)
    .leftJoin(plans, eq(plans.partId, parts.id))
    .leftJoin(planRevisions, and(eq(planRevisions.planId, plans.id), eq(planRevisions.status, 'effective')));
}
type Row = ReturnType<ReturnType<typeof withPlan>['all']>[number];

function partOf({ part, plan, effective }: Row): Part {
  return { ...partOfRow(part), plan: plan && { ...plan, effectiveRevision: effective } };
}

export function listParts(db: Db): Part[] {
  return withPlan(db).orderBy(asc(parts.number)).all().map(partOf);
}

/** @throws {NotFound} */
export function findPart(db: Db, id: number): Part {
  const row = withPlan(db).where(eq(parts.id, id)).get();
  if (!row) throw new NotFound('This part');
  return partOf(row);
}
