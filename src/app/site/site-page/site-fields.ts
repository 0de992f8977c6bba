import { FormControl, FormGroup } from '@angular/forms';
import { type Site } from '#shared/contract/site';
import { type FieldsOf } from '../../data/record-form';
import { type Difference } from '../../ui/conflict-note';

const text = () => new FormControl('', { nonNullable: true });
const yesOrNo = () => new FormControl(false, { nonNullable: true });
const said = (yes: boolean) => (yes ? 'waived' : 'holds');
const asked = (yes: boolean) => (yes ? 'asked' : 'not asked');
const hoursText = (hours: number | null) => (hours === null ? '' : `${hours}\u00a0h`);

/** The settings of the site as fields; addresses stand one a line. */
export class SiteFields implements FieldsOf<Site> {
  readonly group = new FormGroup({
    name: text(),
    department: text(),
    address: text(),
    engineeringList: text(),
    waitingTargetHours: new FormControl<number | null>(null),
    approveOwnPlans: yesOrNo(),
    releaseOwnReadings: yesOrNo(),
    dailyChecks: yesOrNo(),
  });

  show(site: Site): void {
    const { name, department, address, approveOwnPlans, releaseOwnReadings, dailyChecks, waitingTargetHours } = site;
    this.group.reset({
      name,
      department,
      address,
      approveOwnPlans,
      releaseOwnReadings,
      dailyChecks,
      waitingTargetHours,
      engineeringList: site.engineeringList.join('\n'),
    });
  }

  /** As it is sent. */
  value() {
    const { engineeringList, ...rest } = this.group.getRawValue();
    return { ...rest, engineeringList: linesOf(engineeringList) };
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
      {
        label: 'Waiting target',
        mine: hoursText(mine.waitingTargetHours),
        theirs: hoursText(theirs.waitingTargetHours),
      },
      { label: 'Approval by another person', mine: said(mine.approveOwnPlans), theirs: said(theirs.approveOwnPlans) },
      {
        label: 'Release by another person',
        mine: said(mine.releaseOwnReadings),
        theirs: said(theirs.releaseOwnReadings),
      },
      { label: 'Daily checks', mine: asked(mine.dailyChecks), theirs: asked(theirs.dailyChecks) },
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
