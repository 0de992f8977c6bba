import { FormControl, FormGroup } from '@angular/forms';
import { type Site } from '#shared/contract/site';
import { type FieldsOf } from '../../data/record-form';
import { type Difference } from '../../ui/conflict-note';

const text = () => new FormControl('', { nonNullable: true });
const yesOrNo = () => new FormControl(false, { nonNullable: true });
const said = (yes: boolean) => (yes ? 'waived' : 'holds');

/** The settings of the site as fields; addresses stand one a line. */
export class SiteFields implements FieldsOf<Site> {
  readonly group = new FormGroup({
    name: text(),
    department: text(),
    address: text(),
    engineeringList: text(),
    waitingTargetHours: text(),
    approveOwnPlans: yesOrNo(),
    releaseOwnReadings: yesOrNo(),
  });

  show(site: Site): void {
    const { name, department, address, approveOwnPlans, releaseOwnReadings } = site;
    this.group.reset({
      name,
      department,
      address,
      approveOwnPlans,
      releaseOwnReadings,
      engineeringList: site.engineeringList.join('\n'),
      waitingTargetHours: String(site.waitingTargetHours),
    });
  }

  /** As it is sent. */
  value() {
    const { engineeringList, waitingTargetHours, ...rest } = this.group.getRawValue();
    const hours = waitingTargetHours.trim() === '' ? NaN : Number(waitingTargetHours);
    return { ...rest, engineeringList: linesOf(engineeringList), waitingTargetHours: hours };
  }

  differences(theirs: Site): Difference[] {
    const mine = this.group.getRawValue();
    const rows: Difference[] = [
      { label: 'Name', mine: mine.name, theirs: theirs.name },
      { label: 'Department', mine: mine.department, theirs: theirs.department },
      { label: 'Address', mine: mine.address, theirs: theirs.address },
      {
        label: 'Engineering list',
        mine: linesOf(mine.engineeringList).join(', '),
        theirs: theirs.engineeringList.join(', '),
      },
      { label: 'Waiting target', mine: mine.waitingTargetHours, theirs: String(theirs.waitingTargetHours) },
      { label: 'Approval by another person', mine: said(mine.approveOwnPlans), theirs: said(theirs.approveOwnPlans) },
      {
        label: 'Release by another person',
        mine: said(mine.releaseOwnReadings),
        theirs: said(theirs.releaseOwnReadings),
      },
    ];
    return rows.filter((row) => row.mine !== row.theirs);
  }
}

function linesOf(lines: string): string[] {
  return lines
    .split(/[\n,;]/)
    .map((line) => line.trim())
    .filter((line) => line !== '');
}
