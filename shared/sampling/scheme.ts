/** The sampling scheme by its name, as every page and paper states it. */
export const SCHEME_NAME = 'ANSI/ASQ Z1.4';

/** Where the scheme's tables come from; the standard named here is itself cancelled. */
export const SCHEME_TABLES = 'tables of MIL-STD-105E';

/** The inspection levels, special before general, each asking for more units than the one before. Source: MIL-STD-105E, Table I. */
export const INSPECTION_LEVELS = ['S-1', 'S-2', 'S-3', 'S-4', 'I', 'II', 'III'] as const;
/** One of {@link INSPECTION_LEVELS}. */
export type InspectionLevel = (typeof INSPECTION_LEVELS)[number];

/**
 * The acceptance quality limits of the master tables, as printed. Up to 10 they are percent nonconforming or
 * nonconformities per 100 units; above 10 only the latter. Source: MIL-STD-105E, Table II-A.
 */
// prettier-ignore
export const AQLS = [
  '0.010', '0.015', '0.025', '0.040', '0.065', '0.10', '0.15', '0.25', '0.40', '0.65', '1.0', '1.5', '2.5',
  '4.0', '6.5', '10', '15', '25', '40', '65', '100', '150', '250', '400', '650', '1000',
] as const;
/** One of {@link AQLS}. */
export type Aql = (typeof AQLS)[number];

/** The sample size code letters; I and O are not used. Source: MIL-STD-105E, Table I. */
export const CODE_LETTERS = ['A', 'B', 'C', 'D', 'E', 'F', 'G', 'H', 'J', 'K', 'L', 'M', 'N', 'P', 'Q', 'R'] as const;
/** One of {@link CODE_LETTERS}. */
export type CodeLetter = (typeof CODE_LETTERS)[number];

/** The letter of the row a plan is read from: a code letter, or S, which only arrows of the tightened table reach. */
export type PlanLetter = CodeLetter | 'S';

/** How hard a lot is inspected. Source: MIL-STD-105E, 4.7. */
export const SEVERITIES = ['normal', 'tightened', 'reduced'] as const;
/** One of {@link SEVERITIES}. */
export type Severity = (typeof SEVERITIES)[number];

/** The classes of a nonconformity, worst first. */
export const NONCONFORMITY_CLASSES = ['critical', 'major', 'minor'] as const;
/** One of {@link NONCONFORMITY_CLASSES}. */
export type NonconformityClass = (typeof NONCONFORMITY_CLASSES)[number];
