import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import { ReactiveFormsModule } from '@angular/forms';
import { MatFormFieldModule } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { FieldErrorPipe } from '../../ui/values/field-error-pipe';
import { type PersonFields } from './person-fields';
import { RolesField } from './roles-field';

/** Name, e-mail, stamp and roles of a person. */
@Component({
  selector: 'qr-person-form',
  imports: [FieldErrorPipe, MatFormFieldModule, MatInput, ReactiveFormsModule, RolesField],
  templateUrl: './person-form.html',
  styles: `
    :host {
      display: grid;
      gap: 14px;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PersonForm {
  readonly fields = input.required<PersonFields>();
}
