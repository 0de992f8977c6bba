import { auditEntries } from '#db/schema/audit';
import { certificates } from '#db/schema/certificates';
import { lotGroups, lots, sampleUnits } from '#db/schema/lots';
import { messages } from '#db/schema/mail';
import { nonconformances } from '#db/schema/nonconformances';
import { readings } from '#db/schema/readings';
import { lotSummaries } from '#db/schema/summaries';
import { verifyChain } from '#server/audit/verify-chain';
import { type Lot } from '#shared/contract/lots';
import { eq } from 'drizzle-orm';
import fc from 'fast-check';
import { randomUUID } from 'node:crypto';
import process from 'node:process';
import { describe, expect, it } from 'vitest';
import { keep, lotNow, planOf, typedReading } from '../support/bench-acts';
import { addPlannedPart, attribute, drawnLot, measured } from '../support/bench-fixtures';
import { PASSWORD } from '../support/test-people';
import { testSite, type TestSite } from '../support/test-site';

/** Few units and narrow limits, so that rejections, repeats and doubts come often. */
const LOT_SIZES = [1, 3, 8, 20];
const CLASSES = { insulation: 'critical', v_loaded: 'major', label: 'minor' } as const;
type Key = keyof typeof CLASSES;
const KEYS = Object.keys(CLASSES) as Key[];
const RANK = ['critical', 'major', 'minor'] as const;

type Act =
  | { act: 'read'; unit: number; key: Key; good: boolean; repeat: boolean }
  | { act: 'take back'; nth: number }
  | { act: 'set aside'; unit: number; back: boolean }
  | { act: 'rack'; unit: number; good: boolean }
  | { act: 'measure all'; good: boolean }
  | { act: 'submit' | 'reopen' | 'hold' | 'lift' }
  | { act: 'sign'; verdict: 'accepted' | 'rejected'; stale: boolean };

const unit = fc.integer({ min: 1, max: 8 });
const mostly = fc.nat(9).map((one) => one > 0);
const act: fc.Arbitrary<Act> = fc.oneof(
  {
    weight: 6,
    arbitrary: fc.record({
      act: fc.constant('read' as const),
      unit,
      key: fc.constantFrom(...KEYS),
      good: mostly,
      repeat: fc.boolean(),
    }),
  },
  { weight: 2, arbitrary: fc.record({ act: fc.constant('take back' as const), nth: fc.nat(20) }) },
  { weight: 2, arbitrary: fc.record({ act: fc.constant('set aside' as const), unit, back: fc.boolean() }) },
  { weight: 1, arbitrary: fc.record({ act: fc.constant('rack' as const), unit, good: fc.boolean() }) },
  { weight: 3, arbitrary: fc.record({ act: fc.constant('measure all' as const), good: mostly }) },
  { weight: 4, arbitrary: fc.record({ act: fc.constant('submit' as const) }) },
  { weight: 1, arbitrary: fc.record({ act: fc.constantFrom('reopen' as const, 'hold' as const, 'lift' as const) }) },
  {
    weight: 4,
    arbitrary: fc.record({
      act: fc.constant('sign' as const),
      verdict: fc.constantFrom('accepted' as const, 'accepted' as const, 'rejected' as const),
      stale: fc.nat(4).map((one) => one === 0),
    }),
  },
);

function readingFor(unitNumber: number, key: Key, good: boolean) {
  const entry =
    key === 'label'
      ? { kind: 'attribute', pass: good, reason: good ? '' : 'Smeared' }
      : { kind: 'direct', text: good ? '12' : '9', decimalComma: false };
  return { ...typedReading(unitNumber, key, ''), entry };
}

