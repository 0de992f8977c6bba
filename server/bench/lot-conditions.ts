import { type Db } from '#db/open-database';
import { lotConditions } from '#db/schema/lot-conditions';
import { people } from '#db/schema/people';
import { record } from '#server/audit/record';
import { type Caller } from '#server/caller';
import { type Context } from '#server/context';
import { type LotConditions, type NotedConditions } from '#shared/contract/conditions';
import { desc, eq } from 'drizzle-orm';
import { lotAtBench } from './bench-lot';

/** What was noted last of the conditions a lot is measured under; null before anything was. */
export function conditionsOf(db: Db, lotId: number): NotedConditions | null {
  const row = db
    .select({ conditions: lotConditions.conditions, notedAt: lotConditions.notedAt, notedBy: people.name })
    .from(lotConditions)
    .innerJoin(people, eq(people.id, lotConditions.notedById))
    .where(eq(lotConditions.lotId, lotId))
    .orderBy(desc(lotConditions.id))
    .limit(1)
    .get();
  return row ? { ...row.conditions, notedAt: row.notedAt, notedBy: row.notedBy } : null;
}

/** Notes the conditions of a lot at the bench; what was noted before stays on record. */
export function noteConditions(
  { db, clock }: Context,
  caller: Caller,
  lotId: number,
  conditions: LotConditions,
): NotedConditions {
  const at = clock.now();
  db.transaction((tx) => {
    const lot = lotAtBench(tx, lotId);
    const before = conditionsOf(tx, lot.id);
    tx.insert(lotConditions)
      .values({ lotId: lot.id, conditions, notedAt: at.toISOString(), notedById: caller.id })
      .run();
    const change = { action: 'conditions noted', subject: 'lot', subjectId: lot.id, before, after: conditions };
    record(tx, { at, person: caller, ...change });
  });
  return { ...conditions, notedAt: at.toISOString(), notedBy: caller.name };
}
