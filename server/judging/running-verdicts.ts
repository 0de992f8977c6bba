import { type Db } from '#db/open-database';
import { lots } from '#db/schema/lots';
import { type LotRow } from '#server/lots/lot-rows';
import { recordLot } from '#server/lots/record-lot';
import { judgeGroups } from '#shared/verdict/judge-groups';
import { judgeLot } from '#shared/verdict/judge-lot';
import { judgeUnit } from '#shared/verdict/judge-unit';
import { type LotVerdict, type UnitVerdict } from '#shared/verdict/sample-verdict';
import { eq } from 'drizzle-orm';
import { judgedReadings, rulesOf, unitsOf, type LotRules, type UnitRows } from './lot-judging';

/** How many lots are held in memory: about as many as there are benches. */
const LOTS_HELD = 64;

interface HeldLot {
  rules: LotRules;
  units: ReadonlyMap<number, UnitVerdict>;
}

/** The running verdict of a lot after a change of one of its units. */
export interface RunningVerdict {
  unit: UnitVerdict;
  lot: LotVerdict;
}

/** A unit with nothing left to measure on it. */
export function isJudged(unit: UnitVerdict): boolean {
  return unit.missing.length === 0 && unit.verdict !== 'undecided';
}

/**
 * The unit verdicts of the lots now at the benches, held in memory so that keeping one reading judges one unit and not
 * the whole sample. What is held is only ever what was committed: a change is put in after its transaction, and anything
 * unusual drops the lot, which is then judged from the database again.
 */
export class RunningVerdicts {
  private readonly held = new Map<number, HeldLot>();

  /** Forgets a lot, after any act on it but the keeping of a reading. */
  drop(lotId: number): void {
    this.held.delete(lotId);
  }

  /** Rules and committed unit verdicts of a lot. */
  of(db: Db, lot: LotRow): HeldLot {
    const known = this.held.get(lot.id);
    if (known) return known;
    const rules = rulesOf(db, lot);
    const verdicts = unitsOf(db, lot.id).map((rows) => judgeUnit(rules.rules, judgedReadings(db, rows, rules)));
    const fresh = { rules, units: new Map(verdicts.map((verdict) => [verdict.unit, verdict])) };
    this.hold(lot.id, fresh);
    return fresh;
  }

  /** Puts the verdict of a unit in, after its transaction was committed. */
  commit(lotId: number, verdict: UnitVerdict): void {
    const known = this.held.get(lotId);
    if (known) this.hold(lotId, { ...known, units: new Map(known.units).set(verdict.unit, verdict) });
  }

  private hold(lotId: number, lot: HeldLot): void {
    this.held.delete(lotId);
    this.held.set(lotId, lot);
    const [oldest] = this.held.keys();
    if (this.held.size > LOTS_HELD && oldest !== undefined) this.held.delete(oldest);
  }
}

/** The verdict of a unit and its lot as they are held. */
export function runningVerdict({ rules, units }: HeldLot, unit: number): RunningVerdict {
  const verdict = units.get(unit);
  if (!verdict) throw new Error(`The sample has no unit ${unit}.`);
  const all = [...units.values()];
  return { unit: verdict, lot: judgeLot(rules.rules, all, judgeGroups(rules.rules, all)) };
}

/**
 * Judges a lot again after one unit changed inside a transaction, and keeps its stop mark and progress in step.
 *
 * @param held rules and unit verdicts as they were before the change
 * @param rows the unit and its readings as they are now
 */
export function rejudge(db: Db, lot: LotRow, held: HeldLot, rows: UnitRows, at: Date): RunningVerdict {
  const verdict = judgeUnit(held.rules.rules, judgedReadings(db, rows, held.rules));
  const units = [...held.units.values()].map((known) => (known.unit === verdict.unit ? verdict : known));
  return { unit: verdict, lot: keepProgress(db, lot, held.rules, units, at) };
}

/** Writes stop mark and progress beside the lot when they changed; reaching a rejection number goes into the trail. */
export function keepProgress(
  db: Db,
  lot: LotRow,
  { rules }: LotRules,
  units: readonly UnitVerdict[],
  at: Date,
): LotVerdict {
  const verdict = judgeLot(rules, units, judgeGroups(rules, units));
  const unitsJudged = units.filter(isJudged).length;
  if (verdict.stop !== lot.stopped || unitsJudged !== lot.unitsJudged)
    db.update(lots).set({ stopped: verdict.stop, unitsJudged }).where(eq(lots.id, lot.id)).run();
  if (verdict.stop && !lot.stopped)
    recordLot(db, { at, person: null, action: 'stopped', lotId: lot.id, note: verdict.reason });
  return verdict;
}
