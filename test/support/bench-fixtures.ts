import { type Db } from '#db/open-database';
import { instruments } from '#db/schema/instruments';
import { parts } from '#db/schema/parts';
import { planCharacteristics, planClassAqls, planRevisions, plans } from '#db/schema/plans';
import { suppliers } from '#db/schema/suppliers';
import { type InstrumentKind } from '#shared/contract/instruments';
import { type Lot } from '#shared/contract/lots';
import { type Characteristic, type RevisionBody } from '#shared/contract/plans';
import { eq } from 'drizzle-orm';
import { type TestSite } from './test-site';

const COMMON = { condition: '', method: '', caution: '', ownLevel: null, ownAql: null } as const;

export interface Limits {
  lower?: number;
  upper?: number;
}

export function measured(
  key: string,
  nonconformityClass: 'critical' | 'major' | 'minor',
  { lower, upper }: Limits,
  more: Partial<Extract<Characteristic, { kind: 'measured' }>> = {},
): Characteristic {
  return {
    kind: 'measured',
    key,
    name: key.replaceAll('_', ' '),
    class: nonconformityClass,
    ...COMMON,
    unit: 'V',
    decimals: 2,
    target: null,
    lowerLimit: lower ?? null,
    upperLimit: upper ?? null,
    entryMode: 'direct',
    measurand: 'other',
    alternatePeaks: 'worst',
    instrumentKind: null,
    ...more,
  };
}

export function attribute(key: string, nonconformityClass: 'critical' | 'major' | 'minor'): Characteristic {
  return {
    kind: 'attribute',
    key,
    name: key,
    class: nonconformityClass,
    ...COMMON,
    requirement: 'As the drawing shows',
    failReasons: ['Smeared', 'Missing'],
    instrumentKind: null,
  };
}

/** What a plan of a test holds; the decision rule is simple acceptance unless it says otherwise. */
type PlannedContent = Pick<RevisionBody, 'level' | 'classAqls' | 'characteristics'> &
  Partial<Pick<RevisionBody, 'decisionRule' | 'coverageFactor' | 'warmUpMinutes'>>;

/** A supplier and a part with an effective plan, straight in the database. */
export function addPlannedPart(db: Db, authorId: number, content: PlannedContent) {
  const supplier = db
    .insert(suppliers)
    .values({ code: 'KES', name: 'Kestrin Power', address: '', contactName: '', contactEmail: null })
    .returning()
    .get();
  const part = db
    .insert(parts)
    .values({
      number: 'WA-12-500',
      name: 'Wall adapter 12 V, 500 mA',
      form: 'wall-adapter',
      topology: 'centre-tap',
      lineVolts: 230,
      lineHertz: 50,
      ratedVolts: 12,
      ratedAmperes: 0.5,
      filterFarads: 0.0022,
      filterTolerance: 0.2,
    })
    .returning()
    .get();
  const plan = db.insert(plans).values({ number: 'P-001', partId: part.id }).returning().get();
  const at = '2026-01-05T08:00:00.000Z';
  const revision = db
    .insert(planRevisions)
    .values({
      planId: plan.id,
      revision: 1,
      status: 'draft',
      level: content.level,
      decisionRule: content.decisionRule,
      coverageFactor: content.coverageFactor,
      warmUpMinutes: content.warmUpMinutes,
      changeNote: '',
      authorId,
      createdAt: at,
    })
    .returning()
    .get();
  for (const one of content.classAqls)
    db.insert(planClassAqls)
      .values({ revisionId: revision.id, ...one })
      .run();
  content.characteristics.forEach((characteristic, position) => {
    db.insert(planCharacteristics)
      .values({ revisionId: revision.id, position, key: characteristic.key, content: characteristic })
      .run();
  });
  db.update(planRevisions)
    .set({ status: 'effective', effectiveAt: at, approverId: authorId })
    .where(eq(planRevisions.id, revision.id))
    .run();
  return { supplierId: supplier.id, partId: part.id, planId: plan.id };
}

export function addInstrument(
  db: Db,
  kind: InstrumentKind,
  assetNumber: string,
  more: { calibrationDue?: string; status?: 'in-service' | 'withdrawn' } = {},
): number {
  return db
    .insert(instruments)
    .values({
      assetNumber,
      kind,
      description: 'Bench instrument',
      serialNumber: '',
      place: '',
      calibrationDue: more.calibrationDue ?? '2026-09-30',
      status: more.status ?? 'in-service',
    })
    .returning({ id: instruments.id })
    .get().id;
}

export function booking(references: { supplierId: number; partId: number }, quantity: number, more: object = {}) {
  return {
    partId: references.partId,
    supplierId: references.supplierId,
    deliveryNumber: 'D-7719',
    orderNumber: 'PO-1',
    countedQuantity: quantity,
    statedQuantity: quantity,
    dateCode: '2608',
    cartons: Math.min(4, quantity),
    neededBy: null,
    place: 'Dock 2',
    note: '',
    ...more,
  };
}

/** Books a lot in and draws its sample, through the API. */
export async function drawnLot(
  site: TestSite,
  references: { supplierId: number; partId: number },
  quantity: number,
): Promise<Lot> {
  const booked = await site.as('receiving').post('/api/lots').send(booking(references, quantity)).expect(201);
  const lot = booked.body as Lot;
  const drawn = await site
    .as('inspector')
    .post(`/api/lots/${lot.id}/sample`)
    .set('if-match', `"${lot.version}"`)
    .expect(201);
  return drawn.body as Lot;
}
