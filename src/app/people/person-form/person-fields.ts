import { FormControl, FormGroup } from '@angular/forms';
import { type Person } from '#shared/contract/people';
import { type Role, ROLE_TITLES } from '#shared/contract/roles';
import { type FieldsOf } from '../../data/record-form';
import { type Difference } from '../../ui/conflict-note';

const text = () => new FormControl('', { nonNullable: true });
const titles = (roles: readonly Role[]) => roles.map((role) => ROLE_TITLES[role]).join(', ');

/** The fields of a person; an empty stamp is sent as none. */
export class PersonFields implements FieldsOf<Person> {
  readonly group = new FormGroup({
    name: text(),
    email: text(),
    stampNumber: text(),
    roles: new FormControl<readonly Role[]>([], { nonNullable: true }),
  });

  show({ name, email, stampNumber, roles }: Person): void {
    this.group.reset({ name, email, stampNumber: stampNumber ?? '', roles });
  }

  /** As it is sent. */
  value() {
    const { stampNumber, ...rest } = this.group.getRawValue();
    return { ...rest, stampNumber: stampNumber.trim() === '' ? null : stampNumber };
  }

  differences(theirs: Person): Difference[] {
    const mine = this.group.getRawValue();
    const rows: Difference[] = [
      { label: 'Name', mine: mine.name, theirs: theirs.name },
      { label: 'E-mail', mine: mine.email, theirs: theirs.email },
      { label: 'Stamp number', mine: mine.stampNumber, theirs: theirs.stampNumber ?? '' },
      { label: 'Roles', mine: titles(mine.roles), theirs: titles(theirs.roles) },
    ];
    return rows.filter((row) => row.mine !== row.theirs);
  }
}
