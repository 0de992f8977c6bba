import { FormControl, FormGroup } from '@angular/forms';
import { type Lot } from '#shared/contract/lots';
import { type FieldsOf } from '../../data/record-form';
import { type Difference } from '../../ui/conflict-note';
import { momentText } from '../../ui/values/moment-pipe';

const text = () => new FormControl('', { nonNullable: true });
const chosen = () => new FormControl<number | null>(null);

/** A count as people write it, thousands apart or not; null when it is not a number. */
export function countOf(written: string): number | null {
  const digits = written.replace(/\s/g, '');
  return /^\d+$/.test(digits) ? Number(digits) : null;
}

/** A moment as a date-and-time field has it: local time without a zone. */
function localText(moment: string | null): string {
  return moment === null ? '' : momentText(new Date(moment), 'full', new Date()).replace(' ', 'T');
}

/** The fields of a delivered lot. */
export class LotFields implements FieldsOf<Lot> {
  readonly group = new FormGroup({
    partId: chosen(),
    supplierId: chosen(),
    deliveryNumber: text(),
    orderNumber: text(),
    countedQuantity: text(),
    statedQuantity: text(),
    cartons: text(),
    dateCode: text(),
    neededBy: text(),
    place: text(),
    note: text(),
  });

  show(lot: Lot): void {
    this.group.reset({
      partId: lot.part.id,
      supplierId: lot.supplier.id,
      deliveryNumber: lot.deliveryNumber,
      orderNumber: lot.orderNumber,
      countedQuantity: String(lot.countedQuantity),
      statedQuantity: String(lot.statedQuantity),
      cartons: String(lot.cartons),
      dateCode: lot.dateCode,
      neededBy: localText(lot.neededBy),
      place: lot.place,
      note: lot.note,
    });
  }

  /** Ready for the next lot of the same delivery: what the whole delivery shares stays. */
  next(): void {
    const { supplierId, deliveryNumber, orderNumber, place } = this.group.getRawValue();
    this.group.reset({ supplierId, deliveryNumber, orderNumber, place });
  }

  /** As it is sent. */
  value() {
    const { countedQuantity, statedQuantity, cartons, neededBy, ...rest } = this.group.getRawValue();
    return {
      ...rest,
      countedQuantity: countOf(countedQuantity),
      statedQuantity: countOf(statedQuantity),
      cartons: countOf(cartons),
      neededBy: neededBy === '' ? null : new Date(neededBy).toISOString(),
    };
  }

  differences(theirs: Lot): Difference[] {
    const mine = this.group.getRawValue();
    const when = localText(theirs.neededBy);
    const rows: Difference[] = [
      { label: 'Delivery number', mine: mine.deliveryNumber, theirs: theirs.deliveryNumber },
      { label: 'Order', mine: mine.orderNumber, theirs: theirs.orderNumber },
      { label: 'Counted', mine: mine.countedQuantity, theirs: String(theirs.countedQuantity) },
      { label: 'Stated', mine: mine.statedQuantity, theirs: String(theirs.statedQuantity) },
      { label: 'Cartons', mine: mine.cartons, theirs: String(theirs.cartons) },
      { label: 'Date code', mine: mine.dateCode, theirs: theirs.dateCode },
      { label: 'Needed by', mine: mine.neededBy.replace('T', ' '), theirs: when.replace('T', ' ') },
      { label: 'Place', mine: mine.place, theirs: theirs.place },
      { label: 'Note', mine: mine.note, theirs: theirs.note },
    ];
    const others: Difference[] = [];
    if (mine.partId !== theirs.part.id)
      others.push({ label: 'Part', mine: 'another part', theirs: theirs.part.number });
    if (mine.supplierId !== theirs.supplier.id)
      others.push({ label: 'Supplier', mine: 'another supplier', theirs: theirs.supplier.name });
    return [...others, ...rows.filter((row) => row.mine !== row.theirs)];
  }
}
