import { type Db } from '#db/open-database';
import { type LotRow } from '#server/lots/lot-rows';
import { judgeGroups } from '#shared/verdict/judge-groups';
import { judgeLot } from '#shared/verdict/judge-lot';
import { judgeUnit, type JudgingOptions } from '#shared/verdict/judge-unit';
import { type SampleVerdict } from '#shared/verdict/sample-verdict';
import { judgedReadings, rulesOf, unitsOf, type LotRules, type UnitRows } from './lot-judging';

/** A drawn lot with all its readings and their verdicts. */
export interface JudgedLot {
  rules: LotRules;
  units: UnitRows[];
  verdict: SampleVerdict;
}

/** Judges the whole sample of a drawn lot from the database. */
export function judgeSampleOf(db: Db, lot: LotRow, options: JudgingOptions = {}): JudgedLot {
  const rules = rulesOf(db, lot);
  const rows = unitsOf(db, lot.id);
  const units = rows.map((unit) => judgeUnit(rules.rules, judgedReadings(db, unit, rules), options));
  const groups = judgeGroups(rules.rules, units);
  return { rules, units: rows, verdict: { units, groups, lot: judgeLot(rules.rules, units, groups) } };
}
