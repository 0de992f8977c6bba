import { type Confirmation } from '../../../ui/confirm/confirm-dialog';
import { type BenchSheet } from '../../sheet/bench-sheet';

/** What is said before a lot is submitted: what was judged, what was found, what stays undecided. */
export function submissionWords(sheet: BenchSheet): Confirmation {
  const { number } = sheet.bench().lot;
  const groups = sheet.groups().map(({ group, found }) => {
    const name = group.class.charAt(0).toUpperCase() + group.class.slice(1);
    return `${name}: ${found} nonconforming, accept number ${group.acceptance}, rejection number ${group.rejection}.`;
  });
  const undecided = sheet.undecided();
  return {
    title: `Submit lot ${number}?`,
    text: [
      `${sheet.judgedUnits()} of ${sheet.records().length} units are judged.`,
      ...groups,
      ...(undecided > 0 ? [`${undecided} undecided; unresolved they count as nonconforming.`] : []),
      ...(sheet.lot().stop ? ['A rejection number is reached: the lot will be rejected.'] : []),
      'Quality decides on the lot next. The bench is closed for it until quality opens it again.',
    ],
    confirm: 'Submit lot',
    destructive: false,
  };
}
