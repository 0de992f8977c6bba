import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import { ReactiveFormsModule } from '@angular/forms';
import { MatFormFieldModule } from '@angular/material/form-field';
import { MatSelectModule } from '@angular/material/select';
import { UNITS } from '#shared/contract/plans';
import { QuantityField } from '../../ui/quantity-field/quantity-field';
import { FieldErrorPipe } from '../../ui/values/field-error-pipe';
import { type CharacteristicForm } from './characteristic-form';

/** Unit, decimals, limits and target of a characteristic that has a value. */
@Component({
  selector: 'qr-limit-fields',
  imports: [FieldErrorPipe, MatFormFieldModule, MatSelectModule, QuantityField, ReactiveFormsModule],
  templateUrl: './limit-fields.html',
  styles: `
    :host,
    .limits {
      display: grid;
      gap: 14px;
    }
    .limits {
      grid-template-columns: repeat(3, minmax(0, 1fr));
      gap: 10px;
      align-items: start;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class LimitFields {
  readonly form = input.required<CharacteristicForm>();
  /** The unit that the characteristic has now. */
  readonly unit = input.required<string>();

  protected readonly units = UNITS;
  protected readonly decimals = [0, 1, 2, 3, 4, 5, 6];
}
