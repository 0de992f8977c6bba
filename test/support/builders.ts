import { type Db } from '#db/open-database';
import { instruments } from '#db/schema/instruments';
import { lots } from '#db/schema/lots';
import { parts } from '#db/schema/parts';
import { planCharacteristics, planClassAqls, planRevisions, plans } from '#db/schema/plans';
import { suppliers } from '#db/schema/suppliers';
import { type RevisionBody, type RevisionStatus } from '#shared/contract/plans';
import { eq } from 'drizzle-orm';
import { revisionBody } from './plan-bodies';

const MOMENT = '2026-01-05T08:00:00.000Z';

export function buildSupplier(db: Db, given: Partial<typeof suppliers.$inferInsert> = {}) {
  const usual = { code: 'KST', name: 'Kestrin Power', address: '', contactName: '', contactEmail: null };
  return db
    .insert(suppliers)
    .values({ ...usual, ...given })
    .returning()
    .get();
}

export function buildPart(db: Db, given: Partial<typeof parts.$inferInsert> = {}) {
  const usual = {
    number: 'HC-2402',
    name: 'Adapter 24 V 0.2 A',
    form: 'wall-adapter',
    topology: 'centre-tap',
    lineVolts: 230,
    lineHertz: 50,
    ratedVolts: 24,
    ratedAmperes: 0.2,
    secondaryPeakVolts: 27.5,
    sourceOhms: 2,
    diodeDropVolts: 0.7,
    filterFarads: 0.001,
    filterTolerance: 0.2,
  } as const;
  return db
    .insert(parts)
    .values({ ...usual, ...given })
    .returning()
    .get();
}

export function buildInstrument(db: Db, given: Partial<typeof instruments.$inferInsert> = {}) {
  const usual = {
    assetNumber: 'MM-01',
    kind: 'multimeter',
    description: 'Bench multimeter, 6 digits',
    serialNumber: '',
    place: 'Bench 1',
    calibrationDue: '2026-09-30',
    status: 'in-service',
  } as const;
  return db
    .insert(instruments)
    .values({ ...usual, ...given })
    .returning()
    .get();
}

/** A plan with one revision in the state that is asked for, effective unless said otherwise. */
export function buildPlan(
  db: Db,
  given: { partId: number; authorId: number; number?: string; status?: RevisionStatus; content?: RevisionBody },
): { planId: number; revisionId: number } {
  const { partId, authorId, number = 'P-001', status = 'effective', content = revisionBody() } = given;
  const plan = db.insert(plans).values({ number, partId }).returning({ id: plans.id }).get();
  const { level, changeNote, classAqls, characteristics } = content;
  const revision = db
    .insert(planRevisions)
    .values({ planId: plan.id, revision: 1, status: 'draft', level, changeNote, authorId, createdAt: MOMENT })
    .returning({ id: planRevisions.id })
    .get();
  const revisionId = revision.id;
  for (const entry of classAqls)
    db.insert(planClassAqls)
      .values({ revisionId, ...entry })
      .run();
  characteristics.forEach((one, index) =>
    db
      .insert(planCharacteristics)
      .values({ revisionId, position: index + 1, key: one.key, content: one })
      .run(),
  );
  const effectiveAt = status === 'effective' || status === 'retired' ? MOMENT : null;
  db.update(planRevisions).set({ status, effectiveAt }).where(eq(planRevisions.id, revisionId)).run();
  return { planId: plan.id, revisionId };
}

/** A lot that stands somewhere on the line; what its state needs is filled in. */
export function buildLot(
  db: Db,
  given: Partial<typeof lots.$inferInsert> & { number: string; partId: number; supplierId: number; bookedById: number },
) {
  const usual = {
    status: 'arrived',
    deliveryNumber: 'D-1',
    orderNumber: '',
    countedQuantity: 400,
    statedQuantity: 400,
    dateCode: '',
    cartons: 4,
    place: '',
    note: '',
    arrivedAt: MOMENT,
  } as const;
  return db
    .insert(lots)
    .values({ ...usual, ...given })
    .returning()
    .get();
}
