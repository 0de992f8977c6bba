import { signal } from '@angular/core';
import { FormArray, FormControl, FormGroup, type ValidatorFn } from '@angular/forms';
import { type Rack } from '#shared/contract/racks';
import { type FieldsOf } from '../../data/record-form';
import { type Difference } from '../../ui/conflict-note';

const text = (value = '') => new FormControl(value, { nonNullable: true });

/** One column of the rack's files: its heading, and what it holds; left empty, it is skipped. */
export type ColumnGroup = FormGroup<{ heading: FormControl<string>; meaning: FormControl<string> }>;

function columnGroup(heading = '', meaning = ''): ColumnGroup {
  return new FormGroup({ heading: text(heading), meaning: text(meaning) });
}

/** Two rows of one heading would be one on record; the later one is marked. */
const eachHeadingOnce: ValidatorFn = (control) => {
  const headings = (control as FormArray<ColumnGroup>).controls.map(({ controls }) => controls.heading.value.trim());
  const twice = headings.find((heading, index) => headings.indexOf(heading) < index);
  return twice === undefined ? null : { twice: twice === '' ? 'A column has no heading.' : `${twice} stands twice.` };
};

type Mapping = Rack['mapping'];

function said(mapping: Mapping): string {
  return Object.entries(mapping)
    .map(([heading, meaning]) => `${heading}: ${meaning ?? 'skipped'}`)
    .sort()
    .join(', ');
}

/** The fields of a rack. */
export class RackFields implements FieldsOf<Rack> {
  readonly columns = new FormArray<ColumnGroup>([], { validators: eachHeadingOnce });
  readonly group = new FormGroup({
    name: text(),
    place: text(),
    active: new FormControl(true, { nonNullable: true }),
    partIds: new FormControl<number[]>([], { nonNullable: true }),
    mapping: this.columns,
  });

  private readonly drawn = signal<readonly ColumnGroup[]>([]);
  /** The rows of the columns as they are to be drawn. */
  readonly rows = this.drawn.asReadonly();

  /** Part numbers by id, for the words of a conflict. */
  partNumbers: ReadonlyMap<number, string> = new Map();

  show({ name, place, active, parts, mapping }: Rack): void {
    this.columns.clear();
    for (const [heading, meaning] of Object.entries(mapping)) this.columns.push(columnGroup(heading, meaning ?? ''));
    this.group.reset({
      name,
      place,
      active,
      partIds: parts.map(({ id }) => id),
      mapping: this.columns.getRawValue(),
    });
    this.draw();
  }

  addColumn(): void {
    this.columns.push(columnGroup());
    this.columns.markAsDirty();
    this.draw();
  }

  removeColumn(index: number): void {
    this.columns.removeAt(index);
    this.columns.markAsDirty();
    this.draw();
  }

  /** As it is sent. */
  value() {
    return { ...this.group.getRawValue(), mapping: this.mapping() };
  }

  differences(theirs: Rack): Difference[] {
    const mine = this.value();
    const numbers = mine.partIds.map((id) => this.partNumbers.get(id) ?? String(id));
    const rows: Difference[] = [
      { label: 'Name', mine: mine.name, theirs: theirs.name },
      { label: 'Place', mine: mine.place, theirs: theirs.place },
      { label: 'In use', mine: mine.active ? 'yes' : 'no', theirs: theirs.active ? 'yes' : 'no' },
      { label: 'Parts', mine: numbers.sort().join(', '), theirs: theirs.parts.map(({ number }) => number).join(', ') },
      { label: 'Columns', mine: said(mine.mapping), theirs: said(theirs.mapping) },
    ];
    return rows.filter((row) => row.mine !== row.theirs);
  }

  private draw(): void {
    this.drawn.set([...this.columns.controls]);
  }

  private mapping(): Mapping {
    const rows = this.columns.getRawValue().map(({ heading, meaning }) => {
      const means = meaning.trim();
      return [heading.trim(), means === '' ? null : means] as const;
    });
    return Object.fromEntries(rows);
  }
}
