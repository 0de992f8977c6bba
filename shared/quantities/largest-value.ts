/**
 * No reading, limit or computed value is larger than this in magnitude, in SI base units: a teraohm is the most that an
 * insulation tester shows. What is larger is a slip of the hand, and sums of it would overflow. Common practice, no source.
 */
export const LARGEST_VALUE = 1e12;
