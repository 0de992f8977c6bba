import { type DecisionRule } from '../uncertainty/guard-band';

/** What each decision rule does, in a sentence. Source of the rules: ILAC-G8:09/2019, 4.2. */
export const DECISION_RULE_MEANINGS: Readonly<Record<DecisionRule, string>> = {
  simple: 'A reading conforms within its limits, these included; measurement uncertainty is not deducted.',
  guarded:
    'Each limit is drawn in by U, the guard band; a reading within what is left conforms, every other one does not.',
  'non-binary':
    'A guard band of U lies on both sides of each limit: further inside a reading conforms, further outside it does not, between them it is conditional and leaves its unit undecided until quality rules.',
};
