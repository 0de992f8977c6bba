import { type StudyPlan } from './study-cell';

type Values = readonly (readonly (readonly (number | null)[])[])[];

/**
 * Where each new name stood before: under the same name, or, where as many names are given as before, in the same place if
 * the old name is gone from the list; −1 for a name that is new.
 */
function placesBefore(before: readonly string[], after: readonly string[]): number[] {
  return after.map((name, place) => {
    const same = before.indexOf(name);
    const old = before[place];
    const isRenamed = same < 0 && before.length === after.length && old !== undefined && !after.includes(old);
    return isRenamed ? place : same;
  });
}

/**
 * The readings of a study after its parts, persons or trials were changed: each stays with the names it was taken of, and
 * has null where there is none yet. SI base units.
 */
export function reshapedValues(before: StudyPlan & { values: Values }, after: StudyPlan): (number | null)[][][] {
  const parts = placesBefore(before.parts, after.parts);
  const persons = placesBefore(before.persons, after.persons);
  return parts.map((part) =>
    persons.map((person) =>
      Array.from({ length: after.trials }, (_, trial) => before.values[part]?.[person]?.[trial] ?? null),
    ),
  );
}
