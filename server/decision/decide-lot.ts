import { type Db } from '#db/open-database';
import { lots } from '#db/schema/lots';
import { type JudgedLot } from '#server/judging/sample-judging';
import { type Caller } from '#server/caller';
import { issueCertificate } from '#server/certificates/issue-certificate';
import { tryCertificateFile } from '#server/certificates/make-certificate-file';
import { type Context } from '#server/context';
import { readLot } from '#server/lots/lot-queries';
import { findLot, type LotRow } from '#server/lots/lot-rows';
import { recordLot } from '#server/lots/record-lot';
import { openNonconformance } from '#server/nonconformances/open-nonconformance';
import { Conflict, holdVersion } from '#server/problems';
import { type Lot } from '#shared/contract/lots';
import { eq } from 'drizzle-orm';
import { judgedLot } from './assess-lot';
import { holdPassword } from './hold-password';
import { releaseObjection, tookAllReadings, unitsReleased } from './release-objection';
import { writeSummaries } from './write-summaries';

interface Signing {
  verdict: 'accepted' | 'rejected';
  password: string;
  note: string;
}

/** A lot that waits for its decision. */
export function submittedLot(db: Db, id: number, version: number): LotRow {
  const { lot } = findLot(db, id);
  holdVersion(`Lot ${lot.number}`, lot.version, version);
  if (lot.status !== 'submitted')
    throw new Conflict('lot-not-submitted', `Lot ${lot.number} is not waiting for a decision.`);
  return lot;
}

function holdVerdict(judged: JudgedLot, seen: Signing['verdict']): void {
  const { verdict, reason } = judged.verdict.lot;
  if (verdict !== seen) throw new Conflict('verdict-changed', `The verdict is another one by now. ${reason}`);
}

interface Decision {
  lot: LotRow;
  judged: JudgedLot;
  caller: Caller;
  at: Date;
  note: string;
}

function release(db: Db, { lot, judged, caller, at, note }: Decision): number {
  const objection = releaseObjection(db, lot, judged, caller);
  if (objection !== null) throw objection;
  const released = unitsReleased(lot, judged);
  const certificate = issueCertificate(db, { lot, judged, caller, at, unitsReleased: released });
  recordLot(db, {
    at,
    person: caller,
    action: 'accepted',
    lotId: lot.id,
    note: `${certificate.number}, ${released} units released`,
    after: {
      reason: judged.verdict.lot.reason,
      certificate: certificate.number,
      remark: note,
      secondPersonWaived: tookAllReadings(judged, caller),
    },
  });
  writeSummaries(db, lot, judged, { verdict: 'accepted', at, unitsReleased: released });
  return certificate.id;
}

function reject(context: Context, db: Db, { lot, judged, caller, at }: Decision): void {
  const { reason } = judged.verdict.lot;
  const nonconformance = openNonconformance(context, db, { lot, judged, caller, at });
  recordLot(db, {
    at,
    person: caller,
    action: 'rejected',
    lotId: lot.id,
    note: reason,
    after: { nonconformance: nonconformance.number },
  });
  writeSummaries(db, lot, judged, { verdict: 'rejected', at, unitsReleased: 0 });
}

function writeVerdict(db: Db, { lot, judged, caller, at, note }: Decision, verdict: Signing['verdict']): void {
  db.update(lots)
    .set({
      status: verdict === 'accepted' ? 'released' : 'on-hold',
      verdict,
      decidedAt: at.toISOString(),
      decidedById: caller.id,
      decisionReason: judged.verdict.lot.reason,
      decisionNote: note,
      holdReason: null,
      version: lot.version + 1,
    })
    .where(eq(lots.id, lot.id))
    .run();
}

/**
 * Signs the verdict of a submitted lot. Accepted: released with a numbered certificate, whose file is made once the
 * decision is on the disk. Rejected: on hold, with a nonconformance and the notice to engineering.
 *
 * @throws {Refused} for a wrong password
 * @throws {Conflict} when the verdict is not the one the signer saw
 * @throws {Problem} when the releaser took all readings, or no unit is left to release
 */
export async function decideLot(
  context: Context,
  caller: Caller,
  id: number,
  version: number,
  signing: Signing,
): Promise<Lot> {
  await holdPassword(context, caller, signing.password);
  const at = context.clock.now();
  const certificateId = context.db.transaction((tx) => {
    const lot = submittedLot(tx, id, version);
    const judged = judgedLot(tx, lot);
    holdVerdict(judged, signing.verdict);
    const decision = { lot, judged, caller, at, note: signing.note };
    writeVerdict(tx, decision, signing.verdict);
    if (signing.verdict === 'accepted') return release(tx, decision);
    reject(context, tx, decision);
    return undefined;
  });
  context.outbox.wake();
  if (certificateId !== undefined) await tryCertificateFile(context, certificateId);
  return readLot(context.db, id);
}
