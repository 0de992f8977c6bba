import { type Characteristic, DECISION_RULE_TITLES, type RevisionBody } from '#shared/contract/plans';
import { characteristicWords } from './characteristic-words';

/** One line of what a revision changes. `before` is null for what is new, `after` for what is gone. */
export interface RevisionChange {
  /** Number of the characteristic at the bench, from 1; null for what concerns the whole plan or is gone. */
  position: number | null;
  /** What changed: "No-load voltage, method". */
  what: string;
  before: string | null;
  after: string | null;
}

/**
 * What a revision of a plan changes against another one, line by line: first what concerns the whole plan, then each
 * characteristic in the order of the bench, told apart by its key, then those that are gone.
 */
export function revisionChanges(before: RevisionBody, after: RevisionBody): RevisionChange[] {
  const earlier = new Map(before.characteristics.map((each) => [each.key, each]));
  const kept = new Set(after.characteristics.map((each) => each.key));
  return [
    ...planChanges(before, after),
    ...after.characteristics.flatMap((each, index) => characteristicChanges(earlier.get(each.key), each, index + 1)),
    ...before.characteristics
      .filter((each) => !kept.has(each.key))
      .map((each) => ({ position: null, what: each.name, before: summary(each), after: null })),
  ];
}

function planChanges(before: RevisionBody, after: RevisionBody): RevisionChange[] {
  const aql = (body: RevisionBody, name: string) => body.classAqls.find((entry) => entry.class === name)?.aql ?? null;
  const classes = [...new Set([...before.classAqls, ...after.classAqls].map((entry) => entry.class))];
  const lines: RevisionChange[] = [
    { position: null, what: 'Inspection level', before: before.level, after: after.level },
    ...classes.map((name) => ({
      position: null,
      what: `AQL ${name}`,
      before: aql(before, name),
      after: aql(after, name),
    })),
    {
      position: null,
      what: 'Decision rule',
      before: DECISION_RULE_TITLES[before.decisionRule],
      after: DECISION_RULE_TITLES[after.decisionRule],
    },
    {
      position: null,
      what: 'Coverage factor k',
      before: String(before.coverageFactor),
      after: String(after.coverageFactor),
    },
    { position: null, what: 'Warm-up', before: warmUpWords(before), after: warmUpWords(after) },
  ];
  const changed = lines.filter((line) => line.before !== line.after);
  return sameOrder(before, after) ? changed : [...changed, orderLine(before, after)];
}

function warmUpWords({ warmUpMinutes }: RevisionBody): string {
  return warmUpMinutes === null ? 'none' : `${warmUpMinutes}\u00a0min`;
}

/** Whether the characteristics that both hold follow each other alike. */
function sameOrder(before: RevisionBody, after: RevisionBody): boolean {
  const shared = (from: RevisionBody, other: RevisionBody) =>
    from.characteristics.map((each) => each.key).filter((key) => other.characteristics.some((one) => one.key === key));
  const [first, second] = [shared(before, after), shared(after, before)];
  return first.every((key, index) => key === second[index]);
}

function orderLine(before: RevisionBody, after: RevisionBody): RevisionChange {
  const names = (body: RevisionBody) => body.characteristics.map((each) => each.name).join(', ');
  return { position: null, what: 'Order at the bench', before: names(before), after: names(after) };
}

function characteristicChanges(
  before: Characteristic | undefined,
  after: Characteristic,
  position: number,
): RevisionChange[] {
  if (before === undefined) return [{ position, what: after.name, before: null, after: summary(after) }];
  const earlier = characteristicWords(before);
  const now = characteristicWords(after);
  return [...new Set([...earlier.keys(), ...now.keys()])]
    .map((field) => ({
      position,
      what: `${after.name}, ${field}`,
      before: earlier.get(field) ?? '',
      after: now.get(field) ?? '',
    }))
    .filter((line) => line.before !== line.after);
}

function summary(characteristic: Characteristic): string {
  const words = characteristicWords(characteristic);
  return [words.get('limits') ?? words.get('requirement'), characteristic.class]
    .filter((word) => word !== undefined && word !== '')
    .join(', ');
}
