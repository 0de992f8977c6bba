import { FormControl, FormGroup } from '@angular/forms';
import {
  type Instrument,
  INSTRUMENT_KIND_TITLES,
  type InstrumentKind,
  type InstrumentRange,
  type RANGE_UNITS,
} from '#shared/contract/instruments';
import { formatQuantity } from '#shared/quantities/format-quantity';
import { type FieldsOf } from '../../data/record-form';
import { type Difference } from '../../ui/conflict-note';

const text = () => new FormControl('', { nonNullable: true });
const quantity = () => new FormControl<number | null>(null);

export const STATUS_TITLES: Readonly<Record<Instrument['status'], string>> = {
  'in-service': 'In service',
  withdrawn: 'Withdrawn',
};

/** A reference with its tolerance in words: "Reference source, 10 V: 10 V ± 5 mV". */
export function referenceWords(reference: Instrument['dailyReference']): string {
  if (reference === null) return 'none';
  const { name, unit, value, tolerance } = reference;
  return `${name}: ${formatQuantity(value, unit, { significant: 6 })} ± ${formatQuantity(tolerance, unit)}`;
}

/** The fields of an instrument. */
export class InstrumentFields implements FieldsOf<Instrument> {
  readonly reference = new FormGroup({
    name: text(),
    unit: new FormControl<(typeof RANGE_UNITS)[number]>('V', { nonNullable: true }),
    value: quantity(),
    tolerance: quantity(),
  });
  readonly group = new FormGroup({
    assetNumber: text(),
    kind: new FormControl<InstrumentKind>('multimeter', { nonNullable: true }),
    description: text(),
    serialNumber: text(),
    place: text(),
    calibrationDue: text(),
    status: new FormControl<Instrument['status']>('in-service', { nonNullable: true }),
    isChecked: new FormControl(false, { nonNullable: true }),
    dailyReference: this.reference,
  });

  /** Ranges have a place of their own; what is saved here carries those that are stored. */
  ranges: readonly InstrumentRange[] = [];

  constructor() {
    this.followChecked();
    this.group.controls.isChecked.valueChanges.subscribe(() => this.followChecked());
  }

  show(instrument: Instrument): void {
    const { assetNumber, kind, description, serialNumber, place, calibrationDue, status, dailyReference } = instrument;
    this.ranges = instrument.ranges;
    this.group.reset({
      ...{ assetNumber, kind, description, serialNumber, place, calibrationDue, status },
      isChecked: dailyReference !== null,
      dailyReference: dailyReference ?? {},
    });
  }

  /** What the form says, as it is sent. */
  value() {
    const { isChecked, dailyReference, calibrationDue, ...plain } = this.group.getRawValue();
    return { ...plain, calibrationDue, dailyReference: isChecked ? dailyReference : null, ranges: this.ranges };
  }

  differences(theirs: Instrument): Difference[] {
    const mine = this.value();
    const rows: Difference[] = [
      { label: 'Asset number', mine: mine.assetNumber, theirs: theirs.assetNumber },
      { label: 'Kind', mine: INSTRUMENT_KIND_TITLES[mine.kind], theirs: INSTRUMENT_KIND_TITLES[theirs.kind] },
      { label: 'Description', mine: mine.description, theirs: theirs.description },
      { label: 'Serial number', mine: mine.serialNumber, theirs: theirs.serialNumber },
      { label: 'Place', mine: mine.place, theirs: theirs.place },
      { label: 'Status', mine: STATUS_TITLES[mine.status], theirs: STATUS_TITLES[theirs.status] },
      { label: 'Daily check', mine: this.referenceTyped(), theirs: referenceWords(theirs.dailyReference) },
    ];
    return rows.filter((row) => row.mine !== row.theirs);
  }

  private referenceTyped(): string {
    const { name, unit, value, tolerance } = this.reference.getRawValue();
    if (!this.group.controls.isChecked.value) return referenceWords(null);
    return value === null || tolerance === null ? name : referenceWords({ name, unit, value, tolerance });
  }

  private followChecked(): void {
    if (this.group.controls.isChecked.value) this.reference.enable({ emitEvent: false });
    else this.reference.disable({ emitEvent: false });
  }
}
