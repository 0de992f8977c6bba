import { FormControl, FormGroup } from '@angular/forms';
import { FORM_TITLES, type FORMS, type Part, type TOPOLOGIES, TOPOLOGY_TITLES } from '#shared/contract/parts';
import { formatQuantity } from '#shared/quantities/format-quantity';
import { type FieldsOf } from '../../data/record-form';
import { type Difference } from '../../ui/conflict-note';

type Topology = (typeof TOPOLOGIES)[number];

const quantity = () => new FormControl<number | null>(null);
const text = () => new FormControl('', { nonNullable: true });

/** What a switch-mode supply has not: its ripple does not follow from the mains. */
const OF_THE_RECTIFIER = { secondaryPeakVolts: null, sourceOhms: null, diodeDropVolts: null } as const;

/** The fields of a part. */
export class PartFields implements FieldsOf<Part> {
  readonly model = new FormGroup({
    topology: new FormControl<Topology>('bridge', { nonNullable: true }),
    lineVolts: quantity(),
    lineHertz: new FormControl<50 | 60>(50, { nonNullable: true }),
    ratedVolts: quantity(),
    ratedAmperes: quantity(),
    secondaryPeakVolts: quantity(),
    sourceOhms: quantity(),
    diodeDropVolts: quantity(),
    filterFarads: quantity(),
    filterTolerance: quantity(),
    filterEsrOhms: quantity(),
  });
  readonly group = new FormGroup({
    number: text(),
    name: text(),
    form: new FormControl<(typeof FORMS)[number]>('wall-adapter', { nonNullable: true }),
    model: this.model,
    active: new FormControl(true, { nonNullable: true }),
  });

  show({ number, name, form, model, active }: Part): void {
    this.group.reset({ number, name, form, model, active });
  }

  /** As it is sent; quantities of a rectifier that the circuit has not are sent as none. */
  value() {
    const value = this.group.getRawValue();
    if (value.model.topology !== 'switch-mode') return value;
    return { ...value, model: { ...value.model, ...OF_THE_RECTIFIER } };
  }

  differences(theirs: Part): Difference[] {
    const mine = this.words(this.value());
    const stored = this.words(theirs);
    return mine
      .map((row, index) => ({ label: row.label, mine: row.text, theirs: stored[index]?.text ?? '' }))
      .filter((row) => row.mine !== row.theirs);
  }

  private words(part: Pick<ReturnType<PartFields['value']>, 'number' | 'name' | 'form' | 'model' | 'active'>) {
    const { model } = part;
    const say = (value: number | null, unit: string) => (value === null ? '' : formatQuantity(value, unit));
    return [
      { label: 'Number', text: part.number },
      { label: 'Name', text: part.name },
      { label: 'Form', text: FORM_TITLES[part.form] },
      { label: 'In use', text: part.active ? 'yes' : 'no' },
      { label: 'Circuit', text: TOPOLOGY_TITLES[model.topology] },
      { label: 'Mains voltage', text: say(model.lineVolts, 'V') },
      { label: 'Mains frequency', text: say(model.lineHertz, 'Hz') },
      { label: 'Rated voltage', text: say(model.ratedVolts, 'V') },
      { label: 'Rated current', text: say(model.ratedAmperes, 'A') },
      { label: 'Secondary peak', text: say(model.secondaryPeakVolts, 'V') },
      { label: 'Source resistance', text: say(model.sourceOhms, 'Ω') },
      { label: 'Diode drop', text: say(model.diodeDropVolts, 'V') },
      { label: 'Capacitance', text: say(model.filterFarads, 'F') },
      { label: 'Tolerance', text: say(model.filterTolerance, '%') },
      { label: 'Capacitor ESR', text: say(model.filterEsrOhms, 'Ω') },
    ];
  }
}
