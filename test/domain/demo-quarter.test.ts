import { DEMO_PARTS } from '#db/demo/demo-parts';
import { firstRevision, REVIEWED_PART, REVISED_PART, reviewedRevision } from '#db/demo/demo-plans';
import { secondRevision, thirdRevision } from '#db/demo/demo-plans';
import { demoPart } from '#db/demo/demo-parts';
import { quarterOf } from '#db/demo/quarter';
import { revisionBody } from '#shared/contract/plans';
import { planFaults } from '#shared/plan/plan-faults';
import { describe, expect, it } from 'vitest';

const UNTIL = new Date('2026-06-17T13:00:00.000Z');

describe('the plans of the demo', () => {
  const bodies = [
    ...DEMO_PARTS.map((part) => [`${part.body.number} rev 1`, firstRevision(part)] as const),
    ['the revised one', secondRevision(demoPart(REVISED_PART))] as const,
    ['the draft', thirdRevision(demoPart(REVISED_PART))] as const,
    ['the one in review', reviewedRevision(demoPart(REVIEWED_PART))] as const,
  ];

  it.each(bodies)('have the shape of the contract and no fault: %s', (_name, body) => {
    expect(revisionBody.parse(body)).toEqual(body);
    expect(planFaults(body)).toEqual([]);
  });

  it('caution wherever a unit is measured under mains, and defer to the rules of the place', () => {
    for (const [, { characteristics }] of bodies)
      for (const one of characteristics)
        if (one.kind === 'measured' && one.key !== 'cable_length') expect(one.caution).toMatch(/take precedence/);
  });
});

describe('the quarter of the demo', () => {
  const quarter = quarterOf({ until: UNTIL, seed: 5, weeks: 13 });

  it('holds sixty to seventy lots of all suppliers', () => {
    expect(quarter.lots.length).toBeGreaterThanOrEqual(60);
    expect(quarter.lots.length).toBeLessThanOrEqual(70);
    expect(new Set(quarter.lots.map(({ supplierCode }) => supplierCode))).toEqual(new Set(['KES', 'BAL', 'OMD']));
  });

  it('books past lots in on working days, in working hours', () => {
    const past = quarter.lots.filter(({ ending }) => ending.kind === 'decided' || ending.kind === 'held');
    expect(past.length).toBe(52);
    for (const { arrivedAt } of past) {
      expect([1, 2, 3, 4, 5]).toContain(arrivedAt.getUTCDay());
      expect(arrivedAt.getUTCHours()).toBeGreaterThanOrEqual(7);
      expect(arrivedAt.getUTCHours()).toBeLessThan(16);
    }
  });

  it('leaves between eight and twelve lots waiting, two of them with counts that differ', () => {
    const waiting = quarter.lots.filter(({ ending }) => ending.kind === 'waiting');
    expect(waiting.length).toBeGreaterThanOrEqual(8);
    expect(waiting.length).toBeLessThanOrEqual(12);
    expect(waiting.filter((lot) => lot.countedQuantity !== lot.statedQuantity)).toHaveLength(2);
  });

  it('follows three quarters with a lot a week, of which some went wrong as well', () => {
    const year = quarterOf({ until: UNTIL, seed: 5, weeks: 13, weeksBefore: 39 });
    const start = UNTIL.getTime() - 13 * 7 * 24 * 3_600_000;
    const before = year.lots.filter(({ arrivedAt }) => arrivedAt.getTime() < start);
    expect(before.length).toBeGreaterThanOrEqual(37);
    expect(before.length).toBeLessThanOrEqual(40);
    expect(new Set(before.map(({ arrivedAt }) => arrivedAt.toISOString().slice(0, 7))).size).toBeGreaterThanOrEqual(9);
    expect(before.filter(({ fault }) => fault !== 'none').length).toBeGreaterThanOrEqual(2);
    expect(year.firstMorning.getTime()).toBeLessThan(Math.min(...before.map(({ arrivedAt }) => arrivedAt.getTime())));
    expect(year.lots.length - before.length).toBeGreaterThanOrEqual(60);
  });

  it('ends before its last moment, at every hour of the week', () => {
    for (let hour = 0; hour < 168; hour += 1) {
      const until = new Date(UNTIL.getTime() + hour * 3_600_000);
      const { lots, firstMorning } = quarterOf({ until, seed: 5, weeks: 2 });
      for (const { arrivedAt, drawnAt } of lots) {
        expect(arrivedAt.getTime()).toBeGreaterThan(firstMorning.getTime());
        expect(Math.max(arrivedAt.getTime(), drawnAt.getTime())).toBeLessThanOrEqual(until.getTime());
      }
    }
  });
});
