import { type Db } from '#db/open-database';
import { lotGroups, type lots } from '#db/schema/lots';
import { planCharacteristics, planClassAqls, planRevisions, plans } from '#db/schema/plans';
import { wholeCharacteristic } from '#server/plans/whole-characteristic';
import { type LotSampling } from '#shared/contract/lots';
import { type Characteristic } from '#shared/contract/plans';
import { sampledCharacteristic } from '#shared/plan/judged-characteristic';
import { lotSampling } from '#shared/sampling/lot-sampling';
import { and, asc, eq } from 'drizzle-orm';

/** The severity of every lot until the switching rules are in force: normal. */
const SEVERITY = 'normal';

function revisionWith(db: Db) {
  return db
    .select({
      id: planRevisions.id,
      revision: planRevisions.revision,
      level: planRevisions.level,
      planId: plans.id,
      planNumber: plans.number,
    })
    .from(planRevisions)
    .innerJoin(plans, eq(plans.id, planRevisions.planId));
}

/** A plan revision with its characteristics in the order of the bench. */
export function characteristicsOf(db: Db, revisionId: number): { id: number; content: Characteristic }[] {
  return db
    .select({ id: planCharacteristics.id, content: planCharacteristics.content })
    .from(planCharacteristics)
    .where(eq(planCharacteristics.revisionId, revisionId))
    .orderBy(asc(planCharacteristics.position))
    .all()
    .map(({ id, content }) => ({ id, content: wholeCharacteristic(content) }));
}

/** How a lot of this part and size would be sampled now, with the revision it rests on; undefined without an effective plan. */
export function samplingNow(db: Db, partId: number, lotSize: number) {
  const revision = revisionWith(db)
    .where(and(eq(plans.partId, partId), eq(planRevisions.status, 'effective')))
    .get();
  if (!revision) return undefined;
  const classAqls = db
    .select({ class: planClassAqls.class, aql: planClassAqls.aql })
    .from(planClassAqls)
    .where(eq(planClassAqls.revisionId, revision.id))
    .all();
  const characteristics = characteristicsOf(db, revision.id).map(({ content }) => sampledCharacteristic(content));
  const sampling = lotSampling({ lotSize, severity: SEVERITY, level: revision.level, classAqls, characteristics });
  return { revision, severity: SEVERITY, ...sampling } as const;
}

/** The provisional sampling of a lot that is not drawn; undefined without an effective plan. */
export function provisionalSampling(db: Db, partId: number, lotSize: number): LotSampling | undefined {
  const now = samplingNow(db, partId, lotSize);
  if (!now) return undefined;
  const { planId, planNumber, revision, level } = now.revision;
  const { severity, sampleSize, groups } = now;
  return { provisional: true, planId, planNumber, revision, level, severity, sampleSize, groups };
}

/** The groups of a lot as the draw fixed them. */
export function groupsOf(db: Db, lotId: number) {
  return db
    .select({ group: lotGroups.group })
    .from(lotGroups)
    .where(eq(lotGroups.lotId, lotId))
    .orderBy(asc(lotGroups.position))
    .all()
    .map(({ group }) => group);
}

/** The sampling of a drawn lot as the draw fixed it; undefined before the draw. */
export function fixedSampling(db: Db, lot: typeof lots.$inferSelect): LotSampling | undefined {
  if (lot.revisionId === null || lot.severity === null || lot.sampleSize === null) return undefined;
  const revision = revisionWith(db).where(eq(planRevisions.id, lot.revisionId)).get();
  if (!revision) throw new Error(`Lot ${lot.number} was drawn under a plan revision that does not exist.`);
  const { planId, planNumber, level } = revision;
  return {
    provisional: false,
    planId,
    planNumber,
    revision: revision.revision,
    level,
    severity: lot.severity,
    sampleSize: lot.sampleSize,
    groups: groupsOf(db, lot.id),
  };
}
