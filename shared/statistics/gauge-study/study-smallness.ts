import { type StudyShape } from './study-shape';

/** Why a study is small: what of its result is rough. */
export type Smallness = 'few-parts' | 'few-persons' | 'few-cells';

/** Ten parts and three persons are the usual study; AIAG MSA, 4th edition. */
export const USUAL_STUDY = { parts: 10, persons: 3 } as const;

/** The factor of the mean range takes it that there are more cells of part and person than this. AIAG MSA, from memory. */
export const FEW_CELLS = 15;

/** In which ways a study is smaller than its results would ask for; none for a usual one. */
export function smallnessOf({ parts, persons }: Pick<StudyShape, 'parts' | 'persons'>): Smallness[] {
  const small: Smallness[] = [];
  if (parts < USUAL_STUDY.parts) small.push('few-parts');
  if (persons < USUAL_STUDY.persons) small.push('few-persons');
  if (parts * persons <= FEW_CELLS) small.push('few-cells');
  return small;
}
