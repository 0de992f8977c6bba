import { type Database, openDatabase } from '#db/open-database';
import { DEMO_PASSWORD, DEMO_SIGN_INS } from '#db/demo/sign-ins';
import { instruments } from '#db/schema/instruments';
import { auditEntries } from '#db/schema/audit';
import { lotSummaries } from '#db/schema/summaries';
import { lots } from '#db/schema/lots';
import { messages, receivedMessages } from '#db/schema/mail';
import { people } from '#db/schema/people';
import { planCharacteristics, planRevisions } from '#db/schema/plans';
import { readings } from '#db/schema/readings';
import { verifyChain } from '#server/audit/verify-chain';
import { playDemo } from '#server/demo/play-demo';
import { readYields } from '#server/yields/yield-queries';
import { STATIONS } from '#shared/contract/lots';
import { asc, eq } from 'drizzle-orm';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { testSite, type TestSite } from '../support/test-site';

const UNTIL = new Date('2026-03-12T13:30:00.000Z');

let site: TestSite;
let db: Database;

async function played(): Promise<Database> {
  const fresh = openDatabase(':memory:', site.context.environment.root);
  await playDemo({ ...site.context, db: fresh }, { until: UNTIL, seed: 11, weeks: 2, weeksBefore: 1 });
  return fresh;
}

function verdicts(of: Database) {
  return of
    .select({ number: lots.number, status: lots.status, verdict: lots.verdict, reason: lots.decisionReason })
    .from(lots)
    .orderBy(asc(lots.number))
    .all();
}

beforeAll(async () => {
  site = await testSite();
  db = await played();
}, 60_000);

afterAll(() => {
  db.$client.close();
  site.close();
});

describe('the demo', () => {
  it('leaves lots at every station, a rejected and an accepted one among those decided', () => {
    const found = verdicts(db);
    for (const [station, statuses] of Object.entries(STATIONS)) {
      const standing = found.filter(({ status }) => statuses.some((one) => one === status));
      expect(standing.length, station).toBeGreaterThan(0);
    }
    expect(found.map(({ verdict }) => verdict)).toEqual(expect.arrayContaining(['accepted', 'rejected']));
  });

  it('lets everybody in with the password that is shown', async () => {
    const rows = db.select().from(people).all();
    expect(rows.map(({ email }) => email)).toEqual(DEMO_SIGN_INS.map(({ email }) => email));
    expect(await site.context.passwords.matches(DEMO_PASSWORD, rows[0]?.passwordHash ?? '')).toBe(true);
  });

  it('keeps an audit trail that is whole and in the order of its moments', async () => {
    expect(await verifyChain(db)).toMatchObject({ intact: true });
    const moments = db
      .select({ at: auditEntries.at })
      .from(auditEntries)
      .orderBy(asc(auditEntries.id))
      .all()
      .map(({ at }) => at);
    expect(moments).toEqual([...moments].sort());
    expect((moments.at(-1) ?? '') <= UNTIL.toISOString()).toBe(true);
  });

  it('records each typed reading in the trail, as the bench does', () => {
    const typed = db.select().from(readings).all();
    const kept = db.select().from(auditEntries).where(eq(auditEntries.subject, 'reading')).all();
    const byHand = typed.filter(({ takenById }) => takenById !== null);
    expect(new Set(kept.map(({ subjectId }) => subjectId))).toEqual(new Set(byHand.map(({ id }) => id)));
    expect(kept.every(({ action }) => action === 'kept')).toBe(true);
  });

  it('holds readings that fit their plan', () => {
    const rows = db
      .select({ reading: readings, content: planCharacteristics.content })
      .from(readings)
      .innerJoin(planCharacteristics, eq(planCharacteristics.id, readings.characteristicId))
      .all();
    expect(rows.length).toBeGreaterThan(1000);
    for (const { reading, content } of rows) {
      if (content.kind === 'attribute') expect(reading.pass).not.toBeNull();
      else expect(Number.isFinite(reading.value)).toBe(true);
      if (content.kind !== 'computed') expect(reading.instrumentId === null).toBe(content.instrumentKind === null);
    }
  });

  it('uses no instrument after its calibration date', () => {
    const used = db
      .select({ takenAt: readings.takenAt, due: instruments.calibrationDue })
      .from(readings)
      .innerJoin(instruments, eq(instruments.id, readings.instrumentId))
      .all();
    expect(used.filter(({ takenAt, due }) => takenAt.slice(0, 10) > due)).toEqual([]);
    const overdue = db.select().from(instruments).all();
    expect(overdue.some(({ calibrationDue }) => calibrationDue < UNTIL.toISOString().slice(0, 10))).toBe(true);
  });

  it('has yields that agree with its lots', () => {
    const decided = db.select().from(lotSummaries).all();
    const found = verdicts(db);
    const { total, months, suppliers, parts } = readYields(db, {});
    expect(total.lotsDecided).toBe(decided.length);
    expect(total.lotsAccepted).toBe(found.filter(({ verdict }) => verdict === 'accepted').length);
    expect(total.lotsRejected).toBe(found.filter(({ verdict }) => verdict === 'rejected').length);
    for (const rows of [months, suppliers, parts])
      expect(rows.reduce((sum, row) => sum + row.lotsDecided, 0)).toBe(total.lotsDecided);
  });

  it('sends a notice of each rejection, at the time of the quarter', () => {
    const rejected = db.select().from(lots).where(eq(lots.verdict, 'rejected')).all();
    const sent = db.select().from(messages).all();
    expect(sent).toHaveLength(rejected.length);
    for (const { status, queuedAt, sentAt } of sent) {
      expect(status).toBe('sent');
      expect(Date.parse(sentAt ?? '') - Date.parse(queuedAt)).toBeLessThan(60_000);
    }
    expect(db.select().from(receivedMessages).all()).toHaveLength(rejected.length);
  });

  it('has a plan with a draft and one in review beside what is effective', () => {
    const statuses = db.select({ status: planRevisions.status }).from(planRevisions).all();
    const count = (wanted: string) => statuses.filter(({ status }) => status === wanted).length;
    expect(count('effective')).toBe(7);
    expect(count('retired')).toBe(1);
    expect(count('draft')).toBe(1);
    expect(count('in-review')).toBe(1);
  });

  it('comes to the same verdicts for the same seed', async () => {
    const again = await played();
    expect(verdicts(again)).toEqual(verdicts(db));
    again.$client.close();
  }, 60_000);
});
