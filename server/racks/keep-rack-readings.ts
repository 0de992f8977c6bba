import { type Db } from '#db/open-database';
import { lots } from '#db/schema/lots';
import { canonicalJson } from '#server/audit/canonical-json';
import { record } from '#server/audit/record';
import { lotAtBench } from '#server/bench/bench-lot';
import { insertReading, type FreshReading } from '#server/bench/insert-reading';
import { type Context } from '#server/context';
import { judgedReadings } from '#server/judging/lot-judging';
import { keepProgress, type RunningVerdicts } from '#server/judging/running-verdicts';
import { type LotRow } from '#server/lots/lot-rows';
import { recordLot } from '#server/lots/record-lot';
import { Problem, Refused } from '#server/problems';
import { type Fault } from '#shared/contract/problem';
import { type RackReading, type sendRackReadings } from '#shared/contract/racks';
import { judgeGroups } from '#shared/verdict/judge-groups';
import { judgeLot } from '#shared/verdict/judge-lot';
import { judgeUnit } from '#shared/verdict/judge-unit';
import { type LotVerdict, type UnitVerdict } from '#shared/verdict/sample-verdict';
import { eq } from 'drizzle-orm';
import { createHash } from 'node:crypto';
import { isDeepStrictEqual } from 'node:util';
import type * as z from 'zod';
import { checkedReading, ReadingFault, type RackBench } from './checked-reading';
import { knownReading } from './known-reading';
import { ownReadingId } from './own-reading-id';
import { type RackCaller } from './rack-caller';
import { lotOfRack } from './rack-lot';

type Reply = z.input<(typeof sendRackReadings)['reply']>;

/** A reading of the request with its place there and the id it is kept under. */
interface Sent {
  index: number;
  id: string;
  reading: RackReading;
}

const MOST_FAULTS = 100;

function sameOrOther(before: RackReading, reading: RackReading): 'same' | 'other' {
  return isDeepStrictEqual(before, reading) ? 'same' : 'other';
}

/** The readings that are not here yet. @throws {Problem} 409 where an own id stands for another reading already */
function newOnes({ db, lot, rules, rackId }: RackBench, sent: readonly RackReading[]): Sent[] {
  const others: Fault[] = [];
  const fresh = new Map<string, Sent>();
  sent.forEach((reading, index) => {
    const id = ownReadingId(rackId, lot.id, reading.id);
    const before = fresh.get(id)?.reading;
    const known = before ? sameOrOther(before, reading) : knownReading(db, lot, rules, id, reading);
    if (known === 'new') fresh.set(id, { index, id, reading });
    if (known !== 'other') return;
    others.push({ path: ['readings', index, 'id'], message: `${reading.id} was another reading before this one.` });
  });
  if (others.length > 0)
    throw new Problem(409, 'reading-id-used', 'Another reading was sent under this id.', others.slice(0, MOST_FAULTS));
  return [...fresh.values()];
}

/** All of them as they are to be kept. @throws {Refused} with the path of every fault */
function checkedAll(bench: RackBench, sent: readonly Sent[]): FreshReading[] {
  const faults: Fault[] = [];
  const checked = sent.flatMap(({ index, id, reading }) => {
    try {
      return [checkedReading(bench, id, reading)];
    } catch (error) {
      if (!(error instanceof ReadingFault)) throw error;
      faults.push({ path: ['readings', index, error.field], message: error.message });
      return [];
    }
  });
  if (faults.length === 0) return checked;
  const title = `${faults.length} of the readings ${faults.length === 1 ? 'is' : 'are'} refused; none was kept.`;
  throw new Refused('readings-refused', title, faults.slice(0, MOST_FAULTS));
}

function actorOf(rack: RackCaller): string {
  return `Rack ${rack.name}`;
}

function startMeasuring(db: Db, lot: LotRow, rack: RackCaller, at: Date): void {
  if (lot.status !== 'drawn') return;
  db.update(lots).set({ status: 'measuring' }).where(eq(lots.id, lot.id)).run();
  recordLot(db, { at, person: null, actor: actorOf(rack), action: 'started', lotId: lot.id, note: '' });
}

function openQuestions(fresh: readonly FreshReading[]): number {
  return fresh.filter(({ question }) => question !== null).length;
}

/** Writes them down: the readings, and one entry of the trail for all of them with the digest of what was sent. */
function keepAll({ db, lot, at }: RackBench, rack: RackCaller, sent: readonly Sent[], fresh: FreshReading[]): void {
  startMeasuring(db, lot, rack, at);
  for (const reading of fresh) insertReading(db, reading);
  const content = canonicalJson(sent.map(({ reading }) => reading));
  record(db, {
    at,
    person: null,
    actor: actorOf(rack),
    action: 'kept',
    subject: 'reading-batch',
    subjectId: lot.id,
    after: {
      rack: rack.id,
      token: rack.tokenId,
      readings: fresh.length,
      units: new Set(sent.map(({ reading }) => reading.unit)).size,
      questions: openQuestions(fresh),
      sha256: createHash('sha256').update(content).digest('hex'),
    },
  });
}

function rejudged({ db, rules, units }: RackBench): UnitVerdict[] {
  return [...units.values()].map((rows) => judgeUnit(rules.rules, judgedReadings(db, rows, rules)));
}

/** The lot's verdict with the units judged again; its stop mark and progress are kept in step. */
function lotVerdict({ db, lot, rules, at }: RackBench, units: readonly UnitVerdict[], isChanged: boolean): LotVerdict {
  if (isChanged) return keepProgress(db, lot, rules, units, at);
  return judgeLot(rules.rules, units, judgeGroups(rules.rules, units));
}

/**
 * Keeps readings that a rack sends by itself: all or none. They count as taken by nobody. Sent again they change nothing,
 * also when the lot has left the bench meanwhile.
 *
 * @throws {Problem | Refused} naming each reading at fault by its place in the request
 */
export function keepRackReadings(
  { db, clock, stream }: Context,
  verdicts: RunningVerdicts,
  rack: RackCaller,
  number: string,
  sent: readonly RackReading[],
): Reply {
  const at = clock.now();
  const { lotId, changed, reply } = db.transaction((tx) => {
    const { lot } = lotOfRack(tx, rack, number);
    // Before the draw there is nothing a reading could have been sent of.
    if (lot.revisionId === null) lotAtBench(tx, lot.id);
    const held = verdicts.of(tx, lot);
    const bench: RackBench = { db: tx, lot, rules: held.rules, rackId: rack.id, at, units: new Map() };
    const fresh = newOnes(bench, sent);
    if (fresh.length > 0) lotAtBench(tx, lot.id);
    const readings = checkedAll(bench, fresh);
    if (fresh.length > 0) keepAll(bench, rack, fresh, readings);
    const judged = rejudged(bench);
    const units = new Map(held.units);
    for (const verdict of judged) units.set(verdict.unit, verdict);
    const { verdict, stop, reason } = lotVerdict(bench, [...units.values()], fresh.length > 0);
    const counts = { kept: fresh.length, known: sent.length - fresh.length, questions: openQuestions(readings) };
    return { lotId: lot.id, changed: judged, reply: { ...counts, verdict, stop, reason } };
  });
  for (const verdict of changed) verdicts.commit(lotId, verdict);
  if (reply.kept > 0) stream.announceLot(lotId);
  return reply;
}