async function perform(site: TestSite, id: number, one: Act): Promise<number> {
  const lot = await lotNow(site, { id });
  const version = `"${lot.version}"`;
  switch (one.act) {
    case 'read': {
      const repeat = one.repeat ? { reason: 'contact', note: '' } : null;
      return (await keep(site, lot, { ...readingFor(one.unit, one.key, one.good), repeat })).status;
    }
    case 'measure all': {
      for (let at = 1; at <= (lot.sampleSize ?? 0); at += 1)
        for (const key of KEYS) await keep(site, lot, readingFor(at, key, one.good || at > 1));
      return 200;
    }
    case 'take back': {
      const all = site.db.select({ id: readings.id }).from(readings).all();
      const chosen = all[one.nth % Math.max(1, all.length)]?.id ?? randomUUID();
      return (await site.as('quality').post(`/api/lots/${id}/readings/${chosen}/withdrawal`)).status;
    }
    case 'set aside': {
      const body = { reason: one.back ? null : 'Humming, to be looked at' };
      return (await site.as('inspector').put(`/api/lots/${id}/units/${one.unit}/set-aside`).send(body)).status;
    }
    case 'rack': {
      const text = `unit,v_loaded,label\n${one.unit},${one.good ? 12 : 9},${one.good ? 'pass' : 'fail'}`;
      const file = { fileName: 'rack.csv', text, instrumentIds: [] };
      return (await site.as('inspector').post(`/api/lots/${id}/rack-file`).send(file)).status;
    }
    case 'submit':
      return (await site.as('inspector').post(`/api/lots/${id}/submission`).set('if-match', version)).status;
    case 'reopen':
      return (
        await site
          .as('quality')
          .post(`/api/lots/${id}/reopening`)
          .set('if-match', version)
          .send({ reason: 'Look again' })
      ).status;
    case 'hold': {
      const body = { reason: 'Cartons wet', password: PASSWORD };
      return (await site.as('quality').post(`/api/lots/${id}/hold`).set('if-match', version).send(body)).status;
    }
    case 'lift':
      return (
        await site.as('quality').post(`/api/lots/${id}/hold/end`).set('if-match', version).send({ reason: 'Dried' })
      ).status;
    case 'sign': {
      const named = one.stale ? `"${lot.version - 1 || 1}"` : version;
      const body = { verdict: one.verdict, password: PASSWORD, note: '' };
      return (await site.as('quality').post(`/api/lots/${id}/decision`).set('if-match', named).send(body)).status;
    }
  }
}

/** The lot judged once more from its rows, in the plainest way: a unit in doubt fails in what is open on it, or in all. */
function judgedPlainly({ db }: TestSite, lotId: number) {
  const groups = db.select().from(lotGroups).where(eq(lotGroups.lotId, lotId)).all();
  const units = db.select().from(sampleUnits).where(eq(sampleUnits.lotId, lotId)).all();
  const rows = db.select().from(readings).where(eq(readings.lotId, lotId)).all();
  const keyOf = new Map(
    (db.$client.prepare('select id, key from plan_characteristics').all() as { id: number; key: Key }[]).map(
      (one) => [one.id, one.key] as const,
    ),
  );
  const failing = units.map(({ id, unit: number, setAsideReason }) => {
    const state = (key: Key) => {
      const last = rows
        .filter((row) => row.unitId === id && keyOf.get(row.characteristicId) === key && row.withdrawnAt === null)
        .sort((a, b) => a.attempt - b.attempt)
        .at(-1);
      if (!last) return 'open';
      return (last.pass ?? (last.value ?? 0) >= 11) ? 'good' : 'bad';
    };
    const bad = KEYS.filter((key) => state(key) === 'bad');
    const open = KEYS.filter((key) => state(key) === 'open');
    const doubted =
      setAsideReason === null ? [] : open.length > 0 ? open : KEYS.filter((key) => CLASSES[key] !== 'critical');
    const failed = new Set([...bad, ...doubted]);
    const worst = RANK.find((rank) => [...failed].some((key) => CLASSES[key] === rank));
    return { number, worst, failed };
  });
  const rejected = groups.some(({ group }) => {
    const found = failing.filter(
      ({ number, worst }) => worst === group.class && (number <= group.sampleSize || worst === 'critical'),
    );
    return found.length >= group.rejection;
  });
  return { rejected, nonconforming: failing.filter(({ failed }) => failed.size > 0).length };
}

function snapshot({ db }: TestSite) {
  return JSON.stringify(
    [lots, readings, sampleUnits, certificates, nonconformances, lotSummaries].map((table) =>
      db.select().from(table).all(),
    ),
  );
}

