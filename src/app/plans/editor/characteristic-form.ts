import { FormControl, FormGroup, FormRecord } from '@angular/forms';
import { type InstrumentKind } from '#shared/contract/instruments';
import { type Characteristic, type ENTRY_MODES, type Measurand, type UNITS } from '#shared/contract/plans';
import { FORMULAS, type FormulaKey } from '#shared/measurement/formula';
import { type Aql, type InspectionLevel, type NonconformityClass } from '#shared/sampling/scheme';

type Unit = (typeof UNITS)[number];

const text = () => new FormControl('', { nonNullable: true });
const quantity = () => new FormControl<number | null>(null);

/** The fields of one characteristic, of whatever kind; what a kind has not keeps its default and is not read. */
export class CharacteristicForm {
  readonly group = new FormGroup({
    key: text(),
    name: text(),
    class: new FormControl<NonconformityClass>('major', { nonNullable: true }),
    condition: text(),
    method: text(),
    caution: text(),
    ownLevel: new FormControl<InspectionLevel | null>(null),
    ownAql: new FormControl<Aql | null>(null),
    unit: new FormControl<Unit>('V', { nonNullable: true }),
    decimals: new FormControl(2, { nonNullable: true }),
    target: quantity(),
    lowerLimit: quantity(),
    upperLimit: quantity(),
    entryMode: new FormControl<(typeof ENTRY_MODES)[number]>('direct', { nonNullable: true }),
    measurand: new FormControl<Measurand>('other', { nonNullable: true }),
    alternatePeaks: new FormControl<'worst' | 'mean'>('worst', { nonNullable: true }),
    instrumentKind: new FormControl<InstrumentKind | null>(null),
    formulaKey: new FormControl<FormulaKey>('load-regulation', { nonNullable: true }),
    inputs: new FormRecord<FormControl<string>>({}),
    constants: new FormRecord<FormControl<number | null>>({}),
    requirement: text(),
    /** One reason a line. */
    failReasons: text(),
  });

  show(characteristic: Characteristic): void {
    this.group.reset(undefined, { emitEvent: false });
    const { kind, ...values } = characteristic;
    this.showInputs(kind === 'computed' ? characteristic.formula.key : this.group.controls.formulaKey.value);
    this.group.patchValue(
      {
        ...values,
        ...(kind === 'attribute' ? { failReasons: characteristic.failReasons.join('\n') } : { failReasons: '' }),
        ...(kind === 'computed'
          ? {
              formulaKey: characteristic.formula.key,
              inputs: characteristic.formula.inputs,
              constants: characteristic.formula.constants,
            }
          : {}),
      },
      { emitEvent: false },
    );
  }

  /** Gives the form one field for each input and each rating of a formula. */
  showInputs(key: FormulaKey): void {
    const { inputs, constants } = this.group.controls;
    for (const name of Object.keys(inputs.controls)) inputs.removeControl(name, { emitEvent: false });
    for (const { name } of FORMULAS[key].inputs) inputs.addControl(name, text(), { emitEvent: false });
    for (const name of Object.keys(constants.controls)) constants.removeControl(name, { emitEvent: false });
    for (const { name } of FORMULAS[key].constants) constants.addControl(name, quantity(), { emitEvent: false });
  }

  /** The characteristic that the fields describe. */
  value(kind: Characteristic['kind']): Characteristic {
    const form = this.group.getRawValue();
    const { key, name, condition, method, caution, ownLevel, ownAql, unit, decimals } = form;
    const common = { key, name, class: form.class, condition, method, caution, ownLevel, ownAql };
    const { target, lowerLimit, upperLimit, entryMode, measurand, alternatePeaks, instrumentKind, requirement } = form;
    const limits = { unit, decimals, target, lowerLimit, upperLimit };
    switch (kind) {
      case 'measured':
        return { kind, ...common, ...limits, entryMode, measurand, alternatePeaks, instrumentKind };
      case 'computed':
        return {
          kind,
          ...common,
          ...limits,
          formula: { key: form.formulaKey, inputs: form.inputs, constants: given(form.constants) },
        };
      case 'attribute':
        return { kind, ...common, requirement, failReasons: linesOf(form.failReasons), instrumentKind };
    }
  }
}

/** The ratings that are filled in; one that is missing is left out, so that it is asked for. */
function given(constants: Readonly<Record<string, number | null>>): Record<string, number> {
  return Object.fromEntries(Object.entries(constants).filter((entry): entry is [string, number] => entry[1] !== null));
}

function linesOf(lines: string): string[] {
  return lines
    .split('\n')
    .map((line) => line.trim())
    .filter((line) => line !== '');
}
