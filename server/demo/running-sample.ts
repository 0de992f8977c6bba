import { type TypedReading, type WorkOfCharacteristic } from '#db/demo/bench-work';
import { type Db } from '#db/open-database';
import { entryValue, type EntryValue } from '#server/bench/entry-value';
import { judgedReadings, type LotRules, rulesOf, unitsOf } from '#server/judging/lot-judging';
import { type LotRow } from '#server/lots/lot-rows';
import { judgeGroups } from '#shared/verdict/judge-groups';
import { judgeLot } from '#shared/verdict/judge-lot';
import { judgeUnit } from '#shared/verdict/judge-unit';
import { type UnitReadings, type UnitVerdict } from '#shared/verdict/sample-verdict';

interface RunningUnit {
  id: number;
  values: Map<string, number | boolean>;
  attempts: Map<string, number>;
  verdict: UnitVerdict;
}

/** The sample of a lot while its readings are typed: judged after each, as at the bench, without asking the database. */
export class RunningSample {
  readonly rules: LotRules;
  private readonly units: Map<number, RunningUnit>;
  private stopReached = false;

  constructor(db: Db, lot: LotRow) {
    this.rules = rulesOf(db, lot);
    this.units = new Map(
      unitsOf(db, lot.id).map((rows) => {
        const judged = judgedReadings(db, rows, this.rules);
        const attempts = new Map([...judged.values.keys()].map((key) => [key, 1]));
        const running = { id: rows.unit.id, values: new Map(judged.values), attempts, verdict: this.judge(judged) };
        return [judged.unit, running];
      }),
    );
    this.stopReached = this.judgesStop();
  }

  get stopped(): boolean {
    return this.stopReached;
  }

  verdicts(): UnitVerdict[] {
    return [...this.units.values()].map(({ verdict }) => verdict);
  }

  /** What is read on which units. */
  work(): WorkOfCharacteristic[] {
    return this.rules.characteristics.map(({ content }, index) => ({
      content,
      requiredTo: this.rules.rules.characteristics[index]?.requiredTo ?? 0,
    }));
  }

  characteristic(key: string) {
    const found = this.rules.characteristics.find(({ content }) => content.key === key);
    if (!found) throw new Error(`The plan has no characteristic ${key}.`);
    return found;
  }

  /** Takes a reading in and judges its unit again. */
  take({ unit, key, entry }: TypedReading): { worth: EntryValue; attempt: number; unitId: number } {
    const running = this.units.get(unit);
    if (!running) throw new Error(`The sample has no unit ${unit}.`);
    const worth = entryValue(entry, this.characteristic(key).content);
    const attempt = (running.attempts.get(key) ?? 0) + 1;
    running.attempts.set(key, attempt);
    running.values.set(key, worth.value ?? worth.pass);
    const before = running.verdict;
    running.verdict = this.judge({ unit, values: running.values, setAside: null });
    if (before.verdict === 'nonconforming' || running.verdict.verdict === 'nonconforming')
      this.stopReached = this.judgesStop();
    return { worth, attempt, unitId: running.id };
  }

  private judge(readings: UnitReadings): UnitVerdict {
    return judgeUnit(this.rules.rules, readings);
  }

  private judgesStop(): boolean {
    const verdicts = this.verdicts();
    return judgeLot(this.rules.rules, verdicts, judgeGroups(this.rules.rules, verdicts)).stop;
  }
}