/** What must hold of a lot whatever was done to it. */
async function holdTrue(site: TestSite, id: number): Promise<void> {
  const { db } = site;
  const lot = db.select().from(lots).where(eq(lots.id, id)).get();
  const issued = db.select().from(certificates).all();
  const opened = db.select().from(nonconformances).all();
  expect(issued).toHaveLength(lot?.status === 'released' ? 1 : 0);
  expect(opened).toHaveLength(lot?.verdict === 'rejected' ? 1 : 0);
  expect(db.select().from(messages).all()).toHaveLength(opened.length);
  expect(db.select().from(lotSummaries).all()).toHaveLength(lot?.verdict ? 1 : 0);
  if (!lot?.verdict) return;
  const plainly = judgedPlainly(site, id);
  expect(lot.verdict).toBe(plainly.rejected ? 'rejected' : 'accepted');
  const [summary] = db.select().from(lotSummaries).all();
  expect(summary).toMatchObject({ verdict: lot.verdict, criticalUnits: expect.any(Number) as number });
  const told = (summary?.criticalUnits ?? 0) + (summary?.majorUnits ?? 0) + (summary?.minorUnits ?? 0);
  expect(told).toBe(plainly.nonconforming);
  if (lot.verdict === 'rejected') return;
  const [certificate] = issued;
  const released = lot.countedQuantity - plainly.nonconforming;
  expect(certificate).toMatchObject({
    number: 'CC-26-0001',
    unitsReleased: released,
    data: { unitsReleased: released },
  });
  const { body } = await site.as('quality').get(`/api/lots/${id}/assessment`).expect(200);
  const assessment = body as { characteristics: { n: number; found: number; mean: number | null }[]; repeats: number };
  expect(certificate?.data.results.map(({ n, found, mean }) => ({ n, found, mean }))).toEqual(
    assessment.characteristics.map(({ n, found, mean }) => ({ n, found, mean })),
  );
  expect(certificate?.data.repeats).toBe(assessment.repeats);
}

async function play(size: number, acts: readonly Act[]): Promise<string> {
  const site = await testSite();
  try {
    const plan = planOf(
      measured('insulation', 'critical', { lower: 11 }, { ownLevel: 'S-1' }),
      measured('v_loaded', 'major', { lower: 11 }),
      attribute('label', 'minor'),
    );
    const lot: Lot = await drawnLot(
      site,
      addPlannedPart(site.db, site.people.quality.id, {
        ...plan,
        classAqls: plan.classAqls.map((one) => ({ ...one, aql: '10' })),
      }),
      size,
    );
    let decided: string | undefined;
    for (const one of acts) {
      const status = await perform(site, lot.id, one);
      expect(status, JSON.stringify(one)).toBeLessThan(500);
      if (decided !== undefined) expect(snapshot(site), `a decided lot was changed by: ${one.act}`).toBe(decided);
      await holdTrue(site, lot.id);
      const isDecided = Boolean(site.db.select().from(lots).get()?.verdict);
      if (isDecided && decided === undefined) decided = snapshot(site);
    }
    expect(await verifyChain(site.db)).toMatchObject({ intact: true });
    expect(site.db.select().from(auditEntries).all().length).toBeGreaterThan(0);
    return site.db.select().from(lots).get()?.verdict ?? 'none';
  } finally {
    site.close();
  }
}

describe('whatever is done to a lot at the bench and at decision', () => {
  it(
    'it is released only when its readings accept it, and once decided it stays as it is',
    { timeout: 300_000 },
    async () => {
      const ends = new Map<string, number>();
      await fc.assert(
        fc.asyncProperty(
          fc.constantFrom(...LOT_SIZES),
          fc.array(act, { minLength: 4, maxLength: 30, size: 'max' }),
          async (size, acts) => {
            const end = await play(size, acts);
            ends.set(end, (ends.get(end) ?? 0) + 1);
          },
        ),
        { numRuns: Number(process.env['QUIETRAIL_PLAYS'] ?? 20), seed: 20260312, endOnFailure: true },
      );
      // Both verdicts were reached, or the acts have become too tame to show anything.
      expect([...ends.keys()]).toEqual(expect.arrayContaining(['accepted', 'rejected']));
    },
  );
});
