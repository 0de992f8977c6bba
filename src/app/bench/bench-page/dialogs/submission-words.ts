import { type GroupVerdict } from '#shared/verdict/sample-verdict';
import { type Confirmation } from '../../../ui/confirm/confirm-dialog';
import { type BenchSheet } from '../../sheet/bench-sheet';

/** What is said before a lot is submitted: what was judged, what was found, what stays undecided. */
export function submissionWords(sheet: BenchSheet): Confirmation {
  const { number } = sheet.bench().lot;
  const undecided = sheet.undecided();
  return {
    title: `Submit lot ${number}?`,
    text: [
      `${sheet.judgedUnits()} of ${sheet.records().length} units are judged.`,
      ...sheet.groups().map((each, _, all) => groupWords(each, all)),
      ...(undecided > 0 ? [`${undecided} undecided; unresolved they count as nonconforming.`] : []),
      ...(sheet.lot().stop ? ['A rejection number is reached: the lot will be rejected.'] : []),
      'Quality decides on the lot next. The bench is closed for it until quality opens it again.',
    ],
    confirm: 'Submit lot',
  };
}

/** Two groups of one class are told apart by their level. */
function groupWords({ group, found }: GroupVerdict, all: readonly GroupVerdict[]): string {
  const alike = all.filter((other) => other.group.class === group.class).length > 1;
  const name = group.class.charAt(0).toUpperCase() + group.class.slice(1);
  const level = alike ? `, level ${group.level}` : '';
  return `${name}${level}: ${found} nonconforming, accept number ${group.acceptance}, rejection number ${group.rejection}.`;
}
