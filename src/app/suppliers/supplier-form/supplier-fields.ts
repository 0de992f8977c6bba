import { FormControl, FormGroup } from '@angular/forms';
import { type Supplier } from '#shared/contract/suppliers';
import { type FieldsOf } from '../../data/record-form';
import { type Difference } from '../../ui/conflict-note';

const text = (value = '') => new FormControl(value, { nonNullable: true });

/** The fields of a supplier; an empty e-mail address is sent as none. */
export class SupplierFields implements FieldsOf<Supplier> {
  readonly group = new FormGroup({
    code: text(),
    name: text(),
    address: text(),
    contactName: text(),
    contactEmail: text(),
    active: new FormControl(true, { nonNullable: true }),
  });

  show(supplier: Supplier): void {
    const { code, name, address, contactName, contactEmail, active } = supplier;
    this.group.reset({ code, name, address, contactName, contactEmail: contactEmail ?? '', active });
  }

  /** As it is sent. */
  value() {
    const { contactEmail, ...rest } = this.group.getRawValue();
    return { ...rest, contactEmail: contactEmail.trim() === '' ? null : contactEmail };
  }

  differences(theirs: Supplier): Difference[] {
    const mine = this.group.getRawValue();
    const rows: Difference[] = [
      { label: 'Code', mine: mine.code, theirs: theirs.code },
      { label: 'Name', mine: mine.name, theirs: theirs.name },
      { label: 'Address', mine: mine.address, theirs: theirs.address },
      { label: 'Contact', mine: mine.contactName, theirs: theirs.contactName },
      { label: 'E-mail', mine: mine.contactEmail, theirs: theirs.contactEmail ?? '' },
      { label: 'In use', mine: mine.active ? 'yes' : 'no', theirs: theirs.active ? 'yes' : 'no' },
    ];
    return rows.filter((row) => row.mine !== row.theirs);
  }
}
