import { type Db } from '#db/open-database';
import { namesOf } from '#server/bench/bench-names';
import { judgeSampleOf, type JudgedLot } from '#server/judging/sample-judging';
import { type Caller } from '#server/caller';
import { readLot } from '#server/lots/lot-queries';
import { findLot, type LotRow } from '#server/lots/lot-rows';
import { Conflict } from '#server/problems';
import { type Assessment } from '#shared/contract/decision';
import { uncertainResults } from '#server/judging/largest-uncertainty';
import { instrumentsUsed, readingsThatCount, repeatsOf } from '#server/judging/counting';
import { releaseObjection } from './release-objection';

/** A drawn lot as it is judged now: undecided units count once it is submitted. */
export function judgedLot(db: Db, lot: LotRow): JudgedLot {
  const submitting = lot.status !== 'drawn' && lot.status !== 'measuring';
  return judgeSampleOf(db, lot, { submitting });
}

function unitStates({ verdict }: JudgedLot): Assessment['units'] {
  const states = {
    conforming: 'conforming',
    nonconforming: 'minor',
    undecided: 'undecided',
    'not judged': 'not-judged',
  } as const;
  return verdict.units.map(({ unit, verdict: word, worstClass, failed }) => ({
    unit,
    state: word === 'nonconforming' && worstClass ? worstClass : states[word],
    failed,
    serial: null,
  }));
}

/** The unit at which the rejection became certain, in draw order; null while no rejection number is reached. */
function stoppedAt({ verdict, rules }: JudgedLot): number | null {
  if (!verdict.lot.stop) return null;
  const found = verdict.groups.map(({ group }) => {
    const failing = verdict.units.filter(
      ({ unit, worstClass, failed }) =>
        (unit <= group.sampleSize || group.class === 'critical') &&
        worstClass === group.class &&
        group.characteristicKeys.some((key) => failed.includes(key)),
    );
    return failing[group.rejection - 1]?.unit ?? Infinity;
  });
  const first = Math.min(...found);
  return Number.isFinite(first) && first <= rules.rules.sampleSize ? first : null;
}

/** What the sample of a drawn lot shows. @throws {Conflict} before the draw */
export function assessLot(db: Db, id: number, caller: Caller): Assessment {
  const { lot } = findLot(db, id);
  if (lot.revisionId === null) throw new Conflict('not-drawn', `The sample of lot ${lot.number} is not drawn yet.`);
  const judged = judgedLot(db, lot);
  const counting = readingsThatCount(judged);
  const names = namesOf(db);
  const times = counting.map(({ takenAt }) => takenAt).sort();
  const { verdict } = judged;
  return {
    lot: readLot(db, id),
    verdict: verdict.lot.verdict,
    reason: verdict.lot.reason,
    stoppedAtUnit: stoppedAt(judged),
    unitsJudged: lot.unitsJudged,
    units: unitStates(judged),
    groups: verdict.groups.map(({ group, found, undecided, verdict: word, reason }) => ({
      group,
      found,
      undecided,
      verdict: word,
      reason,
    })),
    characteristics: uncertainResults(db, judged),
    decisionRule: judged.rules.revision.decisionRule,
    coverageFactor: judged.rules.revision.coverageFactor,
    instruments: instrumentsUsed(db, counting),
    takenBy: [
      ...new Set(
        counting.map(({ takenById, rackId }) =>
          takenById === null ? (names.racks.get(rackId ?? 0) ?? 'Rack') : (names.people.get(takenById) ?? ''),
        ),
      ),
    ],
    repeats: repeatsOf(judged),
    setAside: judged.units.flatMap(({ unit }) =>
      unit.setAsideReason === null ? [] : [{ unit: unit.unit, reason: unit.setAsideReason }],
    ),
    objection: releaseObjection(db, lot, judged, caller)?.title ?? null,
    measuredFrom: times[0] ?? null,
    measuredTo: times.at(-1) ?? null,
  };
}
