import { judgedCharacteristic, sampledCharacteristic } from '#shared/plan/judged-characteristic';
import { lotSampling } from '#shared/sampling/lot-sampling';
import { type InstrumentRange } from '#shared/uncertainty/instrument-range';
import { readingBudget } from '#shared/uncertainty/reading-budget';
import { judgeGroups } from '#shared/verdict/judge-groups';
import { judgeLot } from '#shared/verdict/judge-lot';
import { judgeSample } from '#shared/verdict/judge-sample';
import { judgeUnit } from '#shared/verdict/judge-unit';
import { judgingRules } from '#shared/verdict/judging-rules';
import { type UnitReadings } from '#shared/verdict/sample-verdict';
import { TWELVE } from './bench-plan';
import { median, quantile } from './quantile';
import { type Line } from './report';
import { timesOf } from './timing';

const UNITS = 500;
const characteristics = TWELVE.map(judgedCharacteristic);

/** Code letter N in every class: 500 units. */
const { groups } = lotSampling({
  lotSize: 100_000,
  severity: 'normal',
  level: 'II',
  classAqls: [
    { class: 'critical', aql: '0.025' },
    { class: 'major', aql: '0.65' },
    { class: 'minor', aql: '1.5' },
  ],
  characteristics: TWELVE.map(sampledCharacteristic),
});

/** A unit that conforms; every hundredth has a voltage too high. */
function unit(number: number): UnitReadings {
  const values = characteristics
    .filter(({ kind }) => kind !== 'computed')
    .map(({ key, kind }, index) => {
      const value = number % 100 === 0 && index === 1 ? 13 : 12 + number / 1e4;
      return [key, kind === 'attribute' ? true : value] as const;
    });
  return { unit: number, values: new Map(values), setAside: null };
}

const units = Array.from({ length: UNITS }, (_, index) => unit(index + 1));

async function fromScratch(): Promise<Line> {
  const times = await timesOf(300, () => judgeSample({ characteristics, groups, units }));
  const [middle, p95] = [median(times), quantile(times, 0.95)];
  return {
    what: `verdict of ${UNITS} units x ${TWELVE.length} characteristics from scratch`,
    measured: `median ${middle.toFixed(2)} ms, p95 ${p95.toFixed(2)}, first ${(times[0] ?? 0).toFixed(1)}`,
    bar: '< 5 ms',
    holds: middle < 5,
  };
}

const METER: InstrumentRange = {
  id: 1,
  form: 'digital',
  name: 'DC 20 V',
  unit: 'V',
  fullScale: 20,
  resolution: 1e-3,
  ofReading: 5e-4,
  ofRange: 1e-4,
  counts: 2,
};

/** A unit with the budget of each of its readings. */
function withBudgets(one: UnitReadings): UnitReadings {
  const components = new Map(
    [...one.values].flatMap(([key, value]) =>
      typeof value === 'number' ? [[key, readingBudget(value, null, METER)] as const] : [],
    ),
  );
  return { ...one, components };
}

/** The same sample by a rule that needs the uncertainty of each reading and of what is computed from them. */
async function withGuardBands(): Promise<Line> {
  const rules = judgingRules(characteristics, groups, { rule: 'non-binary', coverageFactor: 2 });
  const measured = units.map(withBudgets);
  const times = await timesOf(300, () => {
    const verdicts = measured.map((one) => judgeUnit(rules, one));
    return judgeLot(rules, verdicts, judgeGroups(rules, verdicts));
  });
  const [middle, p95] = [median(times), quantile(times, 0.95)];
  return {
    what: `verdict of ${UNITS} units x ${TWELVE.length} characteristics with guard bands`,
    measured: `median ${middle.toFixed(2)} ms, p95 ${p95.toFixed(2)}, first ${(times[0] ?? 0).toFixed(1)}`,
    bar: '< 5 ms',
    holds: middle < 5,
  };
}

/** What the bench does while a reading is typed: one unit again, then groups and lot. */
async function oneKeystroke(): Promise<Line> {
  const rules = judgingRules(characteristics, groups);
  const verdicts = units.map((one) => judgeUnit(rules, one));
  const times = await timesOf(2000, (turn) => {
    const one = unit((turn % UNITS) + 1);
    const now = judgeUnit(rules, one);
    const all = verdicts.map((known) => (known.unit === now.unit ? now : known));
    return judgeLot(rules, all, judgeGroups(rules, all));
  });
  const [middle, p95] = [median(times), quantile(times, 0.95)];
  return {
    what: 'one keystroke judges its sample again',
    measured: `median ${middle.toFixed(3)} ms, p95 ${p95.toFixed(3)}, first ${(times[0] ?? 0).toFixed(1)}`,
    bar: '< 1 ms',
    holds: middle < 1,
  };
}

export async function measureVerdicts(): Promise<Line[]> {
  return [await fromScratch(), await withGuardBands(), await oneKeystroke()];
}
