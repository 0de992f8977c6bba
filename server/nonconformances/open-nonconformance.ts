import { type Db } from '#db/open-database';
import { nonconformances } from '#db/schema/nonconformances';
import { people, personRoles } from '#db/schema/people';
import { record } from '#server/audit/record';
import { type JudgedLot } from '#server/judging/sample-judging';
import { type Caller } from '#server/caller';
import { type Context } from '#server/context';
import { fixedSampling } from '#server/lots/lot-sampling-queries';
import { findLot, type LotRow } from '#server/lots/lot-rows';
import { queueMessage } from '#server/mail/queue-message';
import { rejectionNotice } from '#server/mail/rejection-notice';
import { nextNumber } from '#server/numbers/next-number';
import { findSite } from '#server/site/site-queries';
import { type Failure } from '#shared/contract/nonconformances';
import { formatNumber } from '#shared/quantities/format-number';
import { and, eq } from 'drizzle-orm';
import { failuresOf } from './failures-of';

interface Rejection {
  lot: LotRow;
  judged: JudgedLot;
  caller: Caller;
  at: Date;
}

interface Opened extends Rejection {
  id: number;
  number: string;
  failures: Failure[];
  containment: string;
}

/** Who of engineering is told: the site's list, or where it is empty everybody with that role. */
function engineeringList(db: Db): string[] {
  const listed = findSite(db).engineeringList;
  if (listed.length > 0) return listed;
  return db
    .select({ email: people.email })
    .from(people)
    .innerJoin(personRoles, eq(personRoles.personId, people.id))
    .where(and(eq(people.active, true), eq(personRoles.role, 'engineering')))
    .all()
    .map(({ email }) => email);
}

function linkTo({ environment }: Context, id: number): string | null {
  return environment.publicUrl === undefined
    ? null
    : new URL(`/nonconformances/${id}`, environment.publicUrl).toString();
}

function tellEngineering(context: Context, db: Db, opened: Opened): void {
  const to = engineeringList(db);
  if (to.length === 0) return;
  const { lot, judged, caller, at, id, number, failures, containment } = opened;
  const { part, supplier } = findLot(db, lot.id);
  const sampling = fixedSampling(db, lot);
  if (!sampling) throw new Error(`Lot ${lot.number} was rejected without a sample.`);
  const issuer = findSite(db);
  const letter = rejectionNotice({
    siteName: issuer.name,
    department: issuer.department,
    lot: {
      number: lot.number,
      size: lot.countedQuantity,
      deliveryNumber: lot.deliveryNumber,
      orderNumber: lot.orderNumber,
      dateCode: lot.dateCode,
    },
    part: { number: part.number, name: part.name },
    supplier: supplier.name,
    plan: { number: sampling.planNumber, revision: sampling.revision },
    nonconformance: { number, openedAt: at.toISOString() },
    reason: judged.verdict.lot.reason,
    groups: judged.verdict.groups.map(({ group, found }) => ({
      class: group.class,
      found,
      acceptance: group.acceptance,
      rejection: group.rejection,
      sampleSize: group.sampleSize,
      aql: group.aql,
    })),
    failures,
    containment,
    signedBy: { name: caller.name, stampNumber: caller.stampNumber },
    link: linkTo(context, id),
  });
  queueMessage(db, { event: 'lot-rejected', nonconformanceId: id, to, ...letter, at });
}

/** Opens the nonconformance of a rejected lot inside the deciding transaction, with the notice to engineering. */
export function openNonconformance(context: Context, db: Db, rejection: Rejection): { id: number; number: string } {
  const { lot, judged, caller, at } = rejection;
  const number = nextNumber(db, 'NC', at.getUTCFullYear());
  const failures = failuresOf(judged);
  const containment = `All ${formatNumber(lot.countedQuantity, 0)} units are on hold${lot.place === '' ? '' : ` at ${lot.place}`}.`;
  const { id } = db
    .insert(nonconformances)
    .values({
      number,
      lotId: lot.id,
      status: 'open',
      summary: judged.verdict.lot.reason,
      failures,
      containment,
      openedAt: at.toISOString(),
      openedById: caller.id,
    })
    .returning({ id: nonconformances.id })
    .get();
  record(db, {
    at,
    person: caller,
    action: 'opened',
    subject: 'nonconformance',
    subjectId: id,
    after: { number, lot: lot.number },
  });
  tellEngineering(context, db, { ...rejection, id, number, failures, containment });
  return { id, number };
}
