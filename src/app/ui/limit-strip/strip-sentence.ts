import { readingText } from '../values/reading-text';
import { LOOK_WORDS, type VerdictLook } from '../verdict-look';
import { type Limits } from './strip-scale';

/** What a limit strip shows, as a sentence: "1.85 V, upper limit 2.40 V, conforming". */
export function stripSentence(strip: {
  value: number | null;
  limits: Limits;
  unit: string;
  decimals: number;
  verdict: VerdictLook;
}): string {
  const text = (quantity: number) => readingText(quantity, strip.unit, strip.decimals);
  const reading = strip.value === null ? 'No reading' : text(strip.value);
  const verdict = strip.value === null ? '' : `, ${LOOK_WORDS[strip.verdict].toLowerCase()}`;
  return `${reading}, ${limitWords(strip.limits, text)}${verdict}`;
}

function limitWords({ lower, upper }: Limits, text: (quantity: number) => string): string {
  if (lower !== null && upper !== null) return `limits ${text(lower)} to ${text(upper)}`;
  if (upper !== null) return `upper limit ${text(upper)}`;
  return lower === null ? 'no limit' : `lower limit ${text(lower)}`;
}
