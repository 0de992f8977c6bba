import { type Db } from '#db/open-database';
import { certificates } from '#db/schema/certificates';
import { lots, sampleUnits } from '#db/schema/lots';
import { nonconformances } from '#db/schema/nonconformances';
import { people } from '#db/schema/people';
import { Conflict } from '#server/problems';
import { type Lot } from '#shared/contract/lots';
import { cartonSizes } from '#shared/sampling/carton-sizes';
import { and, asc, desc, eq, isNotNull, lte, ne } from 'drizzle-orm';
import { historyOf } from './lot-history';
import { fixedSampling, provisionalSampling } from './lot-sampling-queries';
import { findLot, headOf, type LotRow } from './lot-rows';

interface Signer {
  name: string;
  stampNumber: string | null;
}

/** Name and stamp of a person; null where nobody acted yet. */
export function signerOf(db: Db, personId: number | null): Signer | null {
  if (personId === null) return null;
  const found = db
    .select({ name: people.name, stampNumber: people.stampNumber })
    .from(people)
    .where(eq(people.id, personId))
    .get();
  return found ?? null;
}

function lastLots(db: Db, lot: LotRow): Lot['lastLots'] {
  const decided = db
    .select({ id: lots.id, number: lots.number, status: lots.status, verdict: lots.verdict })
    .from(lots)
    .where(
      and(
        eq(lots.partId, lot.partId),
        eq(lots.supplierId, lot.supplierId),
        isNotNull(lots.verdict),
        ne(lots.id, lot.id),
        lte(lots.decidedAt, lot.decidedAt ?? '9999'),
      ),
    )
    .orderBy(desc(lots.decidedAt))
    .limit(5)
    .all();
  return decided.reverse().flatMap(({ verdict, ...rest }) => (verdict === null ? [] : [{ ...rest, verdict }]));
}

function papersOf(db: Db, lotId: number): Pick<Lot, 'certificate' | 'nonconformance'> {
  const certificate = db
    .select({ id: certificates.id, number: certificates.number })
    .from(certificates)
    .where(eq(certificates.lotId, lotId))
    .orderBy(desc(certificates.id))
    .get();
  const nonconformance = db
    .select({ id: nonconformances.id, number: nonconformances.number })
    .from(nonconformances)
    .where(eq(nonconformances.lotId, lotId))
    .get();
  return { certificate: certificate ?? null, nonconformance: nonconformance ?? null };
}

function samplingOf(db: Db, lot: LotRow) {
  if (lot.status === 'arrived') return provisionalSampling(db, lot.partId, lot.countedQuantity);
  return fixedSampling(db, lot);
}

/** One lot with all that its page shows. */
export function readLot(db: Db, id: number): Lot {
  const joined = findLot(db, id);
  const { lot } = joined;
  return {
    ...headOf(db, joined),
    ...papersOf(db, id),
    orderNumber: lot.orderNumber,
    dateCode: lot.dateCode,
    cartons: lot.cartons,
    place: lot.place,
    note: lot.note,
    bookedBy: signerOf(db, lot.bookedById)?.name ?? '',
    sampling: samplingOf(db, lot) ?? null,
    seed: lot.seed,
    drawnBy: signerOf(db, lot.drawnById)?.name ?? null,
    submittedBy: signerOf(db, lot.submittedById),
    decidedBy: signerOf(db, lot.decidedById),
    decisionReason: lot.decisionReason,
    holdReason: lot.holdReason,
    cancelReason: lot.cancelReason,
    history: historyOf(db, id),
    lastLots: lastLots(db, lot),
    version: lot.version,
  };
}

/** The drawn units by carton, as a person walks along the cartons. */
export function pullList(db: Db, id: number) {
  const joined = findLot(db, id);
  const { lot } = joined;
  if (lot.drawnAt === null) throw new Conflict('not-drawn', 'The sample of this lot is not drawn yet.');
  const before = cartonSizes(lot.countedQuantity, lot.cartons).reduce<number[]>(
    (starts, size) => [...starts, (starts.at(-1) ?? 0) + size],
    [0],
  );
  const units = db
    .select({ unit: sampleUnits.unit, position: sampleUnits.position, carton: sampleUnits.carton })
    .from(sampleUnits)
    .where(eq(sampleUnits.lotId, id))
    .orderBy(asc(sampleUnits.position))
    .all();
  const cartons = [...new Set(units.map(({ carton }) => carton))].map((carton) => ({
    carton,
    units: units
      .filter((unit) => unit.carton === carton)
      .map(({ unit, position }) => ({ unit, position, positionInCarton: position - (before[carton - 1] ?? 0) })),
  }));
  return { lot: headOf(db, joined), cartons };
}
