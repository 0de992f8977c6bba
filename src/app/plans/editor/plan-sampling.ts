import { type RevisionBody } from '#shared/contract/plans';
import { codeLetter } from '#shared/sampling/code-letter';
import { lotSampling, type SamplingGroup } from '#shared/sampling/lot-sampling';
import { type CodeLetter, type InspectionLevel } from '#shared/sampling/scheme';

/** Beyond this size a lot's letter no longer changes. */
const LARGEST = 10_000_000;

/** The groups of a lot under a plan with normal inspection; none while the plan's classes and AQLs do not fit together. */
export function groupsOf(plan: RevisionBody, lotSize: number): readonly SamplingGroup[] {
  const classes = new Set(plan.classAqls.map((entry) => entry.class));
  const characteristics = plan.characteristics
    .filter((each) => each.ownAql !== null || classes.has(each.class))
    .map((each) => ({ key: each.key, class: each.class, level: each.ownLevel, aql: each.ownAql }));
  if (characteristics.length === 0) return [];
  const { level, classAqls } = plan;
  return lotSampling({ lotSize, severity: 'normal', level, classAqls, characteristics }).groups;
}

/** The lot sizes that share a letter with this one; `to` is null where there is no upper end. */
export function lotSizesAlike(
  lotSize: number,
  level: InspectionLevel,
): { letter: CodeLetter; from: number; to: number | null } {
  const letter = codeLetter(lotSize, level);
  const alike = (size: number) => codeLetter(size, level) === letter;
  const from = lastWhere(lotSize, 1, alike);
  const to = lastWhere(lotSize, LARGEST, alike);
  return { letter, from, to: to === LARGEST ? null : to };
}

/** The farthest number from `start` towards `end` for which `holds`, given that it holds up to some point and no further. */
function lastWhere(start: number, end: number, holds: (size: number) => boolean): number {
  let [inside, outside] = [start, end];
  if (holds(end)) return end;
  while (Math.abs(outside - inside) > 1) {
    const middle = Math.trunc((inside + outside) / 2);
    if (holds(middle)) inside = middle;
    else outside = middle;
  }
  return inside;
}
