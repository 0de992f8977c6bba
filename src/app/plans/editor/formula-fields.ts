import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { ReactiveFormsModule } from '@angular/forms';
import { MatFormFieldModule } from '@angular/material/form-field';
import { MatSelectModule } from '@angular/material/select';
import { type Characteristic, UNITS } from '#shared/contract/plans';
import { FORMULA_KEYS, type FormulaKey, FORMULAS } from '#shared/measurement/formula';
import { QuantityField } from '../../ui/quantity-field/quantity-field';
import { FieldErrorPipe } from '../../ui/values/field-error-pipe';
import { type CharacteristicForm } from './characteristic-form';

/** The formula of a computed characteristic, which measured ones it takes, and the ratings it takes beside them. */
@Component({
  selector: 'qr-formula-fields',
  imports: [FieldErrorPipe, MatFormFieldModule, MatSelectModule, QuantityField, ReactiveFormsModule],
  templateUrl: './formula-fields.html',
  styles: `
    :host {
      display: grid;
      gap: 14px;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class FormulaFields {
  readonly form = input.required<CharacteristicForm>();
  /** The formula that the characteristic has now. */
  readonly formula = input.required<FormulaKey>();
  readonly measured = input.required<readonly Characteristic[]>();

  protected readonly formulas = FORMULA_KEYS.map((key) => ({ key, title: FORMULAS[key].title }));
  protected readonly inputs = computed(() => FORMULAS[this.formula()].inputs);
  protected readonly constants = computed(() => FORMULAS[this.formula()].constants);

  /** Another formula takes other inputs and has its own unit. */
  protected choose(key: FormulaKey): void {
    const form = this.form();
    form.showInputs(key);
    const unit = UNITS.find((each) => each === FORMULAS[key].unit);
    form.group.patchValue(unit === undefined ? { formulaKey: key } : { formulaKey: key, unit });
  }
}
