import { CONFIRM_REASON_TITLES, type PlausibilityQuestion } from '#shared/contract/bench';
import { type Characteristic } from '#shared/contract/plans';
import { formatBand } from '#shared/quantities/format-band';
import { readingText } from '../../../ui/values/reading-text';
import { entryWords } from '../../../ui/values/entry-words';

/** How the question about a reading was answered, in words; empty where none was asked. */
export function answerWords(question: PlausibilityQuestion | null, characteristic: Characteristic): string {
  if (question === null || characteristic.kind === 'attribute') return '';
  const { given, answeredBy } = question;
  const { unit, decimals } = characteristic;
  const text = (value: number) => readingText(value, unit, decimals);
  const band = `expected ${formatBand(question.band.low, question.band.high, unit, { significant: 3 })}`;
  if (given.answer === 'open') return `Waits for an answer, ${band}`;
  const by = answeredBy === null ? '' : ` by ${answeredBy}`;
  if (given.answer === 'corrected') {
    const typed = entryWords(given.from);
    return `Corrected from ${text(given.fromValue)}${typed === '' ? '' : ` (${typed})`}${by}, ${band}`;
  }
  const note = given.note === '' ? '' : ` (${given.note})`;
  return `Confirmed${by}: ${CONFIRM_REASON_TITLES[given.reason].toLowerCase()}${note}, ${band}`;
}
