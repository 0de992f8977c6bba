import { FormControl, FormGroup } from '@angular/forms';
import { type Instrument, INSTRUMENT_KIND_TITLES, type InstrumentKind } from '#shared/contract/instruments';
import { type FieldsOf } from '../../data/record-form';
import { type Difference } from '../../ui/conflict-note';

const text = () => new FormControl('', { nonNullable: true });

export const STATUS_TITLES: Readonly<Record<Instrument['status'], string>> = {
  'in-service': 'In service',
  withdrawn: 'Withdrawn',
};

/** The fields of an instrument. */
export class InstrumentFields implements FieldsOf<Instrument> {
  readonly group = new FormGroup({
    assetNumber: text(),
    kind: new FormControl<InstrumentKind>('multimeter', { nonNullable: true }),
    description: text(),
    serialNumber: text(),
    place: text(),
    calibrationDue: text(),
    status: new FormControl<Instrument['status']>('in-service', { nonNullable: true }),
  });

  show({ assetNumber, kind, description, serialNumber, place, calibrationDue, status }: Instrument): void {
    this.group.reset({ assetNumber, kind, description, serialNumber, place, calibrationDue, status });
  }

  differences(theirs: Instrument): Difference[] {
    const mine = this.group.getRawValue();
    const rows: Difference[] = [
      { label: 'Asset number', mine: mine.assetNumber, theirs: theirs.assetNumber },
      { label: 'Kind', mine: INSTRUMENT_KIND_TITLES[mine.kind], theirs: INSTRUMENT_KIND_TITLES[theirs.kind] },
      { label: 'Description', mine: mine.description, theirs: theirs.description },
      { label: 'Serial number', mine: mine.serialNumber, theirs: theirs.serialNumber },
      { label: 'Place', mine: mine.place, theirs: theirs.place },
      { label: 'Calibration due', mine: mine.calibrationDue, theirs: theirs.calibrationDue },
      { label: 'Status', mine: STATUS_TITLES[mine.status], theirs: STATUS_TITLES[theirs.status] },
    ];
    return rows.filter((row) => row.mine !== row.theirs);
  }
}
